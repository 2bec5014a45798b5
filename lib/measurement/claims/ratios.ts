import type { Interval } from './claimed-interval';

/** A figure over the nearer limit of a claim, and over its middle; null where that is zero or missing. */
export interface ClaimRatios {
  ratioToNearerLimit: number | null;
  ratioToMiddle: number | null;
}

/**
 * How a figure stands to a claim's nearer limit and to its middle. There is no ratio to zero, nor to a missing limit.
 *
 * @param y the figure, in the interval's unit.
 * @example ratiosToClaim(45, { lower: 60, upper: 75 }) // { ratioToNearerLimit: 0.75, ratioToMiddle: 0.6666… }
 */
export function ratiosToClaim(y: number, { lower, upper }: Interval): ClaimRatios {
  if (lower === null || upper === null) {
    return { ratioToNearerLimit: over(y, lower ?? upper ?? 0), ratioToMiddle: null };
  }
  const nearer = Math.abs(y - lower) < Math.abs(y - upper) ? lower : upper;
  return { ratioToNearerLimit: over(y, nearer), ratioToMiddle: over(y, (lower + upper) / 2) };
}

function over(y: number, reference: number): number | null {
  return reference === 0 ? null : y / reference;
}
