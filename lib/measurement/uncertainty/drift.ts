/**
 * What a recording's shortness leaves open about the device: slow drift that it can't show. 2 % of the mean below an
 * hour, 1 % below a day, nothing from a day on.
 *
 * Source: this project's rule; no published source.
 * @example driftUncertainty(50, 600) // 1
 */
export function driftUncertainty(mean: number, countedSeconds: number): number {
  if (countedSeconds < 3600) return 0.02 * Math.abs(mean);
  return countedSeconds < 86_400 ? 0.01 * Math.abs(mean) : 0;
}
