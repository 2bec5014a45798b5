/**
 * q, the logger's step: the smallest difference between distinct raw readings.
 *
 * @param values any length; sorts a copy.
 * @returns 0 where all readings are equal.
 * @example loggerStep(Float64Array.of(1, 1.5, 3)) // 0.5
 */
export function loggerStep(values: Float64Array): number {
  const sorted = values.slice().sort();
  let smallest = Infinity;
  for (let i = 1; i < sorted.length; i += 1) {
    const difference = (sorted[i] as number) - (sorted[i - 1] as number);
    // Factors like 0.001 leave differences of rounding alone between readings that were the same.
    if (difference > 1e-9 * Math.max(1, Math.abs(sorted[i] as number)) && difference < smallest) smallest = difference;
  }
  return smallest === Infinity ? 0 : smallest;
}
