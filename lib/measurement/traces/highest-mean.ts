import { countStretch } from './steps';
import type { Trace } from './trace';
import { visitWindows } from './windows';

/**
 * The highest mean over any stretch of so many seconds: what a maker's maximum compares with, since the largest of many
 * noisy samples always rises.
 *
 * Method: a window that slides over the counted steps; a window never reaches across a gap.
 * @param windowSeconds for example 10.
 * @returns W, or null where no stretch without a gap is that long.
 * @example highestMean(samples of 10 W for a minute, 0, 60, 10) // 10
 */
export function highestMean(
  trace: Trace,
  fromSeconds: number,
  toSeconds: number,
  windowSeconds: number,
): number | null {
  const steps = countStretch(trace, fromSeconds, toSeconds);
  if (steps === null) return null;
  let highest: number | null = null;
  visitWindows(steps, windowSeconds, (meanWatts) => {
    if (highest === null || meanWatts > highest) highest = meanWatts;
  });
  return highest;
}
