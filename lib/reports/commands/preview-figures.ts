import 'server-only';
import type { Category } from '@/lib/catalogue/schema';
import type { Trace } from '@/lib/measurement/traces/trace';
import type { Work } from '@/lib/platform/database/transaction';
import { AppError } from '@/lib/platform/errors';
import { readSeries } from '../queries/traces';
import { computeFigures, type Computation } from '../rules/compute-figures';
import type { Phase } from '../schema';
import { findInstrument, findTraces, statedAccuracy } from './gather-evidence';

/**
 * The figures that phases would yield with an instrument; nothing is kept.
 * @throws {AppError} bad-input where instrument or trace are not the member's own.
 */
export async function previewFigures(
  work: Work,
  memberId: number,
  category: Category,
  instrumentPublicId: string,
  phases: Phase[],
): Promise<Computation> {
  const instrument = await findInstrument(work, memberId, instrumentPublicId);
  if (!instrument) throw new AppError('bad-input', 'Choose one of your instruments first.');
  const wanted = phases.flatMap((phase) => (phase.source === 'trace' ? [phase.tracePublicId] : []));
  const rows = await findTraces(work, memberId, [...new Set(wanted)]);
  const series = new Map<string, Trace>();
  for (const [publicId, row] of rows) series.set(publicId, await readSeries(row));
  if (wanted.some((publicId) => !series.has(publicId))) {
    throw new AppError('bad-input', 'A phase’s trace is not there any more. Import it again.');
  }
  return computeFigures({
    duty: category.duty,
    phases,
    accuracy: statedAccuracy(instrument),
    traceOf: (publicId) => series.get(publicId) as Trace,
  });
}
