import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/platform/database/connection';
import { sqlState } from '@/lib/platform/database/transaction';
import { dropKept } from '@/lib/platform/storage/files';

/** A member tries a few readings of one file; a hundred series of it would only fill the disk. */
const MOST_READINGS = 12;
const STILL_REFERRED_TO = '23503';

/** Drops the oldest readings of a file beyond the latest dozen, but none that a report rests on. */
export async function dropOldReadings(uploadId: number): Promise<void> {
  const { sequelize, models } = database();
  const old = await sequelize.query<{ id: number; storedSeries: string }>(
    `select t.id, t.stored_series as "storedSeries" from trace t
     where t.upload_id = $1 and not exists (select 1 from report_revision_trace l where l.trace_id = t.id)
     order by t.id desc offset $2`,
    { bind: [uploadId, MOST_READINGS], type: QueryTypes.SELECT },
  );
  for (const { id, storedSeries } of old) {
    try {
      await models.Trace.destroy({ where: { id } });
      await dropKept(storedSeries);
    } catch (error) {
      // A report came to rest on it meanwhile, so it stays.
      if (sqlState(error) !== STILL_REFERRED_TO) throw error;
    }
  }
}
