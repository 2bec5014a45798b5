import 'server-only';
import { readdir, readFile } from 'node:fs/promises';
import path from 'node:path';
import { env } from '../env';

/** A letter that the demonstration's catcher kept instead of sending it. */
export interface CaughtMail {
  id: string;
  to: string;
  subject: string;
  text: string;
  at: string;
}

const MOST_SHOWN = 50;

/** The letters that were caught, the latest first; none where this is no demonstration. */
export async function caughtMail(): Promise<CaughtMail[]> {
  const folder = env().caughtMailDirectory;
  if (!env().demonstration || folder === null) return [];
  const names = (await readdir(folder).catch(() => [])).filter((name) => name.endsWith('.json')).sort();
  const latest = names.slice(-MOST_SHOWN).reverse();
  return Promise.all(
    latest.map(async (name) => JSON.parse(await readFile(path.join(folder, name), 'utf8')) as CaughtMail),
  );
}
