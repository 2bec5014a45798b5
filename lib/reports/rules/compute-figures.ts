import type { Trace } from '@/lib/measurement/traces/trace';
import { measureCyclic } from '@/lib/measurement/uncertainty/measure-cyclic';
import { measureMaximum } from '@/lib/measurement/uncertainty/measure-maximum';
import { measureMeanPower, type TraceStretch } from '@/lib/measurement/uncertainty/measure-mean';
import { asEnergy } from '@/lib/measurement/uncertainty/measure-typed';
import { measureUseEnergy } from '@/lib/measurement/uncertainty/measure-uses';
import { poolMeans } from '@/lib/measurement/uncertainty/pool-means';
import type { MeasuredFigure, StatedAccuracy } from '@/lib/measurement/uncertainty/types';
import type { Duty, SupplyClass } from '@/lib/measurement/units/quantity';
import type { Phase } from '../schema';
import { forSupply, type AccuracyOf } from './readings-by-supply';
import { meanOfTyped, type TypedPhase } from './typed-readings';

/** A figure of a report: of one mode, or of none where it covers the whole day or use. */
export interface ReportFigureDraft extends MeasuredFigure {
  modeCode: string | null;
}

export interface Computation {
  figures: ReportFigureDraft[];
  /** What could not be computed, and why, in words for the member. */
  refusals: { modeCode: string | null; reason: string }[];
  /** Whole cycles of a thermostat that the energy of a day rests on; null where there is none. */
  wholeCycles: number | null;
}

export interface ComputationInput {
  duty: Duty;
  supplyClass: SupplyClass;
  phases: readonly Phase[];
  accuracy: StatedAccuracy;
  traceOf: (publicId: string) => Trace;
  /** Whether a trace's watts are amperes times a voltage that was not measured. */
  assumesVolts: (publicId: string) => boolean;
}

/** What the rules of one mode are given. */
interface ModeReadings {
  modeCode: string;
  stretches: TraceStretch[];
  uses: number[];
  typed: TypedPhase[];
  /** The stated accuracy, wider where a voltage was only assumed. */
  accuracy: StatedAccuracy;
  /** The stated accuracy as it is: a display's watts assume nothing. */
  ofDisplay: StatedAccuracy;
}

/** The modes that a thermostat's whole cycles yield besides the energy of a day. */
export const CYCLING = 'cycling';
const RUNNING = 'running';
const BETWEEN = 'between-cycles';
const WHOLE_USE = 'programme';
/** A day's energy of what draws all day needs a day, less what a reading early or late costs. */
const WHOLE_DAY_SECONDS = 23.5 * 3600;
const HOURS_A_DAY = 24;

/**
 * All figures that a report's phases yield. Several phases of one mode are one figure: summed energy over summed time.
 * Figures that a category's duty does not support are refused with the reason, never guessed.
 */
export function computeFigures(input: ComputationInput): Computation {
  const result: Computation = { figures: [], refusals: [], wholeCycles: null };
  const { traceOf, accuracyOf } = forSupply(input);
  // Cycles first: what they say of running and resting rests on whole cycles, and counts before what is marked beside.
  const modes = [...new Set(input.phases.map((phase) => phase.modeCode))];
  for (const modeCode of modes.sort((a, b) => Number(b === CYCLING) - Number(a === CYCLING))) {
    const readings = readingsOf(input, modeCode, traceOf, accuracyOf);
    if (modeCode === CYCLING) ofCycles(readings, result);
    else if (input.duty === 'per-use' && modeCode === WHOLE_USE) ofUses(readings, result);
    else ofMode(input.duty, readings, result);
  }
  return withoutOverflow(result);
}

function readingsOf(
  input: ComputationInput,
  modeCode: string,
  traceOf: ComputationInput['traceOf'],
  accuracyOf: AccuracyOf,
): ModeReadings {
  const phases = input.phases.filter((phase) => phase.modeCode === modeCode);
  const traced = phases.flatMap((phase) => (phase.source === 'trace' ? [phase] : []));
  return {
    modeCode,
    stretches: traced.map(({ tracePublicId, fromSeconds, toSeconds }) => {
      return { trace: traceOf(tracePublicId), fromSeconds, toSeconds };
    }),
    uses: traced.map((phase) => phase.uses ?? 1),
    typed: phases.flatMap((phase) => (phase.source === 'typed' ? [phase] : [])),
    accuracy: accuracyOf(traced.map((phase) => phase.tracePublicId)),
    ofDisplay: accuracyOf([]),
  };
}

function ofMode(duty: Duty, readings: ModeReadings, result: Computation): void {
  const { modeCode, stretches, typed, accuracy } = readings;
  const means: MeasuredFigure[] = byPowerKind(stretches).flatMap((group) => measureMeanPower(group, accuracy) ?? []);
  const ofTyped = meanOfTyped(typed, readings.ofDisplay);
  if (ofTyped) means.push(ofTyped);
  if (stretches.length > 0 && means.length === (ofTyped ? 1 : 0)) {
    const reason = 'This phase holds no counted time: fewer than two readings, or a gap.';
    result.refusals.push({ modeCode, reason });
  }
  // Real and apparent power are never one figure.
  for (const powerKind of ['real', 'apparent'] as const) {
    const [first, ...rest] = means.filter((mean) => mean.powerKind === powerKind);
    if (!first) continue;
    const mean = poolMeans([first, ...rest]);
    if (add(result, { ...mean, modeCode })) pushWholeDay(duty, mean, result);
    else
      result.refusals.push({
        modeCode,
        reason: 'The whole cycles say this already; what was marked beside them does not count.',
      });
  }
  pushMaximum(modeCode, stretches, accuracy, result);
}

/** The longest stretch of cycles counts: each stretch has whole cycles of its own, and two are not one. */
function ofCycles({ stretches, typed, accuracy }: ModeReadings, result: Computation): void {
  if (stretches.length === 0) return ofTypedDay(typed, accuracy, result);
  if (typed.length > 0) refuseTyped(CYCLING, result);
  const longest = stretches.reduce((a, b) => (b.toSeconds - b.fromSeconds > a.toSeconds - a.fromSeconds ? b : a));
  const cyclic = measureCyclic(longest, accuracy);
  if (!cyclic.accepted) {
    result.refusals.push({ modeCode: CYCLING, reason: cyclic.reason });
    return;
  }
  result.wholeCycles = cyclic.finding.cycles.length;
  result.figures.push(
    { ...cyclic.dayEnergy, modeCode: null },
    { ...cyclic.running, modeCode: RUNNING },
    { ...cyclic.between, modeCode: BETWEEN },
  );
  pushMaximum(RUNNING, [longest], accuracy, result);
}

function ofTypedDay(typed: TypedPhase[], accuracy: StatedAccuracy, result: Computation): void {
  const mean = meanOfTyped(typed, accuracy);
  if (!mean) return;
  if (mean.countedSeconds < WHOLE_DAY_SECONDS) {
    const reason = 'A thermostat’s day needs a day or more of energy read off the display. Measure longer.';
    result.refusals.push({ modeCode: CYCLING, reason });
  } else result.figures.push({ ...asEnergy(mean, HOURS_A_DAY, 'day-energy'), modeCode: null });
}

function ofUses({ modeCode, stretches, uses, typed, accuracy }: ModeReadings, result: Computation): void {
  if (stretches.length > 0 && typed.length > 0) refuseTyped(modeCode, result);
  if (stretches.length === 0) {
    const mean = meanOfTyped(typed, accuracy);
    const count = typed.reduce((sum, phase) => sum + (phase.uses ?? 1), 0);
    if (mean) result.figures.push({ ...perUse(mean, count), modeCode: null });
    return;
  }
  if (byPowerKind(stretches).length > 1) {
    result.refusals.push({ modeCode, reason: 'Some uses were recorded in W and others in VA. Keep one kind.' });
    return;
  }
  const isOneEach = uses.every((count) => count === 1);
  const mean = isOneEach ? null : measureMeanPower(stretches, accuracy);
  const count = uses.reduce((sum, of) => sum + of, 0);
  const use = isOneEach ? measureUseEnergy(stretches, accuracy) : mean && perUse(mean, count);
  if (use) result.figures.push({ ...use, modeCode: null });
  else result.refusals.push({ modeCode, reason: 'One of the uses holds no counted time. Move its edges.' });
}

/** Several uses in one stretch: its whole energy over their number. */
function perUse(mean: MeasuredFigure, uses: number): MeasuredFigure {
  return asEnergy(mean, mean.countedSeconds / 3600 / uses, 'use-energy');
}

function pushMaximum(modeCode: string, stretches: TraceStretch[], accuracy: StatedAccuracy, result: Computation): void {
  for (const group of byPowerKind(stretches)) {
    const maximum = measureMaximum(group, accuracy);
    if (maximum) add(result, { ...maximum, modeCode });
  }
}

/** What draws all day long and was measured for a day has an energy of a day besides. */
function pushWholeDay(duty: Duty, mean: MeasuredFigure, result: Computation): void {
  if (duty !== 'continuous' || mean.countedSeconds < WHOLE_DAY_SECONDS) return;
  add(result, { ...asEnergy(mean, HOURS_A_DAY, 'day-energy'), modeCode: null });
}

/** A report has one figure of a mode, a quantity and a kind of power; a second one is not taken. */
function add(result: Computation, figure: ReportFigureDraft): boolean {
  const isThere = result.figures.some(
    ({ modeCode, quantity, powerKind }) =>
      modeCode === figure.modeCode && quantity === figure.quantity && powerKind === figure.powerKind,
  );
  if (!isThere) result.figures.push(figure);
  return !isThere;
}

function byPowerKind(stretches: TraceStretch[]): TraceStretch[][] {
  const kinds = ['real', 'apparent'] as const;
  const groups = kinds.map((kind) => stretches.filter(({ trace }) => trace.powerKind === kind));
  return groups.filter((group) => group.length > 0);
}

function refuseTyped(modeCode: string, result: Computation): void {
  const reason = 'The recording counts; what was typed beside it for the same mode does not.';
  result.refusals.push({ modeCode, reason });
}

/** A reading may be larger than any power: what no longer is a number is refused, not stored. */
function withoutOverflow(result: Computation): Computation {
  const isSound = ({ value, standardUncertainty }: ReportFigureDraft) =>
    Number.isFinite(value) && Number.isFinite(standardUncertainty);
  const unsound = result.figures.filter((figure) => !isSound(figure));
  const reason = 'The readings of this phase are too large to be watts. Check the unit of the trace.';
  return {
    ...result,
    figures: result.figures.filter(isSound),
    refusals: [...result.refusals, ...unsound.map(({ modeCode }) => ({ modeCode, reason }))],
  };
}
