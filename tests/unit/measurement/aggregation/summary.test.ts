import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { summarise } from '@/lib/measurement/aggregation/summary';

const exact = (...values: number[]) => summarise(values, values);
const many = (n: number) => Array.from({ length: n }, (_, i) => i + 1);

describe('a pile’s summary', () => {
  it('is the worked example’s', () => {
    expect(exact(40, 42, 44, 50)).toEqual({
      n: 4,
      median: 43,
      medianLow: 43,
      minimum: 40,
      maximum: 50,
      lowerQuartile: 41.5,
      upperQuartile: 45.5,
      interval: null,
      tenthPercentile: null,
      ninetiethPercentile: null,
      atMost: false,
      atMostOf: [],
    });
  });

  it('of one value is that value, with its range and nothing more', () => {
    expect(exact(43)).toMatchObject({
      n: 1,
      median: 43,
      minimum: 43,
      maximum: 43,
      lowerQuartile: null,
      interval: null,
    });
  });

  it('has quartiles from four values, not from three', () => {
    expect(exact(1, 2, 3)).toMatchObject({ lowerQuartile: null, upperQuartile: null });
    expect(exact(1, 2, 3, 4)).toMatchObject({ lowerQuartile: 1.75, upperQuartile: 3.25 });
  });

  it('has an interval of the median from six values, with its exact coverage', () => {
    expect(exact(...many(5)).interval).toBeNull();
    expect(exact(...many(6)).interval).toEqual({ low: 1, high: 6, coverage: 0.96875 });
    expect(exact(...many(10)).interval).toEqual({ low: 2, high: 9, coverage: 0.978515625 });
  });

  it('has the 10th and 90th percentile from ten values, where they are wanted', () => {
    expect(summarise(many(9), many(9), true)).toMatchObject({ tenthPercentile: null, ninetiethPercentile: null });
    expect(summarise(many(10), many(10), true)).toMatchObject({ tenthPercentile: 1.9, ninetiethPercentile: 9.1 });
    expect(exact(...many(10))).toMatchObject({ tenthPercentile: null, ninetiethPercentile: null });
  });

  it('of ties is the tie', () => {
    expect(exact(7, 7, 7, 7, 7, 7)).toMatchObject({ median: 7, lowerQuartile: 7, interval: { low: 7, high: 7 } });
  });

  it('of none throws; so do lists of unlike length, and a NaN', () => {
    expect(() => exact()).toThrow(RangeError);
    expect(() => summarise([1], [1, 2])).toThrow(new RangeError('Both readings hold the same values.'));
    expect(() => exact(1, Number.NaN)).toThrow(RangeError);
  });
});

describe('values that are "at most" something', () => {
  it('leave a median alone that they can’t move, and open the minimum only', () => {
    const summary = summarise([0, 3, 4, 5, 6], [2, 3, 4, 5, 6]);
    expect(summary).toMatchObject({ median: 4, medianLow: 4, minimum: 2, lowerQuartile: 3, atMost: false });
    expect(summary.atMostOf).toEqual(['minimum']);
  });

  it('make the median "at most" its upper reading where they can move it', () => {
    const summary = summarise([0, 0, 4], [2, 5, 4]);
    expect(summary).toMatchObject({ median: 4, medianLow: 0, maximum: 5, minimum: 2, atMost: true });
    expect(summary.atMostOf).toEqual(['median', 'minimum', 'maximum']);
  });

  it('open the lower end of the median’s interval, and name it', () => {
    const summary = summarise([0, 2, 3, 4, 5, 6], [1, 2, 3, 4, 5, 6]);
    expect(summary.interval).toEqual({ low: 1, high: 6, coverage: 0.96875 });
    expect(summary.atMostOf).toEqual(['minimum', 'intervalLow']);
  });

  it('never make an upper reading smaller than the lower one', () => {
    fc.assert(
      fc.property(
        fc.array(fc.tuple(fc.double({ min: 0.01, max: 1e4, noNaN: true }), fc.boolean()), { minLength: 1 }),
        (values) => {
          const high = values.map(([value]) => value);
          const low = values.map(([value, censored]) => (censored ? 0 : value));
          const summary = summarise(low, high, true);
          expect(summary.median).toBeGreaterThanOrEqual(summary.medianLow);
          expect(summary.atMost).toBe(summary.atMostOf.includes('median'));
          if (!values.some(([, censored]) => censored)) expect(summary.atMostOf).toEqual([]);
        },
      ),
    );
  });
});
