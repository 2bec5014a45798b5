/**
 * The running median of five values; the two at each end stay as they are. It takes single spikes away and keeps edges.
 *
 * @param values any length.
 * @returns a new column of the same length.
 * @example runningMedian5(Float64Array.of(1, 1, 9, 1, 1)) // 1, 1, 1, 1, 1
 */
export function runningMedian5(values: Float64Array): Float64Array {
  const smooth = Float64Array.from(values);
  for (let i = 2; i < values.length - 2; i += 1) {
    smooth[i] = medianOf5(
      values[i - 2] as number,
      values[i - 1] as number,
      values[i] as number,
      values[i + 1] as number,
      values[i + 2] as number,
    );
  }
  return smooth;
}

/** The lowest and the highest of two pairs can't be the middle of five; it is the middle of the three that are left. */
function medianOf5(a: number, b: number, c: number, d: number, e: number): number {
  const low = Math.max(Math.min(a, b), Math.min(c, d));
  const high = Math.min(Math.max(a, b), Math.max(c, d));
  return Math.max(Math.min(low, high), Math.min(Math.max(low, high), e));
}
