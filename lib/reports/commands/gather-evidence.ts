import 'server-only';
import type { Category } from '@/lib/catalogue/schema';
import type { Trace } from '@/lib/measurement/traces/trace';
import type { StatedAccuracy } from '@/lib/measurement/uncertainty/types';
import type { Work } from '@/lib/platform/database/transaction';
import { AppError, type FieldProblem } from '@/lib/platform/errors';
import type { Attachment } from '@/models/attachment';
import type { InstrumentRevision } from '@/models/instrument-revision';
import type { MethodRevision } from '@/models/method-revision';
import type { Trace as TraceRow } from '@/models/trace';
import { readSeries } from '../queries/traces';
import { computeFigures, type Computation } from '../rules/compute-figures';
import type { Submission } from '../schema';

/** Everything that a submission refers to, found and its member's own, and the figures that follow. */
export interface Evidence {
  method: MethodRevision;
  instrument: InstrumentRevision;
  traces: Map<string, TraceRow>;
  photos: Attachment[];
  computation: Computation;
}

/** @throws {AppError} bad-input naming each field that refers to nothing, or yields nothing. */
export async function gatherEvidence(
  work: Work,
  memberId: number,
  category: Category,
  { content, instrumentPublicId }: Submission,
): Promise<Evidence> {
  const problems: FieldProblem[] = [];
  const problem = (pointer: string, message: string) => problems.push({ pointer, message });
  const instrument = await findInstrument(work, memberId, instrumentPublicId);
  if (!instrument) problem('/instrumentPublicId', 'Choose one of your instruments.');
  else if (!instrument.supplies.includes(content.supplyClass)) {
    problem(
      '/instrumentPublicId',
      'This instrument doesn’t measure that supply. Choose another, or correct the supply.',
    );
  }
  const method = await findMethod(work, content.methodCode);
  if (!method) problem('/content/methodCode', 'Choose a method from the list.');
  else if (method.needsConfirmation && !content.cautionConfirmed) {
    problem('/content/cautionConfirmed', 'Read the caution of this method and confirm that it was kept to.');
  }
  const modes = new Set(category.modes.map((mode) => mode.code));
  content.phases.forEach((phase, i) => {
    if (!modes.has(phase.modeCode))
      problem(`/content/phases/${i}/modeCode`, 'Choose one of the category’s operating modes.');
  });
  const traces = await findTraces(work, memberId, content.traces);
  content.phases.forEach((phase, i) => {
    if (phase.source === 'trace' && !traces.has(phase.tracePublicId)) {
      problem(`/content/phases/${i}/tracePublicId`, 'This phase’s trace is not among the report’s. Import it again.');
    }
  });
  const photos = await work.models.Attachment.findAll({
    where: { publicId: content.photos.map((photo) => photo.publicId), memberId },
    transaction: work.transaction,
  });
  if (photos.length !== new Set(content.photos.map((photo) => photo.publicId)).size) {
    problem('/content/photos', 'One of the photos is not there any more. Add it again.');
  }
  if (problems.length > 0 || !instrument || !method) throw incomplete(problems);
  const series = new Map<string, Trace>();
  for (const [publicId, row] of traces) series.set(publicId, await readSeries(row));
  const computation = computeFigures({
    duty: category.duty,
    phases: content.phases,
    accuracy: statedAccuracy(instrument),
    traceOf: (publicId) => series.get(publicId) as Trace,
  });
  if (computation.figures.length === 0) {
    const [first] = computation.refusals;
    throw incomplete([
      { pointer: '/content/phases', message: first?.reason ?? 'No figure follows from these phases.' },
    ]);
  }
  return { method, instrument, traces, photos, computation };
}

/** What the computation needs to know of an instrument. */
export function statedAccuracy(revision: StatedAccuracy): StatedAccuracy {
  return {
    percentOfReading: revision.percentOfReading,
    percentOfRange: revision.percentOfRange,
    rangeWatts: revision.rangeWatts,
    counts: revision.counts,
    resolutionWatts: revision.resolutionWatts,
    resolutionWattHours: revision.resolutionWattHours,
    lowerLimitWatts: revision.lowerLimitWatts,
    readsTruePower: revision.readsTruePower,
  };
}

export async function findInstrument(
  work: Work,
  memberId: number,
  publicId: string,
): Promise<InstrumentRevision | null> {
  const { Instrument, InstrumentRevision: Revision } = work.models;
  const row = await Instrument.findOne({ where: { publicId, memberId }, transaction: work.transaction });
  return row?.currentRevisionId ? Revision.findByPk(row.currentRevisionId, { transaction: work.transaction }) : null;
}

async function findMethod(work: Work, code: string): Promise<MethodRevision | null> {
  const row = await work.models.Method.findOne({ where: { code }, transaction: work.transaction });
  return row?.currentRevisionId
    ? work.models.MethodRevision.findByPk(row.currentRevisionId, { transaction: work.transaction })
    : null;
}

export async function findTraces(work: Work, memberId: number, publicIds: string[]): Promise<Map<string, TraceRow>> {
  const rows = await work.models.Trace.findAll({
    where: { publicId: publicIds, memberId },
    transaction: work.transaction,
  });
  return new Map(rows.map((row) => [row.publicId, row]));
}

function incomplete(fields: FieldProblem[]): AppError {
  return new AppError('bad-input', 'The report can’t be sent as it is; each field says what is missing.', { fields });
}
