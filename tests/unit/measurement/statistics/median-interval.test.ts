import { describe, expect, it } from 'vitest';
import { medianInterval } from '@/lib/measurement/statistics/median-interval';
import { check, fromR, nistData } from './reference';
import { sortedCopy } from '@/lib/measurement/statistics/quantile-type-7';

interface TableRow {
  n: number;
  lower_rank: number | null;
  upper_rank: number | null;
  exact_confidence: number | null;
}

/** Counts, with whole numbers, how many of the 2ⁿ ways to fall leave the median within the ranks. */
function bruteCoverage(n: number, lowRank: number): number {
  const choose = (k: number) => {
    let ways = 1n;
    for (let i = 0n; i < BigInt(k); i += 1n) ways = (ways * (BigInt(n) - i)) / (i + 1n);
    return ways;
  };
  let outside = 0n;
  for (let k = 0; k < lowRank; k += 1) outside += 2n * choose(k);
  const all = 2n ** BigInt(n);
  return Number(((all - outside) * 10n ** 18n) / all) / 1e18;
}

describe('the distribution-free interval of the median', () => {
  it('has the ranks and the exact coverage of the printed table, n = 1 to 40', () => {
    const table = check('median_ci.table95').expected as unknown as TableRow[];
    expect(table).toHaveLength(40);
    for (const { n, lower_rank, upper_rank, exact_confidence } of table) {
      const wanted =
        lower_rank === null ? null : { lowRank: lower_rank, highRank: upper_rank, coverage: exact_confidence };
      expect(medianInterval(n, 0.95)).toEqual(wanted);
    }
  });

  it('of Hogg, McKean and Craig’s data at α = 0.12 is 96 to 106, 88.153 %', () => {
    const { data } = check('median_ci.hogg').inputs as { data: number[] };
    const wanted = check('median_ci.hogg').expected as unknown as { ci: number[]; exact_confidence: number };
    const interval = medianInterval(data.length, 0.88);
    expect([data[(interval?.lowRank ?? 0) - 1], data[(interval?.highRank ?? 0) - 1]]).toEqual(wanted.ci);
    expect(interval?.coverage).toBeCloseTo(wanted.exact_confidence, 11);
  });

  it('of NIST’s Michelso data is 299.84 to 299.87, ranks 40 and 61', () => {
    const sorted = sortedCopy(nistData('michelso'));
    const interval = medianInterval(100, 0.95);
    expect(interval).toMatchObject({ lowRank: 40, highRank: 61 });
    expect(interval?.coverage).toBeCloseTo(0.964799799782295, 12);
    expect([sorted[39], sorted[60]]).toEqual([299.84, 299.87]);
  });

  it('agrees with R’s binomial at four levels up to 2,500 values', () => {
    for (const [n, level, rank, coverage] of fromR.medianInterval) {
      const interval = medianInterval(n as number, level as number);
      expect([n, level, interval?.lowRank ?? 0]).toEqual([n, level, rank]);
      if (interval) expect(Math.abs(interval.coverage - (coverage as number))).toBeLessThan(1e-11);
    }
  });

  it.each([10, 53, 54, 200, 907, 1500])('states the coverage that counting in whole numbers gives, n = %i', (n) => {
    const interval = medianInterval(n, 0.95);
    expect(interval?.highRank).toBe(n + 1 - (interval?.lowRank ?? 0));
    expect(Math.abs((interval?.coverage ?? 0) - bruteCoverage(n, interval?.lowRank ?? 0))).toBeLessThan(1e-12);
    expect(bruteCoverage(n, (interval?.lowRank ?? 0) + 1)).toBeLessThan(0.95);
  });

  it('is the worked example’s, to the last digit', () => {
    expect(medianInterval(10, 0.95)).toEqual({ lowRank: 2, highRank: 9, coverage: 0.978515625 });
  });

  it('is there for 100,000 values (R: qbinom, pbinom)', () => {
    const interval = medianInterval(100_000, 0.95);
    expect(interval).toMatchObject({ lowRank: 49_690, highRank: 50_311 });
    expect(interval?.coverage).toBeCloseTo(0.95044428533047509, 10);
  });

  it('is not there for none, one, or five values; a level that is just reached counts', () => {
    for (const n of [0, 1, 5]) expect(medianInterval(n, 0.95)).toBeNull();
    expect(medianInterval(2, 0.5)).toEqual({ lowRank: 1, highRank: 2, coverage: 0.5 });
    expect(medianInterval(2, 0)).toEqual({ lowRank: 1, highRank: 2, coverage: 0.5 });
    expect(medianInterval(6, 0.96875)?.lowRank).toBe(1);
  });

  it('throws on a count that is not whole or is NaN, and on a level that no interval has', () => {
    for (const n of [-1, 2.5, Number.NaN]) {
      expect(() => medianInterval(n, 0.95)).toThrow(new RangeError('The number of values is a whole number from 0.'));
    }
    for (const level of [-0.1, 1, Number.NaN]) {
      expect(() => medianInterval(9, level)).toThrow(new RangeError('A level lies at or above 0 and below 1.'));
    }
  });
});
