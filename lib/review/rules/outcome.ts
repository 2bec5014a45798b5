import type { CheckedItem, Verdict } from '../schema';

export type Outcome = 'verified' | 'not-verified' | 'incomplete';

/**
 * The published rule by which the outcome follows from the checklist: with one item failed the report is not verified;
 * with every item passed or not applicable it is; until every item has a result there is no outcome.
 */
export function outcomeOf(
  items: readonly { key: string }[],
  results: readonly Pick<CheckedItem, 'key' | 'result'>[],
): Outcome {
  const byKey = new Map(results.map(({ key, result }) => [key, result]));
  const found = items.map(({ key }) => byKey.get(key));
  if (found.includes('failed')) return 'not-verified';
  return found.includes(undefined) ? 'incomplete' : 'verified';
}

/** Whether a verdict is one that the outcome allows. */
export function followsFrom(outcome: Outcome, verdict: Verdict): boolean {
  return verdict === 'verified' ? outcome === 'verified' : outcome === 'not-verified';
}
