import { quantileType7, sortedCopy } from './quantile-type-7';

/**
 * The median: the middle value, or the mean of the middle two.
 *
 * @param values n ≥ 1, in any order; the list is left as it is.
 * @throws {RangeError} on an empty list, or where a value is NaN or infinite.
 * @example median([3, 1, 2, 10]) // 2.5
 */
export function median(values: ArrayLike<number>): number {
  return quantileType7(sortedCopy(values), 0.5);
}
