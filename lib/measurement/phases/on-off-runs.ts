import { weightedPercentiles } from '../traces/weighted-percentiles';
import { absorbShort, type Run } from './absorb-short';
import { otsuThreshold } from './otsu';

export interface OnOff {
  onWatts: number;
  offWatts: number;
  runs: Run[];
}

/**
 * Parts a stretch into runs of on and off: Otsu's threshold, then the middle between the medians below and above it,
 * with a hysteresis of ±25 % of (on − off). Runs shorter than the least are absorbed by their neighbours, shortest first.
 *
 * @param watts already smoothed where the logger is quick.
 * @param weights seconds that each stands for, of the same length; the medians too are weighted by time.
 * @returns null where there is only one level.
 * @example findOnOffRuns(Float64Array.of(2, 2, 80, 80), Float64Array.of(60, 60, 60, 60), 30)?.onWatts // 80
 */
export function findOnOffRuns(watts: Float64Array, weights: Float64Array, leastSeconds: number): OnOff | null {
  const threshold = otsuThreshold(watts, weights);
  if (threshold === null) return null;
  const offWatts = medianWhere(watts, weights, (value) => value < threshold);
  const onWatts = medianWhere(watts, weights, (value) => value >= threshold);
  const middle = (onWatts + offWatts) / 2;
  const slack = 0.25 * (onWatts - offWatts);
  const runs: Run[] = [];
  let state = (watts[0] as number) >= middle;
  for (let i = 0; i < watts.length; i += 1) {
    const value = watts[i] as number;
    if (state ? value < middle - slack : value > middle + slack) state = !state;
    const last = runs[runs.length - 1];
    if (last && last.on === state) {
      last.end = i + 1;
      last.seconds += weights[i] as number;
    } else {
      runs.push({ on: state, first: i, end: i + 1, seconds: weights[i] as number });
    }
  }
  return { onWatts, offWatts, runs: absorbShort(runs, leastSeconds) };
}

function medianWhere(watts: Float64Array, weights: Float64Array, isKept: (watts: number) => boolean): number {
  const ofKept = weights.map((weight, i) => (isKept(watts[i] as number) ? weight : 0));
  return weightedPercentiles(watts, ofKept, [0.5])[0] as number;
}
