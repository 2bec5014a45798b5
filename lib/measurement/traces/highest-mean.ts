import { countSteps, indexRange } from './steps';
import type { Trace } from './trace';

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
  const { first, end } = indexRange(trace, fromSeconds, toSeconds);
  if (end - first < 1) return null;
  const { seconds, joules, gaps } = countSteps(trace, first, end);
  const gapEnds = new Set(gaps.map((gap) => gap.toSeconds));
  let highest: number | null = null;
  let start = 0;
  let inWindow = 0;
  let energy = 0;
  for (let i = 0; i < seconds.length; i += 1) {
    if (gapEnds.has(trace.timeSeconds[first + i] as number)) {
      start = i;
      inWindow = 0;
      energy = 0;
    }
    inWindow += seconds[i] as number;
    energy += joules[i] as number;
    while (start < i && inWindow - (seconds[start] as number) >= windowSeconds) {
      inWindow -= seconds[start] as number;
      energy -= joules[start] as number;
      start += 1;
    }
    if (inWindow >= windowSeconds && (highest === null || energy / inWindow > highest)) highest = energy / inWindow;
  }
  return highest;
}
