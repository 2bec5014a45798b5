import 'server-only';
import type { Category } from '@/lib/catalogue/schema';
import type { Work } from '@/lib/platform/database/transaction';
import { AppError } from '@/lib/platform/errors';
import type { Computation } from '../rules/compute-figures';
import { whatIsMissing } from '../rules/what-is-missing';
import type { Phase, ReportContent } from '../schema';
import { computeFromTraces } from './compute-from-traces';
import { findInstrument, findMethod, findTraces } from './find-evidence';

export interface FiguresToPreview {
  instrumentPublicId: string;
  phases: Phase[];
  supplyClass: ReportContent['supplyClass'];
  supplyVolts: number | null;
  /** Null where none is chosen yet: then nothing is held against its minimum. */
  methodCode: string | null;
}

export interface Preview extends Computation {
  /** What the report lacks of its method's minimum, in words. */
  missing: string[];
}

/**
 * The figures that phases would yield with an instrument; nothing is kept.
 * @throws {AppError} bad-input where instrument or trace are not the member's own.
 */
export async function previewFigures(
  work: Work,
  memberId: number,
  category: Category,
  { instrumentPublicId, phases, supplyClass, supplyVolts, methodCode }: FiguresToPreview,
): Promise<Preview> {
  const instrument = await findInstrument(work, memberId, instrumentPublicId);
  if (!instrument) throw new AppError('bad-input', 'Choose one of your instruments first.');
  const wanted = [...new Set(phases.flatMap((phase) => (phase.source === 'trace' ? [phase.tracePublicId] : [])))];
  const traces = await findTraces(work, memberId, wanted);
  if (wanted.some((publicId) => !traces.has(publicId))) {
    throw new AppError('bad-input', 'A phase’s trace is not there any more. Import it again.');
  }
  const computation = await computeFromTraces({
    duty: category.duty,
    phases,
    supplyClass,
    voltsMeasured: supplyVolts !== null,
    instrument,
    traces,
  });
  const nameOf = (code: string) => category.modes.find((mode) => mode.code === code)?.name ?? code;
  const method = methodCode === null ? null : await findMethod(work, methodCode);
  const seconds = phases.reduce((sum, phase) => sum + secondsOf(phase), 0);
  return { ...computation, missing: method ? whatIsMissing(method, computation, seconds, nameOf) : [] };
}

function secondsOf(phase: Phase): number {
  return phase.source === 'typed' ? phase.durationSeconds : phase.toSeconds - phase.fromSeconds;
}
