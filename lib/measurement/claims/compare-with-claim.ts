import { claimedInterval, type Interval } from './claimed-interval';
import { conformity } from './conformity';
import { claimFactor } from './convert-claim';
import type { ClaimComparison, ClaimOutcome, ComparableClaim, ComparableFigure } from './types';

const DECIDED_FROM = 0.95;
/** 2 · 1.96: an interval narrower than this many u can't hold 95 % of a reading. */
const CONFIRMING_WIDTH = 3.92;
const SAME_ROOM_KELVIN = 2;

/**
 * Sets a published figure beside a maker's claim. The outcome is the one with a probability of 0.95 or more, otherwise
 * too close to call. A maximum can only be exceeded or not exceeded in what was measured: the largest of many noisy
 * samples always rises.
 *
 * Source: JCGM 106:2012, clauses 7 and 8.
 * @returns not-comparable, with the reason, where mode, definition, variant, room or unit stand in the way.
 * @example compareWithClaim({ value: 43, standardUncertainty: 1, … }, { lower: 60, upper: 75, … }).outcome // 'below'
 */
export function compareWithClaim(figure: ComparableFigure, claim: ComparableClaim): ClaimComparison {
  const reason = obstacle(figure, claim);
  const factor = claimFactor(claim, figure);
  if (reason !== null || factor === null) {
    return notComparable(reason ?? 'The claim’s unit can’t be converted into what was measured.');
  }
  const own = claimedInterval(claim);
  const interval = { lower: scaled(own.lower, factor), upper: scaled(own.upper, factor) };
  if (figure.atMost) return compareCensored(figure, interval);
  const probability = conformity(figure.value, figure.standardUncertainty, figure.degreesOfFreedom, interval);
  if (claim.unit === 'VA' && figure.powerKind === 'real' && probability.above < DECIDED_FROM) {
    return notComparable('Real power below a claimed apparent power says nothing about it.');
  }
  const width = interval.lower !== null && interval.upper !== null ? interval.upper - interval.lower : Infinity;
  return {
    outcome: claim.kind === 'maximum' ? maximumOutcome(probability.above) : decide(probability),
    reason: null,
    interval,
    probability,
    canConfirm: width >= CONFIRMING_WIDTH * figure.standardUncertainty,
    ...ratios(figure.value, interval),
  };
}

function obstacle(figure: ComparableFigure, claim: ComparableClaim): string | null {
  if (claim.contradictsMode !== null) return claim.contradictsMode;
  if (claim.modeCode !== null && figure.modeCode !== null && claim.modeCode !== figure.modeCode) {
    return 'The claim’s mode is not one that was measured.';
  }
  if (claim.variantId !== null && figure.variantId !== null && claim.variantId !== figure.variantId) {
    return 'The claim is about another variant.';
  }
  if (figure.powerKind === 'apparent' && claim.unit !== 'VA') {
    return 'What was measured is apparent power (VA), which says nothing certain about watts.';
  }
  if (claim.kind === 'maximum' && figure.quantity !== 'maximum-power') {
    return 'A maximum compares with the highest 10-second mean alone.';
  }
  if (figure.duty === 'cyclic' && figure.quantity === 'day-energy' && claim.ambientCelsius !== null) {
    if (figure.ambientCelsius === null) return 'The room’s temperature was not recorded, and the claim depends on it.';
    const apart = Math.abs(figure.ambientCelsius - claim.ambientCelsius);
    if (apart > SAME_ROOM_KELVIN) {
      return `The claim is for a room of ${claim.ambientCelsius} °C; it was measured at ${figure.ambientCelsius} °C.`;
    }
  }
  return null;
}

function compareCensored(figure: ComparableFigure, interval: Interval): ClaimComparison {
  if (interval.upper === null || figure.value > interval.upper) {
    return notComparable('The instrument can’t read low enough to tell.');
  }
  return {
    outcome: 'not-above',
    reason: null,
    interval,
    probability: null,
    canConfirm: false,
    ratioToNearerLimit: null,
    ratioToMiddle: null,
  };
}

function decide(probability: { below: number; within: number; above: number }): ClaimOutcome {
  if (probability.below >= DECIDED_FROM) return 'below';
  if (probability.within >= DECIDED_FROM) return 'within';
  return probability.above >= DECIDED_FROM ? 'above' : 'too-close';
}

function maximumOutcome(above: number): ClaimOutcome {
  return above >= DECIDED_FROM ? 'above' : 'not-exceeded';
}

function ratios(y: number, { lower, upper }: Interval) {
  const nearer =
    lower === null ? upper : upper === null ? lower : Math.abs(y - lower) < Math.abs(y - upper) ? lower : upper;
  const middle = lower === null || upper === null ? null : (lower + upper) / 2;
  return {
    ratioToNearerLimit: nearer === null || nearer === 0 ? null : y / nearer,
    ratioToMiddle: middle === null || middle === 0 ? null : y / middle,
  };
}

function scaled(limit: number | null, factor: number): number | null {
  return limit === null ? null : limit * factor;
}

function notComparable(reason: string): ClaimComparison {
  return {
    outcome: 'not-comparable',
    reason,
    interval: null,
    probability: null,
    canConfirm: false,
    ratioToNearerLimit: null,
    ratioToMiddle: null,
  };
}
