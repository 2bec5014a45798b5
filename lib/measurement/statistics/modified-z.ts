import { median } from './median';
import { medianDistanceFrom } from './median-absolute-deviation';

/**
 * The modified z-scores 0.6745 (x − median) / MAD.
 *
 * Source: Iglewicz and Hoaglin (1993), who flag a size above 3.5.
 * @param values n ≥ 1.
 * @param leastDeviation the smallest MAD to divide by: values that agree closely must not flag one another.
 * @throws {RangeError} on an empty list, where a value is NaN or infinite, or where leastDeviation is not above 0.
 * @example modifiedZScores([10, 10, 10, 11], 1) // [0, 0, 0, 0.6745]
 */
export function modifiedZScores(values: ArrayLike<number>, leastDeviation: number): number[] {
  if (!(leastDeviation > 0)) throw new RangeError('The least deviation lies above 0.');
  const centre = median(values);
  const spread = Math.max(medianDistanceFrom(centre, values), leastDeviation);
  const scores: number[] = [];
  for (let i = 0; i < values.length; i += 1) scores.push((0.6745 * ((values[i] as number) - centre)) / spread);
  return scores;
}
