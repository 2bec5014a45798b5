import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { conformity } from '@/lib/measurement/claims/conformity';
import reference from '@/tests/reference/published-figures.json';

describe('conformance probabilities', () => {
  it('agree with scipy’s Student t on sixty claims (published-figures.py)', () => {
    expect(reference.conformity).toHaveLength(60);
    for (const { y, u, df, lower, upper, below, within, above } of reference.conformity) {
      const found = conformity(y, u, df, { lower, upper });
      expect(found.below).toBeCloseTo(below, 12);
      expect(found.within).toBeCloseTo(within, 12);
      expect(found.above).toBeCloseTo(above, 12);
    }
  });

  it('are those of JCGM 106:2012 7.4: 1.4 standard uncertainties under a limit conform with 0.92 (from memory)', () => {
    expect(conformity(10, 1, Infinity, { lower: null, upper: 11.4 }).within).toBeCloseTo(0.92, 2);
  });

  it('at a limit are even', () => {
    expect(conformity(60, 2, 5, { lower: 60, upper: null })).toEqual({ below: 0.5, within: 0.5, above: 0 });
    expect(conformity(75, 2, 5, { lower: null, upper: 75 })).toEqual({ below: 0, within: 0.5, above: 0.5 });
  });

  it('without uncertainty follow from the reading alone; a limit belongs to the claim', () => {
    const interval = { lower: 60, upper: 75 };
    expect(conformity(59.9, 0, 4, interval)).toEqual({ below: 1, within: 0, above: 0 });
    expect(conformity(60, 0, 4, interval)).toEqual({ below: 0, within: 1, above: 0 });
    expect(conformity(75, 0, 4, interval)).toEqual({ below: 0, within: 1, above: 0 });
    expect(conformity(75.1, 0, 4, interval)).toEqual({ below: 0, within: 0, above: 1 });
    expect(conformity(9, 0, 4, { lower: null, upper: null })).toEqual({ below: 0, within: 1, above: 0 });
  });

  it('sum to one and lie between 0 and 1', () => {
    const watts = fc.double({ min: 0, max: 1000, noNaN: true });
    fc.assert(
      fc.property(watts, watts, watts, watts, fc.integer({ min: 4, max: 60 }), (y, u, one, other, df) => {
        const found = conformity(y, u, df, { lower: Math.min(one, other), upper: Math.max(one, other) });
        expect(found.below + found.within + found.above).toBeCloseTo(1, 12);
        for (const p of Object.values(found)) expect(p >= 0 && p <= 1).toBe(true);
      }),
    );
  });

  it.each([-1, Number.NaN])('throw at an uncertainty of %s', (u) => {
    expect(() => conformity(1, u, 4, { lower: 0, upper: 2 })).toThrow(
      new RangeError('A standard uncertainty is 0 or more.'),
    );
  });
});
