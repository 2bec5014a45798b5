import { median } from './median';

/** 1/Φ⁻¹(0.75): turns a MAD of normal values into their standard deviation. Source: R, stats::mad. */
export const MAD_TO_STANDARD_DEVIATION = 1.482602218505602;

/**
 * The median of the absolute distances from the median, unscaled.
 *
 * Source: Iglewicz and Hoaglin (1993); R's mad(constant = 1).
 * @param values n ≥ 1.
 * @throws {RangeError} on an empty list, or where a value is NaN or infinite.
 * @example medianAbsoluteDeviation([1, 1, 2, 2, 4, 6, 9]) // 1
 */
export function medianAbsoluteDeviation(values: ArrayLike<number>): number {
  return medianDistanceFrom(median(values), values);
}

/**
 * The same for a caller that has the median already.
 *
 * @example medianDistanceFrom(2, [1, 1, 2, 2, 4, 6, 9]) // 1
 */
export function medianDistanceFrom(centre: number, values: ArrayLike<number>): number {
  const distances = new Float64Array(values.length);
  for (let i = 0; i < values.length; i += 1) distances[i] = Math.abs((values[i] as number) - centre);
  return median(distances);
}
