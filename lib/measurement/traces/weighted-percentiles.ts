/**
 * Time-weighted percentiles: the smallest value that, with all below it, reaches a share of the weight.
 *
 * @param values, weights of one length n ≥ 1; weights ≥ 0 with a sum above 0.
 * @param shares between 0 and 1, rising.
 * @returns one value a share.
 * @throws {RangeError} where the weights sum to nothing.
 * @example weightedPercentiles([1, 2, 3], [1, 1, 2], [0.5]) // [2]
 */
export function weightedPercentiles(values: Float64Array, weights: Float64Array, shares: readonly number[]): number[] {
  // Loggers write in steps, so a long trace holds few distinct values: summing by value spares sorting the rows.
  const byValue = new Map<number, number>();
  let total = 0;
  for (let i = 0; i < values.length; i += 1) {
    const weight = weights[i] as number;
    if (weight === 0) continue;
    const value = values[i] as number;
    byValue.set(value, (byValue.get(value) ?? 0) + weight);
    total += weight;
  }
  if (!(total > 0)) throw new RangeError('No time counts here, so there are no percentiles.');
  const distinct = Float64Array.from(byValue.keys()).sort();
  const found: number[] = [];
  let reached = 0;
  let next = 0;
  for (const value of distinct) {
    reached += byValue.get(value) as number;
    // Sums of weights carry rounding; a share that is met but for that is met.
    while (next < shares.length && reached >= (shares[next] as number) * total * (1 - 1e-12)) {
      found.push(value);
      next += 1;
    }
  }
  return found;
}
