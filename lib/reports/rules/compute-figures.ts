import type { Trace } from '@/lib/measurement/traces/trace';
import { measureCyclic } from '@/lib/measurement/uncertainty/measure-cyclic';
import { measureMaximum } from '@/lib/measurement/uncertainty/measure-maximum';
import { measureMeanPower, type TraceStretch } from '@/lib/measurement/uncertainty/measure-mean';
import { asEnergy, measureTypedMean } from '@/lib/measurement/uncertainty/measure-typed';
import { measureUseEnergy } from '@/lib/measurement/uncertainty/measure-uses';
import type { MeasuredFigure, StatedAccuracy } from '@/lib/measurement/uncertainty/types';
import type { Duty } from '@/lib/measurement/units/quantity';
import type { Phase } from '../schema';

/** A figure of a report: of one mode, or of none where it covers the whole day or use. */
export interface ReportFigureDraft extends MeasuredFigure {
  modeCode: string | null;
}

export interface Computation {
  figures: ReportFigureDraft[];
  /** What could not be computed, and why, in words for the member. */
  refusals: { modeCode: string | null; reason: string }[];
}

export interface ComputationInput {
  duty: Duty;
  phases: readonly Phase[];
  accuracy: StatedAccuracy;
  traceOf: (publicId: string) => Trace;
}

/** The modes that a thermostat's whole cycles yield besides the energy of a day. */
export const CYCLING = 'cycling';
const RUNNING = 'running';
const BETWEEN = 'between-cycles';
const WHOLE_USE = 'programme';
/** A day's energy of what draws all day needs a day, less what a reading early or late costs. */
const WHOLE_DAY_SECONDS = 23.5 * 3600;

/**
 * All figures that a report's phases yield. Several phases of one mode are one figure: summed energy over summed time.
 * Figures that a category's duty does not support are refused with the reason, never guessed.
 */
export function computeFigures(input: ComputationInput): Computation {
  const result: Computation = { figures: [], refusals: [] };
  const modes = [...new Set(input.phases.map((phase) => phase.modeCode))];
  for (const modeCode of modes) {
    const phases = input.phases.filter((phase) => phase.modeCode === modeCode);
    const stretches = phases.flatMap((phase): TraceStretch[] =>
      phase.source === 'trace' ? [{ trace: input.traceOf(phase.tracePublicId), ...phase }] : [],
    );
    const typed = phases.flatMap((phase) => (phase.source === 'typed' ? [phase] : []));
    if (stretches.length > 0) fromTrace(input, modeCode, stretches, result);
    else fromDisplay(input, modeCode, typed, result);
  }
  return result;
}

function fromTrace(input: ComputationInput, modeCode: string, stretches: TraceStretch[], result: Computation): void {
  if (modeCode === CYCLING) return fromCycles(input, stretches, result);
  if (input.duty === 'per-use' && modeCode === WHOLE_USE) {
    const use = measureUseEnergy(stretches, input.accuracy);
    if (use) result.figures.push({ ...use, modeCode: null });
    else result.refusals.push({ modeCode, reason: 'One of the uses holds no counted time. Move its edges.' });
    return;
  }
  const mean = measureMeanPower(stretches, input.accuracy);
  if (!mean) {
    result.refusals.push({ modeCode, reason: 'This phase holds no counted time: fewer than two readings, or a gap.' });
    return;
  }
  result.figures.push({ ...mean, modeCode });
  const maximum = measureMaximum(stretches, input.accuracy);
  if (maximum) result.figures.push({ ...maximum, modeCode });
  pushWholeDay(input, mean, result);
}

/** The longest stretch of cycles counts: each stretch has whole cycles of its own, and two are not one. */
function fromCycles(input: ComputationInput, stretches: TraceStretch[], result: Computation): void {
  const longest = stretches.reduce((a, b) => (b.toSeconds - b.fromSeconds > a.toSeconds - a.fromSeconds ? b : a));
  const cyclic = measureCyclic(longest, input.accuracy);
  if (!cyclic.accepted) {
    result.refusals.push({ modeCode: CYCLING, reason: cyclic.reason });
    return;
  }
  result.figures.push(
    { ...cyclic.dayEnergy, modeCode: null },
    { ...cyclic.running, modeCode: RUNNING },
    { ...cyclic.between, modeCode: BETWEEN },
  );
  const maximum = measureMaximum([longest], input.accuracy);
  if (maximum) result.figures.push({ ...maximum, modeCode: RUNNING });
}

type TypedPhase = Extract<Phase, { source: 'typed' }>;

function fromDisplay(input: ComputationInput, modeCode: string, phases: TypedPhase[], result: Computation): void {
  const total = sumOfTyped(phases);
  const mean = measureTypedMean(total, input.accuracy);
  if (!mean) return;
  if (modeCode === CYCLING) {
    if (total.durationSeconds < WHOLE_DAY_SECONDS) {
      const reason = 'A thermostat’s day needs a day or more of energy read off the display. Measure longer.';
      result.refusals.push({ modeCode, reason });
    } else result.figures.push({ ...asEnergy(mean, 24, 'day-energy'), modeCode: null });
    return;
  }
  if (input.duty === 'per-use' && modeCode === WHOLE_USE) {
    const uses = phases.reduce((sum, phase) => sum + (phase.uses ?? 1), 0);
    const hours = total.durationSeconds / 3600 / uses;
    result.figures.push({ ...asEnergy(mean, hours, 'use-energy'), modeCode: null });
    return;
  }
  result.figures.push({ ...mean, modeCode });
  pushWholeDay(input, mean, result);
}

/** Energy over time, where every phase has one; otherwise the mean weighted by time. */
function sumOfTyped(phases: TypedPhase[]) {
  const durationSeconds = phases.reduce((sum, phase) => sum + phase.durationSeconds, 0);
  const allHaveEnergy = phases.every((phase) => phase.energyWattHours !== null);
  const energy = phases.reduce((sum, phase) => sum + (phase.energyWattHours ?? 0), 0);
  const weighted = phases.reduce(
    (sum, { meanWatts, energyWattHours, durationSeconds: seconds }) =>
      sum + (meanWatts === null ? (energyWattHours ?? 0) * 3600 : meanWatts * seconds),
    0,
  );
  const lowest = phases.flatMap((phase) => phase.minimumWatts ?? []);
  const highest = phases.flatMap((phase) => phase.maximumWatts ?? []);
  return {
    durationSeconds,
    energyWattHours: allHaveEnergy ? energy : null,
    meanWatts: allHaveEnergy ? null : weighted / durationSeconds,
    minimumWatts: lowest.length > 0 ? Math.min(...lowest) : null,
    maximumWatts: highest.length > 0 ? Math.max(...highest) : null,
    uses: null,
  };
}

/** What draws all day long and was measured for a day has an energy of a day besides. */
function pushWholeDay(input: ComputationInput, mean: MeasuredFigure, result: Computation): void {
  if (input.duty !== 'continuous' || mean.countedSeconds < WHOLE_DAY_SECONDS) return;
  if (result.figures.some((figure) => figure.quantity === 'day-energy')) return;
  result.figures.push({ ...asEnergy(mean, 24, 'day-energy'), modeCode: null });
}
