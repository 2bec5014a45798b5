import type { Claim } from '@/lib/claims/schema';

const UNITS: Record<Claim['unit'], string> = {
  W: 'W',
  VA: 'VA',
  'kWh/a': 'kWh a year',
  'Wh/d': 'Wh a day',
  'Wh/use': 'Wh a use',
};

/** What the maker states, as printed: "60–75 W", "at most 130 W", "241 kWh a year". */
export function claimWords(claim: Claim): string {
  const unit = UNITS[claim.unit];
  const { lower, upper } = claim;
  if (claim.singleValue || lower === upper) return `${upper ?? lower} ${unit}`;
  if (lower === null) return `at most ${upper} ${unit}`;
  return upper === null ? `at least ${lower} ${unit}` : `${lower}–${upper} ${unit}`;
}
