import { stretchFigures } from '../traces/figures';
import { countStretch } from '../traces/steps';
import type { Trace } from '../traces/trace';
import { visitWindows } from '../traces/windows';

/** Whether a standby is stable enough to be one figure. */
export interface StandbyFinding {
  stable: boolean;
  meanWatts: number | null;
  /** How far the mean of any five minutes lies from the whole's, at most (W); null where none is that long. */
  largestDeviationWatts: number | null;
  allowedWatts: number | null;
  /** What keeps it from being stable, in words for the member; otherwise null. */
  reason: string | null;
}

const WINDOW_SECONDS = 300;
const ALLOWED_SHARE = 0.05;
const ALLOWED_WATTS = 0.05;

/**
 * A standby is stable where the mean of any five minutes differs from the whole's by at most 5 %, or by 50 mW.
 *
 * Source: the drift over five minutes of US DOE's summary of IEC 62301 first edition, and of 10 CFR 430 subpart B,
 * appendix Z (the greater of a share and 50 mW).
 * @param minimumSeconds what the method asks for besides; 0 for nothing.
 * @example findStandby(twenty minutes of 0.5 W, from, to, 900).stable // true
 */
export function findStandby(
  trace: Trace,
  fromSeconds: number,
  toSeconds: number,
  minimumSeconds: number,
): StandbyFinding {
  const steps = countStretch(trace, fromSeconds, toSeconds);
  const figures = stretchFigures(trace, fromSeconds, toSeconds);
  if (!steps || !figures) return unstable(null, null, 'There is no counted time in this stretch.');
  const { meanWatts, countedSeconds } = figures;
  const allowedWatts = Math.max(ALLOWED_SHARE * Math.abs(meanWatts), ALLOWED_WATTS);
  let largest: number | null = null;
  visitWindows(steps, WINDOW_SECONDS, (ofWindow) => {
    largest = Math.max(largest ?? 0, Math.abs(ofWindow - meanWatts));
  });
  const finding = { meanWatts, largestDeviationWatts: largest as number | null, allowedWatts };
  if (largest === null) return unstable(meanWatts, allowedWatts, 'Five minutes without a gap are needed at least.');
  // A difference of rounding alone is none.
  if (largest > allowedWatts * (1 + 1e-9)) {
    return { ...finding, stable: false, reason: 'Some five minutes differ from the whole by more than 5 % and 50 mW.' };
  }
  if (countedSeconds < minimumSeconds) {
    const minutes = Math.ceil(minimumSeconds / 60);
    return { ...finding, stable: false, reason: `The method asks for ${minutes} minutes or more. Measure longer.` };
  }
  return { ...finding, stable: true, reason: null };
}

function unstable(meanWatts: number | null, allowedWatts: number | null, reason: string): StandbyFinding {
  return { stable: false, meanWatts, largestDeviationWatts: null, allowedWatts, reason };
}
