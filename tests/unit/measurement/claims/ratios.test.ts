import { describe, expect, it } from 'vitest';
import { ratiosToClaim } from '@/lib/measurement/claims/ratios';

describe('a figure as a ratio to a claim', () => {
  it('is taken to the nearer limit and to the middle', () => {
    expect(ratiosToClaim(45, { lower: 60, upper: 75 })).toEqual({ ratioToNearerLimit: 0.75, ratioToMiddle: 45 / 67.5 });
    expect(ratiosToClaim(90, { lower: 60, upper: 75 })).toEqual({ ratioToNearerLimit: 1.2, ratioToMiddle: 90 / 67.5 });
    expect(ratiosToClaim(72, { lower: 60, upper: 75 }).ratioToNearerLimit).toBe(0.96);
    expect(ratiosToClaim(63, { lower: 60, upper: 75 }).ratioToNearerLimit).toBe(1.05);
  });

  it('midway between the limits is taken to the upper one', () => {
    expect(ratiosToClaim(3, { lower: 2, upper: 4 }).ratioToNearerLimit).toBe(0.75);
  });

  it('with one limit has no middle', () => {
    expect(ratiosToClaim(30, { lower: null, upper: 60 })).toEqual({ ratioToNearerLimit: 0.5, ratioToMiddle: null });
    expect(ratiosToClaim(30, { lower: 60, upper: null })).toEqual({ ratioToNearerLimit: 0.5, ratioToMiddle: null });
  });

  it('is none to zero or to a missing limit', () => {
    expect(ratiosToClaim(1, { lower: 0, upper: 10 })).toEqual({ ratioToNearerLimit: null, ratioToMiddle: 0.2 });
    expect(ratiosToClaim(1, { lower: 0, upper: 0 })).toEqual({ ratioToNearerLimit: null, ratioToMiddle: null });
    expect(ratiosToClaim(1, { lower: null, upper: 0 })).toEqual({ ratioToNearerLimit: null, ratioToMiddle: null });
    expect(ratiosToClaim(1, { lower: null, upper: null })).toEqual({ ratioToNearerLimit: null, ratioToMiddle: null });
  });
});
