/**
 * A counter as energy since its first value: a fall is a reset, after which it counts anew.
 *
 * @param values the readings, in order.
 * @returns a new column that never falls, beginning at 0, and how many resets there were.
 * @example joinCounter(Float64Array.of(5, 7, 1, 2)) // { values: [0, 2, 3, 4], resets: 1 }
 */
export function joinCounter(values: Float64Array): { values: Float64Array; resets: number } {
  const joined = new Float64Array(values.length);
  let resets = 0;
  for (let i = 1; i < values.length; i += 1) {
    const step = (values[i] as number) - (values[i - 1] as number);
    if (step < 0) resets += 1;
    joined[i] = (joined[i - 1] as number) + (step < 0 ? Math.max(0, values[i] as number) : step);
  }
  return { values: joined, resets };
}
