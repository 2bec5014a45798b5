import type { ComparableClaim } from './types';

/** Limits of a claim; null is no limit on that side. */
export interface Interval {
  lower: number | null;
  upper: number | null;
}

const WIDENED_TO_PERCENT = 10;
const UPPER_ONLY = new Set(['maximum', 'standby', 'networked-standby']);

/**
 * What a claim allows, in its own unit. A maximum and a standby are upper limits only. A single value v of the other
 * kinds means v ± half its last printed digit, widened to ±10 % unless a tolerance is stated; "at least" and "at most"
 * have one limit already. A stated tolerance widens the limits that are there.
 *
 * @returns both limits null for an upper limit's kind that states only a lower one.
 * @throws {RangeError} where neither limit is stated.
 * @example claimedInterval({ kind: 'typical', lower: 50, upper: 50, singleValue: true, lastDigit: 1, … })
 * // { lower: 45, upper: 55 }
 */
export function claimedInterval(
  claim: Pick<ComparableClaim, 'kind' | 'lower' | 'upper' | 'singleValue' | 'lastDigit' | 'tolerancePercent'>,
): Interval {
  const { lower, upper, tolerancePercent } = claim;
  if (lower === null && upper === null) throw new RangeError('A claim states a lower or an upper limit.');
  const single = claim.singleValue ? (upper ?? lower) : null;
  if (single !== null && !UPPER_ONLY.has(claim.kind)) {
    const share = (single * (tolerancePercent ?? WIDENED_TO_PERCENT)) / 100;
    const half = Math.max((claim.lastDigit ?? 0) / 2, share);
    return { lower: single - half, upper: single + half };
  }
  const tolerance = tolerancePercent ?? 0;
  const highest = single ?? upper;
  return {
    lower: lower === null || UPPER_ONLY.has(claim.kind) ? null : lower - (lower * tolerance) / 100,
    upper: highest === null ? null : highest + (highest * tolerance) / 100,
  };
}
