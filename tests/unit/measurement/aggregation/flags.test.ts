import { describe, expect, it } from 'vitest';
import { findFlags } from '@/lib/measurement/aggregation/flags';

const exact = (...values: number[]) => values.map((value) => ({ value, censored: false }));
const censored = (value: number) => ({ value, censored: true });

describe('flags by the modified z-score of the logarithm', () => {
  it('are the worked example’s: ten beside four ones', () => {
    expect(findFlags(exact(1, 1, 1, 1, 10), null)).toEqual([false, false, false, false, true]);
  });

  it('start at five values: four tell nothing', () => {
    expect(findFlags(exact(1, 1, 1, 10), null)).toEqual([false, false, false, false]);
  });

  it('take the MAD as at least 0.0675, so that the limit is a factor of exp(3.5 · 0.0675 / 0.6745) = 1.4194', () => {
    expect(findFlags(exact(100, 100, 100, 100, 141.9), null)[4]).toBe(false);
    expect(findFlags(exact(100, 100, 100, 100, 142), null)[4]).toBe(true);
    expect(findFlags(exact(100, 100, 100, 100, 100 / 1.419), null)[4]).toBe(false);
    expect(findFlags(exact(100, 100, 100, 100, 100 / 1.42), null)[4]).toBe(true);
  });

  it('take the MAD itself where the values differ more: a factor of two each way stands', () => {
    expect(findFlags(exact(50, 71, 100, 141, 200), null)).toEqual([false, false, false, false, false]);
  });

  it('do not go to censored values, which count for nothing here', () => {
    expect(findFlags([...exact(1, 1, 1, 1), censored(10)], null)).toEqual([false, false, false, false, false]);
    expect(findFlags([censored(10), ...exact(1, 1, 1, 1, 10)], null)).toEqual([
      false,
      false,
      false,
      false,
      false,
      true,
    ]);
  });

  it('go to a zero beside real readings, and to the readings where most are zero', () => {
    expect(findFlags(exact(0, 40, 41, 42, 43), null)).toEqual([true, false, false, false, false]);
    expect(findFlags(exact(-2, 40, 41, 42, 43), null)[0]).toBe(true);
    expect(findFlags(exact(0, 0, 0, 0, 43), null)).toEqual([false, false, false, false, true]);
  });
});

describe('flags by the category’s median', () => {
  it('start at one value, beyond a factor of five', () => {
    expect(findFlags(exact(50), 10)).toEqual([false]);
    expect(findFlags(exact(50.1), 10)).toEqual([true]);
    expect(findFlags(exact(2), 10)).toEqual([false]);
    expect(findFlags(exact(1.99), 10)).toEqual([true]);
  });

  it('leave a value alone that is a fifth but for its last binary digit', () => {
    expect(0.3 / 1.5).toBeLessThan(1 / 5);
    expect(findFlags(exact(0.3), 1.5)).toEqual([false]);
  });

  it('go to a censored value whose limit is far below, never to one whose limit is far above', () => {
    expect(findFlags([censored(1.9), censored(60)], 10)).toEqual([true, false]);
  });

  it('go to a zero, and to none where the category has no median or one of zero', () => {
    expect(findFlags(exact(0), 10)).toEqual([true]);
    expect(findFlags(exact(50), null)).toEqual([false]);
    expect(findFlags(exact(50), 0)).toEqual([false]);
  });

  it('stand beside those by score', () => {
    expect(findFlags(exact(60, 60, 60, 60, 600), 10)).toEqual([true, true, true, true, true]);
  });

  it('are none of no values', () => {
    expect(findFlags([], 10)).toEqual([]);
  });
});
