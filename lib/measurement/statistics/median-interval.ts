/** Ranks of order statistics that enclose the median, with the exact probability that they do. */
export interface MedianInterval {
  /** Ranks from 1, of values in rising order. */
  lowRank: number;
  highRank: number;
  /** The exact coverage, 0 to 1. */
  coverage: number;
}

/** Coefficients beyond 2^900 are scaled down by it: near the largest that a double holds. */
const SCALE_BITS = 900;
const SCALE = 2 ** SCALE_BITS;

/**
 * The distribution-free confidence interval of the median: the d-th smallest to the d-th largest value, with the
 * largest d whose coverage 1 − 2 P(B ≤ d − 1), B ~ Bin(n, ½), still reaches the level.
 *
 * The binomial coefficients are summed as they are and divided by 2ⁿ at the end, which is exact in a double up to some
 * fifty values; beyond that they are scaled by a power of two, which costs nothing but the usual rounding.
 *
 * Source: Hogg, McKean and Craig, order statistics; checked against R's pbinom and scipy.
 * @param n how many values, a whole number ≥ 0.
 * @param level the least coverage, at least 0 and below 1, for example 0.95.
 * @returns null where even the whole range covers less: below six values at 0.95.
 * @throws {RangeError} where n is not a whole number, or the level is no such share.
 * @example medianInterval(10, 0.95) // { lowRank: 2, highRank: 9, coverage: 0.978515625 }
 */
export function medianInterval(n: number, level: number): MedianInterval | null {
  if (!Number.isInteger(n) || n < 0) throw new RangeError('The number of values is a whole number from 0.');
  if (!(level >= 0 && level < 1)) throw new RangeError('A level lies at or above 0 and below 1.');
  let coefficient = 1;
  let sum = 0;
  let exponent = -n;
  let best: MedianInterval | null = null;
  for (let d = 1; 2 * d <= n; d += 1) {
    // The sum becomes that of C(n, 0) … C(n, d − 1): P(B ≤ d − 1) times 2ⁿ.
    sum += coefficient;
    const coverage = 1 - sum * 2 ** (exponent + 1);
    if (coverage < level) break;
    best = { lowRank: d, highRank: n + 1 - d, coverage };
    coefficient = (coefficient * (n - d + 1)) / d;
    if (coefficient > SCALE) {
      coefficient /= SCALE;
      sum /= SCALE;
      exponent += SCALE_BITS;
    }
  }
  return best;
}
