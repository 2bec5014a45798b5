import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';

export interface Source {
  /** From the project's root, with slashes. */
  file: string;
  text: string;
}

const FOLDERS = ['app', 'components', 'lib', 'models', 'migrations', 'seeders', 'tests'];
const SKIPPED = /(^|\/)(node_modules|\.next[^/]*)(\/|$)/;

/** Every file of the project that people write, with its text. */
export function readSources(root: string): Source[] {
  return FOLDERS.flatMap((folder) => filesUnder(root, folder))
    .filter((file) => /\.(ts|tsx|mjs|js|css)$/.test(file))
    .map((file) => ({ file, text: readFileSync(path.join(root, file), 'utf8') }));
}

export function filesUnder(root: string, folder: string): string[] {
  let entries;
  try {
    entries = readdirSync(path.join(root, folder), { recursive: true, withFileTypes: true });
  } catch {
    return [];
  }
  return entries
    .filter((entry) => entry.isFile())
    .map((entry) => path.relative(root, path.join(entry.parentPath, entry.name)).split(path.sep).join('/'))
    .filter((file) => !SKIPPED.test(file))
    .sort();
}
