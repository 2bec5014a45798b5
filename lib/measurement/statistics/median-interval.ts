/** Ranks of order statistics that enclose the median, with the exact probability that they do. */
export interface MedianInterval {
  /** Ranks from 1, of values in rising order. */
  lowRank: number;
  highRank: number;
  /** The exact coverage, 0 to 1. */
  coverage: number;
}

/**
 * The distribution-free confidence interval of the median: the d-th smallest to the d-th largest value, with the
 * largest d whose coverage 1 − 2 P(B ≤ d − 1), B ~ Bin(n, ½), still reaches the level.
 *
 * Source: Hogg, McKean and Craig, order statistics; checked against R's pbinom and scipy.
 * @param n how many values, ≥ 0.
 * @param level the least coverage, for example 0.95.
 * @returns null where even the whole range covers less: below six values at 0.95.
 * @example medianInterval(10, 0.95) // { lowRank: 2, highRank: 9, coverage: 0.978515625 }
 */
export function medianInterval(n: number, level: number): MedianInterval | null {
  let cumulative = 0;
  let logTerm = -n * Math.LN2;
  let best: MedianInterval | null = null;
  for (let d = 1; d <= Math.floor(n / 2); d += 1) {
    // cumulative becomes P(B ≤ d − 1); the logarithm keeps the terms of a large n from vanishing.
    cumulative += Math.exp(logTerm);
    logTerm += Math.log((n - d + 1) / d);
    const coverage = 1 - 2 * cumulative;
    if (coverage < level) break;
    best = { lowRank: d, highRank: n + 1 - d, coverage };
  }
  return best;
}
