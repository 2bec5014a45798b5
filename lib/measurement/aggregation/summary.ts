import { medianInterval } from '../statistics/median-interval';
import { quantileType7, sortedCopy } from '../statistics/quantile-type-7';

/** A pile's values read twice: censored ones at 0, and at their limit. */
export interface Summary {
  n: number;
  median: number;
  /** The median with censored values at 0. */
  medianLow: number;
  minimum: number;
  maximum: number;
  lowerQuartile: number | null;
  upperQuartile: number | null;
  interval: { low: number; high: number; coverage: number } | null;
  tenthPercentile: number | null;
  ninetiethPercentile: number | null;
  atMost: boolean;
}

const QUARTILES_FROM = 4;
const TAILS_FROM = 10;
const INTERVAL_LEVEL = 0.95;

/**
 * Median, range, quartiles (type 7), 10th and 90th percentile, and the distribution-free interval of the median, each
 * from as many values as it needs. Values that are "at most" something are read at 0 and at their limit: where the two
 * medians agree nothing is open, otherwise the upper reading is published as "at most".
 *
 * @param low the values with censored ones at 0; high with them at their limit; both of length n ≥ 1, any order.
 * @throws {RangeError} on empty lists, or lists of unlike length.
 * @example summarise([40, 42, 44, 50], [40, 42, 44, 50]).median // 43
 */
export function summarise(low: readonly number[], high: readonly number[]): Summary {
  if (low.length !== high.length) throw new RangeError('Both readings hold the same values.');
  const lower = sortedCopy(low);
  const upper = sortedCopy(high);
  const n = upper.length;
  const median = quantileType7(upper, 0.5);
  const medianLow = quantileType7(lower, 0.5);
  const interval = medianInterval(n, INTERVAL_LEVEL);
  return {
    n,
    median,
    medianLow,
    minimum: lower[0] as number,
    maximum: upper[n - 1] as number,
    lowerQuartile: n >= QUARTILES_FROM ? quantileType7(upper, 0.25) : null,
    upperQuartile: n >= QUARTILES_FROM ? quantileType7(upper, 0.75) : null,
    interval: interval && {
      // A censored value may lie anywhere below its limit: the interval reaches down to the lower reading.
      low: lower[interval.lowRank - 1] as number,
      high: upper[interval.highRank - 1] as number,
      coverage: interval.coverage,
    },
    tenthPercentile: n >= TAILS_FROM ? quantileType7(upper, 0.1) : null,
    ninetiethPercentile: n >= TAILS_FROM ? quantileType7(upper, 0.9) : null,
    atMost: medianLow !== median,
  };
}
