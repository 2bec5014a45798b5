import { mean } from '../statistics/mean';
import { formatDuration, formatFigure, formatRange } from '../units/format-figure';
import { testInterleaving, type SetStretch } from './interleaving';
import { welchDifference } from './welch';

export interface ContrastSet {
  /** As the member calls it: "rain", "eco mode on". */
  name: string;
  stretches: readonly (SetStretch & { meanWatts: number })[];
}

export interface ContrastInput {
  first: ContrastSet;
  second: ContrastSet;
  /** Of one report, or of two by one contributor with one instrument. */
  sameInstrument: boolean;
  /** a % of the instrument's reading. */
  percentOfReading: number;
  /** q in W. */
  stepWatts: number;
  /** Over what the readings average; 0 for instants. */
  averagingSeconds: number;
  unit: 'W' | 'VA';
}

export interface Contrast {
  outcome: 'larger' | 'smaller' | 'no-difference-shown' | 'cause-not-shown';
  /** First minus second (W). */
  difference: number;
  standardError: number | null;
  degreesOfFreedom: number | null;
  interval: { low: number; high: number } | null;
  /** What the instrument's gain leaves of the difference: a · |difference| (W). */
  gainRemainder: number;
  /** The larger end of the interval in size; null where the cause is not shown. */
  atMost: number | null;
  /** Why the cause is not shown; otherwise null. */
  reason: string | null;
  sentence: string;
}

const LEAST_STRETCHES = 3;

/**
 * Whether two sets of stretches differ by more than the readings can show. The stretch is the unit: half an hour of one
 * steady phase "differs" from the next half in a third of real cases, three and three interleaved ones in one of a
 * hundred.
 *
 * Method: Welch's t interval of the stretches' means, 95 %.
 * @param input stretches of each set: one or more.
 * @throws {RangeError} where a set is empty.
 * @example compareSets(three of 50 W and three of 40 W in turn).outcome // 'larger'
 */
export function compareSets(input: ContrastInput): Contrast {
  const { first, second, percentOfReading, stepWatts } = input;
  const a = first.stretches.map((stretch) => stretch.meanWatts);
  const b = second.stretches.map((stretch) => stretch.meanWatts);
  const reason = obstacleOf(input);
  if (reason !== null) return unexplained(input, mean(a) - mean(b), reason);
  const { difference, standardError, degreesOfFreedom, interval } = welchDifference(a, b, stepWatts);
  const outcome = interval.low > 0 ? 'larger' : interval.high < 0 ? 'smaller' : 'no-difference-shown';
  const atMost = Math.max(Math.abs(interval.low), Math.abs(interval.high));
  const gainRemainder = (percentOfReading / 100) * Math.abs(difference);
  const contrast = { outcome, difference, standardError, degreesOfFreedom, interval, gainRemainder, atMost } as const;
  return { ...contrast, reason: null, sentence: `${statement(input, contrast)} ${averagingOf(input)}` };
}

/** Why the readings can't tell the cause, if so. */
function obstacleOf({ first, second, sameInstrument }: ContrastInput): string | null {
  if (!sameInstrument) return 'They were not read by one contributor with one instrument.';
  if (Math.min(first.stretches.length, second.stretches.length) < LEAST_STRETCHES) {
    return 'Each set needs three stretches or more.';
  }
  const interleaving = testInterleaving(first.stretches, second.stretches);
  return interleaving.interleaved ? null : interleaving.reason;
}

function statement(input: ContrastInput, contrast: Pick<Contrast, 'outcome' | 'difference' | 'atMost'> & Limits) {
  const { first, second, unit } = input;
  if (contrast.outcome === 'no-difference-shown') {
    return `No difference larger than ${amount(contrast.atMost ?? 0, unit)} shown between ${first.name} and ${second.name}.`;
  }
  const sizes = [Math.abs(contrast.interval.low), Math.abs(contrast.interval.high)].sort((a, b) => a - b);
  const range = formatRange(sizes[0] as number, sizes[1] as number, unit);
  const word = contrast.outcome === 'larger' ? 'more' : 'less';
  const gain =
    contrast.gainRemainder > 0 ? `; the instrument’s gain leaves ${amount(contrast.gainRemainder, unit)} open` : '';
  const size = amount(Math.abs(contrast.difference), unit);
  return `${first.name} drew ${size} ${word} than ${second.name} (95 % interval ${range}${gain}).`;
}

interface Limits {
  interval: { low: number; high: number };
  gainRemainder: number;
}

function unexplained(input: ContrastInput, difference: number, reason: string): Contrast {
  const { first, second, percentOfReading, unit } = input;
  const size = amount(Math.abs(difference), unit);
  return {
    outcome: 'cause-not-shown',
    difference,
    standardError: null,
    degreesOfFreedom: null,
    interval: null,
    gainRemainder: (percentOfReading / 100) * Math.abs(difference),
    atMost: null,
    reason,
    sentence: `${first.name} and ${second.name} differed by ${size} in these stretches; the cause is not shown. ${reason} ${averagingOf(input)}`,
  };
}

/** Averages longer than an effect hide it. */
function averagingOf({ averagingSeconds }: ContrastInput): string {
  return averagingSeconds > 0
    ? `The readings average over ${formatDuration(averagingSeconds)}: what is shorter is hidden in them.`
    : 'The readings are instants.';
}

function amount(watts: number, unit: string): string {
  return formatFigure({ value: watts, unit }).text;
}
