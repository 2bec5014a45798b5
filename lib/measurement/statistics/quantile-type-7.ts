/**
 * A quantile of values that are in rising order: Hyndman and Fan's type 7, as R's default, numpy's "linear" and
 * PostgreSQL's percentile_cont. Computed as lo + f · (hi − lo), which is what percentile_cont does to the last digit.
 *
 * Source: Hyndman and Fan (1996), "Sample quantiles in statistical packages".
 * @param sorted n ≥ 1, rising.
 * @param p between 0 and 1.
 * @throws {RangeError} on an empty list, or where p is outside 0 to 1.
 * @example quantileType7([1, 2, 3, 4], 0.25) // 1.75
 */
export function quantileType7(sorted: ArrayLike<number>, p: number): number {
  if (sorted.length === 0) throw new RangeError('A quantile of no values is not defined.');
  if (!(p >= 0 && p <= 1)) throw new RangeError('A quantile’s share lies between 0 and 1.');
  const position = p * (sorted.length - 1);
  const below = Math.floor(position);
  const low = sorted[below] as number;
  const high = sorted[Math.min(below + 1, sorted.length - 1)] as number;
  return low + (position - below) * (high - low);
}

/**
 * The values in rising order, in a new list: what the quantiles here take.
 *
 * @throws {RangeError} where a value is NaN or infinite: it has no place in an order, and would move every rank.
 * @example sortedCopy([3, 1, 2]) // Float64Array [1, 2, 3]
 */
export function sortedCopy(values: ArrayLike<number>): Float64Array {
  const sorted = Float64Array.from(values).sort();
  // Sorting puts −Infinity first, and Infinity and then NaN last: the two ends tell for all.
  if (sorted.length > 0 && !(Number.isFinite(sorted[0]) && Number.isFinite(sorted[sorted.length - 1]))) {
    throw new RangeError('Order statistics need finite numbers.');
  }
  return sorted;
}
