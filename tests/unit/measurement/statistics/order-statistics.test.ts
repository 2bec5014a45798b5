import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { median } from '@/lib/measurement/statistics/median';
import {
  MAD_TO_STANDARD_DEVIATION,
  medianAbsoluteDeviation,
  medianDistanceFrom,
} from '@/lib/measurement/statistics/median-absolute-deviation';
import { modifiedZScores } from '@/lib/measurement/statistics/modified-z';
import { normalQuantile } from '@/lib/measurement/statistics/normal';
import { quantileType7, sortedCopy } from '@/lib/measurement/statistics/quantile-type-7';
import { check, expected, fromR, nistData, relativeError } from './reference';

const numbers = fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 1, maxLength: 40 });
const NOT_FINITE = new RangeError('Order statistics need finite numbers.');

/** Type 7 as its definition reads: the value at 1 + (n − 1) p, between neighbours in proportion. */
function bruteQuantile(values: number[], p: number): number {
  const ranks = [...values].sort((a, b) => a - b);
  const h = 1 + (ranks.length - 1) * p;
  let whole = 1;
  while (whole + 1 <= h) whole += 1;
  const here = ranks[whole - 1] as number;
  const next = ranks[whole] ?? here;
  return here + (h - whole) * (next - here);
}

describe('quantiles of type 7', () => {
  const resistivity = check('quantile.type7').inputs as { data: number[] };

  it('of the NIST e-Handbook’s twelve resistivities are R’s and numpy’s', () => {
    const sorted = sortedCopy(resistivity.data);
    const wanted = check('quantile.type7').expected as unknown as Record<string, number>;
    for (const [p, value] of Object.entries(wanted)) {
      expect(Math.abs(quantileType7(sorted, Number(p)) - value)).toBeLessThan(1e-9);
    }
    expect(Object.keys(wanted)).toEqual(['0.1', '0.25', '0.5', '0.75', '0.9']);
  });

  it.each(['1', '2', '3', '4', '5', '6'])('are not those of type %s on the same data', (type) => {
    const other = check(`quantile.type${type}`).expected as unknown as Record<string, number>;
    const sorted = sortedCopy(resistivity.data);
    expect(Object.entries(other).some(([p, value]) => Math.abs(quantileType7(sorted, Number(p)) - value) > 1e-4)).toBe(
      true,
    );
  });

  it('agree with R on samples of 1 to 60, to the last digits', () => {
    for (const sample of fromR.samples) {
      const sorted = sortedCopy(sample.values);
      [0, 0.1, 0.25, 0.5, 0.75, 0.9, 1].forEach((p, i) => {
        expect(relativeError(quantileType7(sorted, p), sample.quantiles[i] as number)).toBeLessThan(1e-14);
      });
    }
  });

  it('equal the definition computed rank by rank', () => {
    fc.assert(
      fc.property(numbers, fc.double({ min: 0, max: 1, noNaN: true }), (values, p) => {
        const scale = Math.max(1, ...values.map(Math.abs));
        expect(Math.abs(quantileType7(sortedCopy(values), p) - bruteQuantile(values, p)) / scale).toBeLessThan(1e-12);
      }),
    );
  });

  it('are computed as lo + f · (hi − lo), as percentile_cont does: here the last digit differs from (lo + hi)/2', () => {
    expect(quantileType7([0.3, 2.1], 0.5)).toBe(0.3 + 0.5 * (2.1 - 0.3));
    expect(quantileType7([1, 2, 3, 4], 0.25)).toBe(1.75);
  });

  it('of one value are that value; at 0 and 1 the smallest and the largest', () => {
    expect(quantileType7([4], 0.3)).toBe(4);
    expect(quantileType7([1, 5, 9], 0)).toBe(1);
    expect(quantileType7([1, 5, 9], 1)).toBe(9);
  });

  it('of none throw, and at a share outside 0 to 1', () => {
    expect(() => quantileType7([], 0.5)).toThrow(new RangeError('A quantile of no values is not defined.'));
    for (const p of [-0.01, 1.01, Number.NaN]) {
      expect(() => quantileType7([1], p)).toThrow(new RangeError('A quantile’s share lies between 0 and 1.'));
    }
  });
});

describe('values in order', () => {
  it('are a new list, in numeric order, with ties kept', () => {
    const values = [10, 9, 1, 10];
    expect([...sortedCopy(values)]).toEqual([1, 9, 10, 10]);
    expect(values).toEqual([10, 9, 1, 10]);
    expect([...sortedCopy([3, 1, 2])]).toEqual([1, 2, 3]);
    expect([...sortedCopy([])]).toEqual([]);
  });

  it.each([Number.NaN, Infinity, -Infinity])('do not hold %s', (odd) => {
    expect(() => sortedCopy([1, odd, 2])).toThrow(NOT_FINITE);
    expect(() => sortedCopy([odd])).toThrow(NOT_FINITE);
  });
});

describe('the median', () => {
  it('is the middle value, or the mean of the middle two', () => {
    expect(median([3, 1, 2, 10])).toBe(2.5);
    expect(median([3, 1, 2])).toBe(2);
    expect(median([5])).toBe(5);
    expect(median([2, 2, 9, 2])).toBe(2);
  });

  it('of none throws, and so does one with a NaN', () => {
    expect(() => median([])).toThrow(RangeError);
    expect(() => median([1, Number.NaN])).toThrow(NOT_FINITE);
  });

  it('does not depend on the order', () => {
    fc.assert(
      fc.property(numbers, (values) => {
        expect(median([...values].reverse())).toBe(median(values));
      }),
    );
  });
});

describe('a robust summary of NIST’s Michelso data', () => {
  const wanted = check('robust.michelso').expected as unknown as Record<string, number>;
  const values = nistData('michelso');

  it('has R’s median, MAD, quartiles, and fences with three outside', () => {
    const sorted = sortedCopy(values);
    const lower = quantileType7(sorted, 0.25);
    const upper = quantileType7(sorted, 0.75);
    expect(median(values)).toBeCloseTo(wanted.median as number, 10);
    expect(medianAbsoluteDeviation(values)).toBeCloseTo(wanted.mad_raw as number, 10);
    // R rounds its constant to 1.4826.
    expect(medianAbsoluteDeviation(values) * 1.4826).toBeCloseTo(wanted.mad_scaled as number, 10);
    expect([lower, upper]).toEqual([
      expect.closeTo(wanted.q1_type7 as number, 9),
      expect.closeTo(wanted.q3_type7 as number, 9),
    ]);
    const reach = 1.5 * (upper - lower);
    expect(values.filter((value) => value < lower - reach || value > upper + reach)).toHaveLength(3);
  });

  it('has 3.4474 as its largest modified z-score: none above 3.5', () => {
    const largest = Math.max(...modifiedZScores(values, 1e-9).map(Math.abs));
    expect(largest).toBeCloseTo(wanted['max_abs_modz'] as number, 9);
    expect(largest).toBeLessThan(3.5);
  });
});

describe('the median absolute deviation', () => {
  it('is the worked example’s, and R’s on samples of 1 to 60', () => {
    expect(medianAbsoluteDeviation([1, 1, 2, 2, 4, 6, 9])).toBe(1);
    expect(medianDistanceFrom(2, [1, 1, 2, 2, 4, 6, 9])).toBe(1);
    for (const sample of fromR.samples) {
      expect(medianAbsoluteDeviation(sample.values)).toBeCloseTo(sample.mad, 10);
    }
  });

  it('turns into a standard deviation by R’s constant, 1/Φ⁻¹(0.75)', () => {
    expect(MAD_TO_STANDARD_DEVIATION).toBe(expected('mad.constant'));
    expect(1 / normalQuantile(0.75)).toBeCloseTo(MAD_TO_STANDARD_DEVIATION, 13);
  });

  it('is 0 of one value and of ties; of none it throws, and so does one with a NaN', () => {
    expect(medianAbsoluteDeviation([3])).toBe(0);
    expect(medianAbsoluteDeviation([3, 3, 3, 8])).toBe(0);
    expect(() => medianAbsoluteDeviation([])).toThrow(RangeError);
    expect(() => medianAbsoluteDeviation([Number.NaN])).toThrow(NOT_FINITE);
  });
});

describe('modified z-scores', () => {
  it('divide by no less than the least deviation', () => {
    expect(modifiedZScores([10, 10, 10, 11], 1)).toEqual([0, 0, 0, 0.6745]);
    expect(modifiedZScores([0, 10, 20], 1)).toEqual([-0.6745, 0, 0.6745]);
  });

  it('throw on none, on a NaN, and where there is nothing to divide by', () => {
    expect(() => modifiedZScores([], 1)).toThrow(RangeError);
    expect(() => modifiedZScores([1, Number.NaN], 1)).toThrow(NOT_FINITE);
    for (const least of [0, -1, Number.NaN]) {
      expect(() => modifiedZScores([1], least)).toThrow(new RangeError('The least deviation lies above 0.'));
    }
  });
});
