/**
 * The running median of five values; the two at each end stay as they are. It takes single spikes away and keeps edges.
 *
 * @param values any length.
 * @returns a new column of the same length.
 * @example runningMedian5([1, 1, 9, 1, 1]) // [1, 1, 1, 1, 1]
 */
export function runningMedian5(values: Float64Array): Float64Array {
  const smooth = Float64Array.from(values);
  const five = new Float64Array(5);
  for (let i = 2; i < values.length - 2; i += 1) {
    for (let k = 0; k < 5; k += 1) five[k] = values[i - 2 + k] as number;
    smooth[i] = five.sort()[2] as number;
  }
  return smooth;
}
