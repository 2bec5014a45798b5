import { claimedInterval, type Interval } from './claimed-interval';
import { conformity, type Probabilities } from './conformity';
import { claimFactor } from './convert-claim';
import { findObstacle } from './obstacle';
import { ratiosToClaim } from './ratios';
import type { ClaimComparison, ClaimOutcome, ComparableClaim, ComparableFigure } from './types';

const DECIDED_FROM = 0.95;
/** 2 · 1.96: an interval narrower than this many u can't hold 95 % of a reading. */
const CONFIRMING_WIDTH = 3.92;

const REAL_BELOW_APPARENT = 'Real power below a claimed apparent power says nothing about it.';

/** Where nothing is weighed there is no probability, no ratio, and nothing confirmed. */
const NOTHING_COMPUTED = { probability: null, canConfirm: false, ratioToNearerLimit: null, ratioToMiddle: null };

/**
 * Sets a published figure beside a maker's claim. The outcome is the one with a probability of 0.95 or more, otherwise
 * too close to call. A maximum can only be exceeded or not exceeded in what was measured: the largest of many noisy
 * samples always rises. A figure that is "at most" something is not above the claim, or tells nothing.
 *
 * Source: JCGM 106:2012, clauses 7 and 8.
 * @returns not-comparable, with the reason, where mode, definition, variant, room, power or unit stand in the way.
 * @throws {RangeError} where the claim has no limit, or the uncertainty is negative or not a number.
 * @example compareWithClaim({ value: 43, standardUncertainty: 1, … }, { lower: 60, upper: 75, … }).outcome // 'below'
 */
export function compareWithClaim(figure: ComparableFigure, claim: ComparableClaim): ClaimComparison {
  const reason = findObstacle(figure, claim);
  if (reason !== null) return notComparable(reason);
  const factor = claimFactor(claim, figure);
  if (factor === null) return notComparable('The claim’s unit can’t be converted into what was measured.');
  const own = claimedInterval(claim);
  if (own.lower === null && own.upper === null) {
    return notComparable('Such a claim is an upper limit, and this one states none.');
  }
  const interval = { lower: scaled(own.lower, factor), upper: scaled(own.upper, factor) };
  if (figure.atMost) return compareCensored(figure, claim, interval);
  const probability = conformity(figure.value, figure.standardUncertainty, figure.degreesOfFreedom, interval);
  if (saysNothing(figure, claim) && probability.above < DECIDED_FROM) return notComparable(REAL_BELOW_APPARENT);
  const width = interval.lower !== null && interval.upper !== null ? interval.upper - interval.lower : Infinity;
  return {
    outcome: claim.kind === 'maximum' ? maximumOutcome(probability) : decide(probability),
    reason: null,
    interval,
    probability,
    canConfirm: width >= CONFIRMING_WIDTH * figure.standardUncertainty,
    ...ratiosToClaim(figure.value, interval),
  };
}

function compareCensored(figure: ComparableFigure, claim: ComparableClaim, interval: Interval): ClaimComparison {
  if (saysNothing(figure, claim)) return notComparable(REAL_BELOW_APPARENT);
  if (interval.upper === null || figure.value > interval.upper) {
    return notComparable('The instrument can’t read low enough to tell.');
  }
  return { ...NOTHING_COMPUTED, outcome: 'not-above', reason: null, interval };
}

/** Real power never exceeds apparent power: more watts than the claimed VA contradict it, fewer tell nothing. */
function saysNothing(figure: ComparableFigure, claim: ComparableClaim): boolean {
  return claim.unit === 'VA' && figure.powerKind === 'real';
}

function decide(probability: Probabilities): ClaimOutcome {
  if (probability.below >= DECIDED_FROM) return 'below';
  if (probability.within >= DECIDED_FROM) return 'within';
  return probability.above >= DECIDED_FROM ? 'above' : 'too-close';
}

function maximumOutcome({ above }: Probabilities): ClaimOutcome {
  return above >= DECIDED_FROM ? 'above' : 'not-exceeded';
}

function scaled(limit: number | null, factor: number): number | null {
  return limit === null ? null : limit * factor;
}

function notComparable(reason: string): ClaimComparison {
  return { ...NOTHING_COMPUTED, outcome: 'not-comparable', reason, interval: null };
}
