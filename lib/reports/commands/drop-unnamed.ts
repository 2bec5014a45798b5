import 'server-only';
import { dropKept } from '@/lib/platform/storage/files';
import { namedFiles } from '../queries/named-files';

/**
 * Takes back kept files after a failure. The database may have failed after the row was written, so whether one names
 * them is looked at; where it can't be, they stay, and the sweep at the next start finds them.
 */
export async function dropUnnamed(names: string[]): Promise<void> {
  const named = await namedFiles(names).catch(() => new Set(names));
  for (const name of names) if (!named.has(name)) await dropKept(name);
}
