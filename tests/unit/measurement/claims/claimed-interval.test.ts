import { describe, expect, it } from 'vitest';
import { claimedInterval } from '@/lib/measurement/claims/claimed-interval';
import { claim } from './samples';

const single = (value: number, traits: Parameters<typeof claim>[0] = {}) =>
  claimedInterval(claim({ lower: value, upper: value, singleValue: true, ...traits }));

describe('what a single value means', () => {
  it('for a typical power is ±10 %, the worked example’s', () => {
    expect(single(50, { lastDigit: 1 })).toEqual({ lower: 45, upper: 55 });
  });

  it('is ± half its last printed digit where that is wider', () => {
    expect(single(3, { lastDigit: 1 })).toEqual({ lower: 2.5, upper: 3.5 });
    expect(single(4.5, { lastDigit: 0.1 })).toEqual({ lower: 4.05, upper: 4.95 });
    expect(single(50, { lastDigit: null })).toEqual({ lower: 45, upper: 55 });
  });

  it('is the stated tolerance instead of the 10 %, but never less than half the last digit', () => {
    expect(single(200, { lastDigit: 1, tolerancePercent: 5 })).toEqual({ lower: 190, upper: 210 });
    expect(single(200, { lastDigit: 10, tolerancePercent: 1 })).toEqual({ lower: 195, upper: 205 });
    expect(single(200, { lastDigit: 1, tolerancePercent: 0 })).toEqual({ lower: 199.5, upper: 200.5 });
    expect(single(200, { lastDigit: 1, tolerancePercent: 20 })).toEqual({ lower: 160, upper: 240 });
  });

  it.each(['annual-energy', 'use-energy'] as const)('is the same for %s', (kind) => {
    expect(single(150, { kind, lastDigit: 1 })).toEqual({ lower: 135, upper: 165 });
  });

  it('is read from whichever limit holds it', () => {
    expect(single(50, { lower: null })).toEqual({ lower: 45, upper: 55 });
    expect(single(50, { upper: null })).toEqual({ lower: 45, upper: 55 });
  });
});

describe('limits', () => {
  it('of a range stand as they are; a stated tolerance widens them', () => {
    expect(claimedInterval(claim())).toEqual({ lower: 60, upper: 75 });
    expect(claimedInterval(claim({ tolerancePercent: 20 }))).toEqual({ lower: 48, upper: 90 });
  });

  it('"at least" has a lower one only, "at most" an upper one only', () => {
    expect(claimedInterval(claim({ upper: null }))).toEqual({ lower: 60, upper: null });
    expect(claimedInterval(claim({ lower: null }))).toEqual({ lower: null, upper: 75 });
  });

  it.each(['maximum', 'standby', 'networked-standby'] as const)('of a %s are upper ones only', (kind) => {
    expect(claimedInterval(claim({ kind }))).toEqual({ lower: null, upper: 75 });
    expect(single(0.5, { kind, lastDigit: 0.1 })).toEqual({ lower: null, upper: 0.5 });
    expect(single(0.5, { kind, upper: null })).toEqual({ lower: null, upper: 0.5 });
    expect(claimedInterval(claim({ kind, tolerancePercent: 20 }))).toEqual({ lower: null, upper: 90 });
    expect(claimedInterval(claim({ kind, upper: null }))).toEqual({ lower: null, upper: null });
  });

  it('of a claim that states none throw', () => {
    expect(() => claimedInterval(claim({ lower: null, upper: null }))).toThrow(
      new RangeError('A claim states a lower or an upper limit.'),
    );
  });
});
