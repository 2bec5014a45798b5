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
  const centre = median(values);
  return median(Float64Array.from(values, (value) => Math.abs(value - centre)));
}
