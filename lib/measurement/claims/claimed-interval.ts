import type { ComparableClaim } from './types';

export interface Interval {
  lower: number | null;
  upper: number | null;
}

const WIDENED_TO = 0.1;
const UPPER_ONLY = new Set(['maximum', 'standby', 'networked-standby']);

/**
 * What a claim allows, in its own unit. A maximum and a standby are upper limits only. A single value v of the other
 * kinds means v ± half its last printed digit, widened to ±10 % unless a tolerance is stated; "at least" and "at most"
 * have one limit already.
 *
 * @throws {RangeError} where neither limit is there.
 * @example claimedInterval({ kind: 'typical', lower: 50, upper: 50, singleValue: true, lastDigit: 1, … })
 * // { lower: 45, upper: 55 }
 */
export function claimedInterval(
  claim: Pick<ComparableClaim, 'kind' | 'lower' | 'upper' | 'singleValue' | 'lastDigit' | 'tolerancePercent'>,
): Interval {
  const { lower, upper } = claim;
  if (lower === null && upper === null) throw new RangeError('A claim has a limit.');
  const share = claim.tolerancePercent === null ? null : claim.tolerancePercent / 100;
  if (UPPER_ONLY.has(claim.kind)) return { lower: null, upper: (upper ?? lower ?? 0) * (1 + (share ?? 0)) };
  const value = claim.singleValue ? (upper ?? lower) : null;
  if (value === null) {
    return {
      lower: lower === null ? null : lower * (1 - (share ?? 0)),
      upper: upper === null ? null : upper * (1 + (share ?? 0)),
    };
  }
  const half = Math.max((claim.lastDigit ?? 0) / 2, (share ?? WIDENED_TO) * value);
  return { lower: value - half, upper: value + half };
}
