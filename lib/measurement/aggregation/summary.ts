import { medianInterval, type MedianInterval } from '../statistics/median-interval';
import { quantileType7, sortedCopy } from '../statistics/quantile-type-7';
import type { StatisticName } from './types';

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
  atMostOf: StatisticName[];
}

const QUARTILES_FROM = 4;
const TAILS_FROM = 10;
const INTERVAL_LEVEL = 0.95;

/**
 * Median, range, quartiles (type 7), 10th and 90th percentile, and the distribution-free interval of the median, each
 * from as many values as it needs. Values that are "at most" something are read at 0 and at their limit: a statistic
 * on which the two readings agree is published as it is, any other at the upper reading and named in atMostOf.
 *
 * @param low the values with censored ones at 0; high with them at their limit; both of length n ≥ 1, any order.
 * @param withTails whether the 10th and 90th percentile are wanted: a category's are, a device's are not.
 * @throws {RangeError} on empty lists, lists of unlike length, or where a value is not a finite number.
 * @example summarise([40, 42, 44, 50], [40, 42, 44, 50]).median // 43
 */
export function summarise(low: readonly number[], high: readonly number[], withTails = false): Summary {
  if (low.length !== high.length) throw new RangeError('Both readings hold the same values.');
  const ranks = medianInterval(high.length, INTERVAL_LEVEL);
  const lower = readStatistics(sortedCopy(low), ranks, withTails);
  const upper = readStatistics(sortedCopy(high), ranks, withTails);
  const { intervalLow, intervalHigh, ...others } = upper;
  const names = Object.keys(upper) as StatisticName[];
  return {
    n: high.length,
    medianLow: lower.median,
    ...others,
    interval: ranks && { low: intervalLow as number, high: intervalHigh as number, coverage: ranks.coverage },
    atMost: lower.median !== upper.median,
    atMostOf: names.filter((name) => lower[name] !== upper[name]),
  };
}

function readStatistics(sorted: Float64Array, ranks: MedianInterval | null, withTails: boolean) {
  const n = sorted.length;
  const quantileFrom = (least: number, p: number) => (n >= least ? quantileType7(sorted, p) : null);
  return {
    median: quantileType7(sorted, 0.5),
    minimum: sorted[0] as number,
    maximum: sorted[n - 1] as number,
    lowerQuartile: quantileFrom(QUARTILES_FROM, 0.25),
    upperQuartile: quantileFrom(QUARTILES_FROM, 0.75),
    intervalLow: ranks && (sorted[ranks.lowRank - 1] as number),
    intervalHigh: ranks && (sorted[ranks.highRank - 1] as number),
    tenthPercentile: withTails ? quantileFrom(TAILS_FROM, 0.1) : null,
    ninetiethPercentile: withTails ? quantileFrom(TAILS_FROM, 0.9) : null,
  } satisfies Record<StatisticName, number | null>;
}
