import 'server-only';
import type { Category } from '@/lib/catalogue/schema';
import { now } from '@/lib/platform/clock';
import type { Work } from '@/lib/platform/database/transaction';
import { AppError, type FieldProblem } from '@/lib/platform/errors';
import type { Attachment } from '@/models/attachment';
import type { InstrumentRevision } from '@/models/instrument-revision';
import type { MethodRevision } from '@/models/method-revision';
import type { Trace as TraceRow } from '@/models/trace';
import { checkContent } from '../rules/check-content';
import { exchangedModes } from '../rules/check-modes';
import type { Computation } from '../rules/compute-figures';
import type { Submission } from '../schema';
import { computeFromTraces } from './compute-from-traces';
import { findInstrument, findMethod, findTraces } from './find-evidence';

/** Everything that a submission refers to, found and its member's own, and the figures that follow. */
export interface Evidence {
  method: MethodRevision;
  instrument: InstrumentRevision;
  traces: Map<string, TraceRow>;
  photos: Attachment[];
  computation: Computation;
}

/** @throws {AppError} bad-input naming each field that refers to nothing, contradicts another, or yields nothing. */
export async function gatherEvidence(
  work: Work,
  memberId: number,
  category: Category,
  { content, instrumentPublicId }: Submission,
): Promise<Evidence> {
  const instrument = await findInstrument(work, memberId, instrumentPublicId);
  const method = await findMethod(work, content.methodCode);
  const traces = await findTraces(work, memberId, content.traces);
  const photos = await findPhotos(work, memberId, content);
  const problems: FieldProblem[] = [
    ...instrumentProblems(instrument, content),
    ...methodProblems(method, content),
    ...checkContent(content, {
      now: now(),
      modeCodes: new Set(category.modes.map((mode) => mode.code)),
      conditionKeys: new Set(category.conditions.map((condition) => condition.key)),
      traces,
    }),
    ...photoProblems(photos, content),
  ];
  if (problems.length > 0 || !instrument || !method) throw incomplete(problems);
  const computation = await computeFromTraces({
    duty: category.duty,
    phases: content.phases,
    supplyClass: content.supplyClass,
    voltsMeasured: content.supplyVolts !== null,
    instrument,
    traces,
  });
  const doubts = figureProblems(computation, content, category);
  if (doubts.length > 0) throw incomplete(doubts);
  return { method, instrument, traces, photos, computation };
}

type Content = Submission['content'];

function instrumentProblems(instrument: InstrumentRevision | null, { supplyClass }: Content): FieldProblem[] {
  const pointer = '/instrumentPublicId';
  if (!instrument) return [{ pointer, message: 'Choose one of your instruments.' }];
  if (instrument.supplies.includes(supplyClass)) return [];
  const message = 'This instrument doesn’t measure that supply. Choose another, or correct the supply.';
  return [{ pointer, message }];
}

function methodProblems(method: MethodRevision | null, { cautionConfirmed }: Content): FieldProblem[] {
  if (!method) return [{ pointer: '/content/methodCode', message: 'Choose a method from the list.' }];
  if (!method.needsConfirmation || cautionConfirmed) return [];
  const message = 'Read the caution of this method and confirm that it was kept to.';
  return [{ pointer: '/content/cautionConfirmed', message }];
}

function findPhotos(work: Work, memberId: number, { photos }: Content): Promise<Attachment[]> {
  return work.models.Attachment.findAll({
    where: { publicId: photos.map((photo) => photo.publicId), memberId },
    transaction: work.transaction,
  });
}

function photoProblems(found: Attachment[], { photos }: Content): FieldProblem[] {
  const known = new Set(found.map((photo) => photo.publicId));
  return photos.flatMap(({ publicId }, i) =>
    known.has(publicId)
      ? []
      : [{ pointer: `/content/photos/${i}`, message: 'This photo is not there any more. Add it again.' }],
  );
}

/** What only the figures show: none at all, or modes that were exchanged. */
function figureProblems({ figures, refusals }: Computation, { phases }: Content, category: Category): FieldProblem[] {
  if (figures.length === 0) {
    const [first] = refusals;
    return [{ pointer: '/content/phases', message: first?.reason ?? 'No figure follows from these phases.' }];
  }
  const nameOf = (code: string) => category.modes.find((mode) => mode.code === code)?.name ?? code;
  return exchangedModes(figures).map(({ rest, work }) => ({
    pointer: `/content/phases/${Math.max(
      0,
      phases.findIndex((phase) => phase.modeCode === rest),
    )}/modeCode`,
    message: `${nameOf(rest)} draws more than ${nameOf(work)} here. Were the two exchanged?`,
  }));
}

function incomplete(fields: FieldProblem[]): AppError {
  return new AppError('bad-input', 'The report can’t be sent as it is; each field says what is missing.', { fields });
}
