import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/platform/database/connection';
import { log } from '@/lib/platform/log';
import { sweepFiles } from '@/lib/platform/storage/files';

/** Clears what a kill left of uploads; to be called before the first request is served. */
export async function sweepUploads(): Promise<void> {
  const { moved } = await sweepFiles(async (names) => {
    const rows = await database().sequelize.query<{ name: string }>(
      `select stored_file as name from trace_upload where stored_file = any($1)
       union select stored_series from trace where stored_series = any($1)
       union select stored_large from attachment where stored_large = any($1)
       union select stored_small from attachment where stored_small = any($1)`,
      { bind: [names], type: QueryTypes.SELECT },
    );
    return new Set(rows.map((row) => row.name));
  });
  if (moved > 0) log().warn({ moved }, 'files that no row names were moved to lost-and-found');
}
