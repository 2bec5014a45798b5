import 'server-only';
import { log } from '@/lib/platform/log';
import { sweepFiles } from '@/lib/platform/storage/files';
import { namedFiles } from '../queries/named-files';

/** Clears what a kill left of uploads; to be called before the first request is served. */
export async function sweepUploads(): Promise<void> {
  const { moved } = await sweepFiles(namedFiles);
  if (moved > 0) log().warn({ moved }, 'files that no row names were moved to lost-and-found');
}
