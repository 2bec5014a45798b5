/**
 * The first place in a rising column whose value is at least this one; its length where none is.
 *
 * @example firstAtLeast(Float64Array.of(1, 2, 2, 3), 2) // 1
 */
export function firstAtLeast(sorted: Float64Array, value: number): number {
  let low = 0;
  let high = sorted.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if ((sorted[middle] as number) < value) low = middle + 1;
    else high = middle;
  }
  return low;
}

/**
 * The first place in a rising column whose value lies above this one; its length where none does.
 *
 * @example firstAbove(Float64Array.of(1, 2, 2, 3), 2) // 3
 */
export function firstAbove(sorted: Float64Array, value: number): number {
  let low = 0;
  let high = sorted.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if ((sorted[middle] as number) <= value) low = middle + 1;
    else high = middle;
  }
  return low;
}
