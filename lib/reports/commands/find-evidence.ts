import 'server-only';
import type { Work } from '@/lib/platform/database/transaction';
import type { InstrumentRevision } from '@/models/instrument-revision';
import type { MethodRevision } from '@/models/method-revision';
import type { Trace as TraceRow } from '@/models/trace';

/** The current revision of a member's own instrument. */
export async function findInstrument(
  { models, transaction }: Work,
  memberId: number,
  publicId: string,
): Promise<InstrumentRevision | null> {
  const row = await models.Instrument.findOne({ where: { publicId, memberId }, transaction });
  return row?.currentRevisionId ? models.InstrumentRevision.findByPk(row.currentRevisionId, { transaction }) : null;
}

export async function findMethod({ models, transaction }: Work, code: string): Promise<MethodRevision | null> {
  const row = await models.Method.findOne({ where: { code }, transaction });
  return row?.currentRevisionId ? models.MethodRevision.findByPk(row.currentRevisionId, { transaction }) : null;
}

/** Of these traces those that are the member's own, by their public id. */
export async function findTraces(
  { models, transaction }: Work,
  memberId: number,
  publicIds: string[],
): Promise<Map<string, TraceRow>> {
  const rows = await models.Trace.findAll({ where: { publicId: publicIds, memberId }, transaction });
  return new Map(rows.map((row) => [row.publicId, row]));
}
