import type { ClaimOutcome } from './types';

/** An outcome as a reader sees it. */
export const OUTCOME_WORDS: Record<ClaimOutcome, string> = {
  below: 'below the claim',
  within: 'within the claim',
  above: 'above the claim',
  'too-close': 'too close to call',
  'not-above': 'not above the claim',
  'not-exceeded': 'not exceeded in what was measured',
  'not-comparable': 'not comparable',
};
