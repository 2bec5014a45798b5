import { quantileType7 } from '../statistics/quantile-type-7';
import { otsuThreshold } from './otsu';

/** Readings from first to end (half open) that are all on or all off, and how long they count. */
export interface Run {
  on: boolean;
  first: number;
  end: number;
  seconds: number;
}

export interface OnOff {
  onWatts: number;
  offWatts: number;
  runs: Run[];
}

/**
 * Parts a stretch into runs of on and off: Otsu's threshold, then the middle between the medians below and above it,
 * with a hysteresis of ±25 % of (on − off). Runs shorter than the least are absorbed by their neighbours, shortest first.
 *
 * @param watts, seconds of one length; already smoothed where the logger is quick.
 * @returns null where there is only one level.
 */
export function findOnOffRuns(watts: Float64Array, seconds: Float64Array, leastSeconds: number): OnOff | null {
  const first = otsuThreshold(watts, seconds);
  if (first === null) return null;
  const off = quantileType7(watts.filter((value) => value < first).sort(), 0.5);
  const on = quantileType7(watts.filter((value) => value >= first).sort(), 0.5);
  const middle = (on + off) / 2;
  const slack = 0.25 * (on - off);
  const runs: Run[] = [];
  let state = (watts[0] as number) >= middle;
  for (let i = 0; i < watts.length; i += 1) {
    const value = watts[i] as number;
    if (state ? value < middle - slack : value > middle + slack) state = !state;
    const last = runs[runs.length - 1];
    if (last && last.on === state) {
      last.end = i + 1;
      last.seconds += seconds[i] as number;
    } else {
      runs.push({ on: state, first: i, end: i + 1, seconds: seconds[i] as number });
    }
  }
  return { onWatts: on, offWatts: off, runs: absorbShort(runs, leastSeconds) };
}

/** Joins what is too short with both its neighbours, the shortest first. */
function absorbShort(runs: Run[], leastSeconds: number): Run[] {
  const kept = [...runs];
  for (;;) {
    let shortest = -1;
    for (let i = 0; i < kept.length; i += 1) {
      const seconds = (kept[i] as Run).seconds;
      if (seconds < leastSeconds && (shortest < 0 || seconds < (kept[shortest] as Run).seconds)) shortest = i;
    }
    if (shortest < 0 || kept.length < 2) return kept;
    const from = Math.max(0, shortest - 1);
    const to = Math.min(kept.length, shortest + 2);
    const joined = kept.slice(from, to);
    const host = joined[0] === kept[shortest] ? (joined[1] as Run) : (joined[0] as Run);
    kept.splice(from, to - from, {
      on: host.on,
      first: (joined[0] as Run).first,
      end: (joined[joined.length - 1] as Run).end,
      seconds: joined.reduce((sum, run) => sum + run.seconds, 0),
    });
  }
}
