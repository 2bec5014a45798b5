import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { autocorrelation } from '@/lib/measurement/statistics/autocorrelation';
import { CompensatedSum, compensatedSum } from '@/lib/measurement/statistics/compensated-sum';
import { mean } from '@/lib/measurement/statistics/mean';
import { standardDeviation } from '@/lib/measurement/statistics/standard-deviation';
import { check, expected, fromR, nistData, relativeError } from './reference';

const SETS = ['michelso', 'numacc1', 'numacc2', 'numacc3', 'numacc4'] as const;

describe('the mean, the standard deviation and the lag-1 autocorrelation of NIST’s data', () => {
  it.each(SETS)('%s: the digits that NIST StRD certifies', (name) => {
    const values = nistData(name);
    const within = (id: string) => Number(check(id).tolerance);
    expect(relativeError(mean(values), expected(`nist.${name}.mean`))).toBeLessThanOrEqual(within(`nist.${name}.mean`));
    expect(relativeError(standardDeviation(values), expected(`nist.${name}.sd`))).toBeLessThanOrEqual(
      within(`nist.${name}.sd`),
    );
    expect(relativeError(autocorrelation(values, 1), expected(`nist.${name}.lag1`))).toBeLessThanOrEqual(
      within(`nist.${name}.lag1`),
    );
  });

  it('agree with R on samples of 1 to 60', () => {
    for (const sample of fromR.samples) {
      expect(relativeError(mean(sample.values), sample.mean)).toBeLessThan(1e-14);
      if (sample.sd !== null) expect(relativeError(standardDeviation(sample.values), sample.sd)).toBeLessThan(1e-13);
    }
  });
});

describe('the compensated sum', () => {
  it('keeps small terms beside large ones that cancel', () => {
    expect(compensatedSum([1, 1e100, 1, -1e100])).toBe(2);
    expect(compensatedSum([1e100, 1, -1e100, 1])).toBe(2);
  });

  it('is 0 of none, and the term itself of one', () => {
    expect(compensatedSum([])).toBe(0);
    expect(compensatedSum([0.1])).toBe(0.1);
  });

  it('is exact where a plain sum drifts: a million times 0.1', () => {
    const sum = new CompensatedSum();
    for (let i = 0; i < 1_000_000; i += 1) sum.add(0.1);
    expect(sum.value).toBe(100_000);
  });

  it('equals the exact sum of whole numbers, in any order', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -1e9, max: 1e9 })), (values) => {
        const exact = values.reduce((total, value) => total + BigInt(value), 0n);
        expect(BigInt(compensatedSum(values))).toBe(exact);
        expect(BigInt(compensatedSum([...values].reverse()))).toBe(exact);
      }),
    );
  });

  it('is NaN where a term is NaN or infinite', () => {
    expect(compensatedSum([1, Number.NaN, 2])).toBeNaN();
    expect(compensatedSum([1, Infinity])).toBeNaN();
  });
});

describe('the mean', () => {
  it('is the worked example’s', () => {
    expect(mean([10000001, 10000003, 10000002])).toBe(10000002);
  });

  it('recovers what the first pass leaves over', () => {
    expect(mean([0.1, 0.1, 0.1])).toBe(0.1);
  });

  it('of one value is that value; of none it throws; a NaN shows', () => {
    expect(mean([7])).toBe(7);
    expect(() => mean([])).toThrow(new RangeError('The mean of no values is not defined.'));
    expect(mean([1, Number.NaN])).toBeNaN();
  });
});

describe('the standard deviation', () => {
  it('is the worked example’s', () => {
    expect(standardDeviation([10000001, 10000003, 10000002])).toBe(1);
  });

  it('is 0 where all values are equal, and never negative or NaN', () => {
    expect(standardDeviation([0.1, 0.1, 0.1])).toBe(0);
    fc.assert(
      fc.property(fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 2 }), (values) => {
        expect(standardDeviation(values)).toBeGreaterThanOrEqual(0);
      }),
    );
  });

  it('below two values throws; a NaN shows', () => {
    const message = 'A standard deviation needs two values or more.';
    expect(() => standardDeviation([])).toThrow(new RangeError(message));
    expect(() => standardDeviation([1])).toThrow(new RangeError(message));
    expect(standardDeviation([1, Number.NaN])).toBeNaN();
  });
});

describe('the autocorrelation', () => {
  it('is the worked example’s', () => {
    expect(autocorrelation([10000001, 10000003, 10000002], 1)).toBe(-0.5);
  });

  it('at a lag of two pairs every second value', () => {
    // By hand: distances −1.5, −0.5, 0.5, 1.5; products −0.75 and −0.75; squares 5.
    expect(autocorrelation([1, 2, 3, 4], 2)).toBeCloseTo(-0.3, 15);
  });

  it('is 0 where all values are equal', () => {
    expect(autocorrelation([5, 5, 5], 1)).toBe(0);
  });

  it('throws below two values, and at a lag that leaves no pair', () => {
    expect(() => autocorrelation([1], 1)).toThrow(new RangeError('An autocorrelation needs two values or more.'));
    const message = 'The lag is a whole number from 1 to one less than the number of values.';
    for (const lag of [0, 3, 1.5, -1]) {
      expect(() => autocorrelation([1, 2, 3], lag)).toThrow(new RangeError(message));
    }
    expect(autocorrelation([1, 2, 4], 2)).toBeTypeOf('number');
    expect(autocorrelation([1, 2], 1)).toBe(-0.5);
  });
});
