import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/platform/database/connection';

/** Which of these stored names a row holds. */
export async function namedFiles(names: string[]): Promise<Set<string>> {
  const rows = await database().sequelize.query<{ name: string }>(
    `select stored_file as name from trace_upload where stored_file = any($1)
     union select stored_series from trace where stored_series = any($1)
     union select stored_large from attachment where stored_large = any($1)
     union select stored_small from attachment where stored_small = any($1)`,
    { bind: [names], type: QueryTypes.SELECT },
  );
  return new Set(rows.map((row) => row.name));
}
