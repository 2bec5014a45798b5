import { autocorrelation } from '../statistics/autocorrelation';
import { compensatedSum } from '../statistics/compensated-sum';
import { mean } from '../statistics/mean';
import { standardDeviation } from '../statistics/standard-deviation';

const BATCHES = 10;
const LEAST_READINGS_A_BATCH = 30;
const LEAST_TIMES_A_BATCH = 5;

/**
 * The standard uncertainty of the mean of a steady stretch, from the means of ten batches; where a batch would hold
 * fewer than thirty readings or five autocorrelation times, (max − min)/√12 of the means of thirds.
 *
 * Method: batch means (Law and Kelton); the autocorrelation time is (1 + r)/(1 − r) of the lag-1 autocorrelation r.
 * @param values n ≥ 1, in order, evenly weighted.
 * @returns 0 for a single value.
 * @example steadyRepeatability([10, 10, 10]) // 0
 */
export function steadyRepeatability(values: Float64Array): number {
  if (values.length < 3) return spotRepeatability(values);
  const perBatch = Math.floor(values.length / BATCHES);
  const r = Math.min(0.9999, Math.max(0, autocorrelation(values, 1)));
  const correlated = (1 + r) / (1 - r);
  if (perBatch >= LEAST_READINGS_A_BATCH && perBatch >= LEAST_TIMES_A_BATCH * correlated) {
    return standardDeviation(groupMeans(values, BATCHES)) / Math.sqrt(BATCHES);
  }
  return spotRepeatability(groupMeans(values, 3));
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

/** Of a few values with nothing else known: (max − min)/√12. */
export function spotRepeatability(values: ArrayLike<number>): number {
  const all = Array.from(values);
  return (Math.max(...all) - Math.min(...all)) / Math.sqrt(12);
}

function groupMeans(values: Float64Array, groups: number): number[] {
  return Array.from({ length: groups }, (_, i) =>
    mean(values.subarray(Math.floor((i * values.length) / groups), Math.floor(((i + 1) * values.length) / groups))),
  );
}
