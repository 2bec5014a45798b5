/**
 * Divides a series into segments with the least sum of squares about their means plus a penalty for each change.
 *
 * Method: PELT (Killick, Fearnhead and Eckley 2012, "Optimal detection of changepoints with a linear computational
 * cost"), exact; a candidate is dropped only once a segment of the least length fits behind what beats it.
 * @param values n ≥ 1.
 * @param penalty ≥ 0, in the square of the values' unit.
 * @param leastLength of a segment, ≥ 1; a series shorter than two of them is one segment.
 * @returns the rising starts of all segments but the first.
 * @example changePoints([0, 0, 0, 9, 9, 9], 1, 2) // [3]
 */
export function changePoints(values: ArrayLike<number>, penalty: number, leastLength: number): number[] {
  const n = values.length;
  const cost = segmentCost(values);
  const best = new Float64Array(n + 1).fill(Infinity);
  const cameFrom = new Int32Array(n + 1);
  // From which end on a start is no longer needed.
  const expires = new Int32Array(n + 1).fill(n + 1);
  best[0] = -penalty;
  const candidates: number[] = [];
  for (let end = leastLength; end <= n; end += 1) {
    const newest = end - leastLength;
    if (newest === 0 || newest >= leastLength) candidates.push(newest);
    let lowest = Infinity;
    for (const start of candidates) {
      const total = (best[start] as number) + cost(start, end) + penalty;
      if (total < lowest) {
        lowest = total;
        cameFrom[end] = start;
      }
    }
    best[end] = lowest;
    let kept = 0;
    for (const start of candidates) {
      if ((best[start] as number) + cost(start, end) > lowest) {
        expires[start] = Math.min(expires[start] as number, end + leastLength);
      }
      if ((expires[start] as number) > end) {
        candidates[kept] = start;
        kept += 1;
      }
    }
    candidates.length = kept;
  }
  return n < leastLength ? [] : traceBack(cameFrom, n);
}

function traceBack(cameFrom: Int32Array, n: number): number[] {
  const starts: number[] = [];
  for (let end = cameFrom[n] as number; end > 0; end = cameFrom[end] as number) starts.push(end);
  return starts.reverse();
}

/**
 * The sum of squares about the mean of any part of a series, at constant cost.
 *
 * @returns (start, end) → Σ (x − mean)² over start ≤ i < end.
 * @example segmentCost([1, 3])(0, 2) // 2
 */
export function segmentCost(values: ArrayLike<number>): (start: number, end: number) => number {
  const n = values.length;
  let centre = 0;
  // About its own mean a series loses less to rounding.
  for (let i = 0; i < n; i += 1) centre += (values[i] as number) / n;
  const sums = new Float64Array(n + 1);
  const squares = new Float64Array(n + 1);
  for (let i = 0; i < n; i += 1) {
    const distance = (values[i] as number) - centre;
    sums[i + 1] = (sums[i] as number) + distance;
    squares[i + 1] = (squares[i] as number) + distance * distance;
  }
  return (start, end) => {
    const sum = (sums[end] as number) - (sums[start] as number);
    return Math.max(0, (squares[end] as number) - (squares[start] as number) - (sum * sum) / (end - start));
  };
}
