import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { run, say, StartError } from './console.mjs';

const SOURCES = ['app', 'components', 'lib', 'models', 'public', 'seeders'];
const FILES = [
  'package-lock.json',
  'next.config.mjs',
  'tailwind.config.ts',
  'postcss.config.mjs',
  'tsconfig.json',
  'instrumentation.ts',
];

/**
 * Builds the application when the last build was of other sources; by content, since a checkout makes every file new.
 * @param {string} root
 * @param {Record<string, string | undefined>} env
 */
export async function ensureBuild(root, env) {
  const folder = path.join(root, env.NEXT_DIST_DIR ?? '.next');
  const mark = path.join(folder, 'built-from');
  // Pages that are made at build time say whether this is a demonstration.
  const now = `${hashOfSources(root)} ${env.DEMO ?? '0'}`;
  if (existsSync(mark) && readFileSync(mark, 'utf8') === now) return;
  say('Building the application …');
  // A route that was deleted leaves its types behind, and they break the next build.
  rmSync(path.join(folder, 'types'), { recursive: true, force: true });
  rmSync(mark, { force: true });
  await run(process.execPath, [path.join(root, 'node_modules', 'next', 'dist', 'bin', 'next'), 'build'], {
    cwd: root,
    env: { ...env, NODE_ENV: 'production' },
    quiet: true,
  }).catch((error) => {
    if (!(error instanceof StartError)) throw error;
    throw new StartError(
      `The application could not be built. What the build said, with the file and line:\n${error.message}`,
    );
  });
  writeFileSync(mark, now);
}

/** @param {string} root */
function hashOfSources(root) {
  const hash = createHash('sha256');
  const add = (/** @type {string} */ file) => {
    if (existsSync(path.join(root, file))) hash.update(`${file}\0`).update(readFileSync(path.join(root, file)));
  };
  for (const folder of SOURCES) {
    if (!existsSync(path.join(root, folder))) continue;
    const entries = readdirSync(path.join(root, folder), { recursive: true, withFileTypes: true });
    const files = entries
      .filter((entry) => entry.isFile())
      .map((entry) => path.relative(root, path.join(entry.parentPath, entry.name)));
    files.sort().forEach(add);
  }
  FILES.forEach(add);
  return hash.digest('hex');
}
