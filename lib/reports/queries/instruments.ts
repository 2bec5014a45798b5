import 'server-only';
import type { StatedAccuracy } from '@/lib/measurement/uncertainty/types';
import { database } from '@/lib/platform/database/connection';
import type { Instrument as InstrumentModel } from '@/models/instrument';
import type { InstrumentRevision } from '@/models/instrument-revision';
import type { Instrument } from '../schema';

/** A member's instruments that are in use, by name, each in its current revision. */
export async function instrumentsOf(memberId: number): Promise<Instrument[]> {
  const { Instrument: Model, InstrumentRevision: Revision } = database().models;
  const rows = await Model.findAll({
    where: { memberId, retiredAt: null },
    include: [{ model: Revision, as: 'currentRevision', required: true }],
    order: [['name', 'ASC']],
  });
  return rows.map((row) =>
    toInstrument(row, (row as InstrumentModel & { currentRevision: InstrumentRevision }).currentRevision),
  );
}

export function toInstrument(row: InstrumentModel, revision: InstrumentRevision): Instrument {
  return {
    publicId: row.publicId,
    revision: revision.n,
    name: row.name,
    kind: revision.kind,
    modelName: revision.modelName,
    percentOfReading: revision.percentOfReading,
    percentOfRange: revision.percentOfRange,
    rangeWatts: revision.rangeWatts,
    counts: revision.counts,
    resolutionWatts: revision.resolutionWatts,
    resolutionWattHours: revision.resolutionWattHours,
    lowerLimitWatts: revision.lowerLimitWatts,
    readsTruePower: revision.readsTruePower,
    supplies: revision.supplies,
    averagingSeconds: revision.averagingSeconds,
    calibratedOn: revision.calibratedOn,
  };
}

/** What a member's own instrument states of its accuracy, or null where there is no such instrument. */
export async function accuracyOfMine(memberId: number, publicId: string): Promise<StatedAccuracy | null> {
  const { Instrument: Model, InstrumentRevision: Revision } = database().models;
  const row = await Model.findOne({ where: { publicId, memberId } });
  return row?.currentRevisionId ? Revision.findByPk(row.currentRevisionId) : null;
}
