import { autocorrelation } from '../statistics/autocorrelation';
import { compensatedSum, CompensatedSum } from '../statistics/compensated-sum';
import { mean } from '../statistics/mean';
import { standardDeviation } from '../statistics/standard-deviation';
import { studentTQuantile } from '../statistics/student-t';

const BATCHES = 10;
const LEAST_READINGS_A_BATCH = 30;
const LEAST_TIMES_A_BATCH = 5;
/** A correlation of 1 would have no end. */
const LARGEST_CORRELATION = 0.9999;
/** Half the width that 95 % of a normal distribution has in standard deviations: turns t into a standard uncertainty. */
const NORMAL_95 = 1.959963984540054;

/**
 * The standard uncertainty of the mean of a steady stretch, from the means of ten batches of equal time; where a batch
 * would hold fewer than thirty readings or five autocorrelation times, (max − min)/√12 of the means of thirds.
 *
 * Method: batch means (Law and Kelton); the autocorrelation time is (1 + r)/(1 − r) readings, of the lag-1
 * autocorrelation r.
 * @param values in order; n ≥ 0.
 * @param weights seconds that each value stands for, of the same length.
 * @returns 0 for a single value.
 * @example steadyRepeatability(Float64Array.of(10, 10, 10), Float64Array.of(1, 1, 1)) // 0
 */
export function steadyRepeatability(values: Float64Array, weights: Float64Array): number {
  if (values.length < 3) return spotRepeatability(values);
  const batches = groupMeans(values, weights, BATCHES);
  const r = Math.min(LARGEST_CORRELATION, Math.max(0, autocorrelation(values, 1)));
  const least = Math.max(LEAST_READINGS_A_BATCH, (LEAST_TIMES_A_BATCH * (1 + r)) / (1 - r));
  if (batches.length === BATCHES && batches.every((batch) => batch.readings >= least)) {
    return standardDeviation(batches.map((batch) => batch.mean)) / Math.sqrt(BATCHES);
  }
  return spotRepeatability(groupMeans(values, weights, 3).map((third) => third.mean));
}

/**
 * The standard uncertainty of a mean power over whole cycles: s(E_i − P·T_i)/(T̄ √n).
 *
 * @param cycles n ≥ 2.
 * @returns W.
 * @example cyclicRepeatability([{ wattHours: 10, seconds: 1200 }, { wattHours: 10, seconds: 1200 }]) // 0
 */
export function cyclicRepeatability(cycles: readonly { wattHours: number; seconds: number }[]): number {
  const seconds = cycles.map((cycle) => cycle.seconds);
  const watts = (compensatedSum(cycles.map((cycle) => cycle.wattHours)) * 3600) / compensatedSum(seconds);
  const rest = cycles.map((cycle) => cycle.wattHours * 3600 - watts * cycle.seconds);
  return standardDeviation(rest) / (mean(seconds) * Math.sqrt(cycles.length));
}

/**
 * The standard uncertainty of the mean of repeated readings: s/√n, widened by Student's t, since few readings tell
 * little about how they spread (t = 12.7, 4.3, 2.8 at n = 2, 3, 5).
 *
 * Source: JCGM 100:2008 (GUM), 4.2.3 and G.3.
 * @param values n ≥ 2.
 * @returns half of the 95 % interval over 1.96: expanded like any other part.
 * @throws {RangeError} below two values.
 * @example repeatedReadings([10, 12]) // 6.482…: s/√n = 1, t = 12.706
 */
export function repeatedReadings(values: readonly number[]): number {
  const n = values.length;
  const standardError = standardDeviation(values) / Math.sqrt(n);
  return (studentTQuantile(0.975, n - 1) / NORMAL_95) * standardError;
}

/**
 * Of a few values with nothing else known, a spot reading's stated minimum and maximum say: (max − min)/√12.
 *
 * Source: JCGM 100:2008 (GUM), 4.3.7 and 4.3.8.
 * @returns 0 for none or one.
 * @example spotRepeatability([40, 46]) // 1.732…
 */
export function spotRepeatability(values: ArrayLike<number>): number {
  let [minimum, maximum] = [Infinity, -Infinity];
  for (let i = 0; i < values.length; i += 1) {
    minimum = Math.min(minimum, values[i] as number);
    maximum = Math.max(maximum, values[i] as number);
  }
  return maximum > minimum ? (maximum - minimum) / Math.sqrt(12) : 0;
}

/** Means of groups of equal time, and how many readings each holds; a group that no time counts in is left out. */
function groupMeans(values: Float64Array, weights: Float64Array, groups: number): { mean: number; readings: number }[] {
  const total = compensatedSum(weights);
  const sums = Array.from({ length: groups }, () => ({ power: new CompensatedSum(), time: 0, readings: 0 }));
  let reached = 0;
  for (let i = 0; i < values.length; i += 1) {
    const weight = weights[i] as number;
    // A reading belongs where its middle lies.
    const middle = (reached + weight / 2) / total;
    const group = sums[Math.min(groups - 1, Math.floor(middle * groups))];
    reached += weight;
    if (!group || weight === 0) continue;
    group.power.add((values[i] as number) * weight);
    group.time += weight;
    group.readings += 1;
  }
  return sums
    .filter((group) => group.time > 0)
    .map(({ power, time, readings }) => ({ mean: power.value / time, readings }));
}
