import type { PowerKind, Quantity } from '../units/quantity';
import { OUTCOME_WORDS } from './outcome-words';
import type { ClaimComparison, ClaimKind, ClaimUnit, ComparableClaim } from './types';

/** What was measured, as far as a sentence tells it; values in the quantity's unit. */
export interface MeasuredRange {
  minimum: number;
  maximum: number;
  /** The range's lower end is open: it is at most what stands there. */
  atMost: boolean;
  /** How many voices: contributors, households and units count once. */
  n: number;
  quantity: Quantity;
  powerKind: PowerKind;
}

type StatedClaim = Pick<ComparableClaim, 'kind' | 'lower' | 'upper' | 'singleValue' | 'unit'>;

const CLAIM_UNIT_WORDS: Record<ClaimUnit, string> = {
  W: 'W',
  VA: 'VA',
  'kWh/a': 'kWh a year',
  'Wh/d': 'Wh a day',
  'Wh/use': 'Wh a use',
};

const KIND_WORDS: Record<ClaimKind, string> = {
  typical: ' on average',
  maximum: ' as a maximum',
  standby: ' in standby',
  'networked-standby': ' in networked standby',
  'annual-energy': '',
  'use-energy': '',
};

const UPPER_LIMIT_KINDS = new Set<ClaimKind>(['standby', 'networked-standby']);

const SMALL_NUMBERS = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten'];

/**
 * A comparison in one plain sentence: what was measured and by how many, what the maker states, and how it fares.
 *
 * @example outcomeSentence(range of 41 to 46 W over nine voices, { kind: 'typical', lower: 60, upper: 75, … }, comparison)
 * // 'Measured 41 to 46 W by nine contributors; the maker states 60 to 75 W on average: below the claim.'
 */
export function outcomeSentence(
  measured: MeasuredRange,
  claim: StatedClaim,
  comparison: Pick<ClaimComparison, 'outcome' | 'reason' | 'canConfirm' | 'ratioToNearerLimit'>,
): string {
  const reason = comparison.outcome === 'not-comparable' && comparison.reason ? ` ${comparison.reason}` : '';
  return `${measuredWords(measured)}; the maker states ${claimWords(claim)}: ${outcomeWords(comparison)}.${reason}`;
}

function measuredWords({ minimum, maximum, atMost, n, quantity, powerKind }: MeasuredRange): string {
  const range = minimum === maximum ? plainNumber(maximum) : `${plainNumber(minimum)} to ${plainNumber(maximum)}`;
  const by = n === 1 ? 'on one unit' : `by ${SMALL_NUMBERS[n] ?? String(n)} contributors`;
  return `Measured ${atMost ? 'at most ' : ''}${range} ${unitWords(quantity, powerKind)} ${by}`;
}

function unitWords(quantity: Quantity, powerKind: PowerKind): string {
  switch (quantity) {
    case 'day-energy':
      return CLAIM_UNIT_WORDS['Wh/d'];
    case 'use-energy':
      return CLAIM_UNIT_WORDS['Wh/use'];
    case 'start-extra-energy':
      return 'Wh';
    default:
      return powerKind === 'real' ? 'W' : 'VA';
  }
}

function claimWords({ kind, lower, upper, singleValue, unit }: StatedClaim): string {
  return `${limitWords(kind, lower, upper, singleValue)} ${CLAIM_UNIT_WORDS[unit]}${KIND_WORDS[kind]}`;
}

function limitWords(kind: ClaimKind, lower: number | null, upper: number | null, singleValue: boolean): string {
  const single = singleValue ? (upper ?? lower) : null;
  if (single !== null) return UPPER_LIMIT_KINDS.has(kind) ? `at most ${single}` : String(single);
  if (upper === null) return `at least ${lower}`;
  if (UPPER_LIMIT_KINDS.has(kind)) return `at most ${upper}`;
  if (lower === null) return kind === 'maximum' ? String(upper) : `at most ${upper}`;
  return lower === upper ? String(upper) : `${lower} to ${upper}`;
}

function outcomeWords({ outcome, canConfirm, ratioToNearerLimit }: Parameters<typeof outcomeSentence>[2]): string {
  if (outcome === 'too-close' && !canConfirm) return `${OUTCOME_WORDS[outcome]}, and this reading can’t confirm it`;
  if (outcome === 'not-exceeded' && ratioToNearerLimit !== null && ratioToNearerLimit > 1) {
    return 'not shown to be exceeded in what was measured';
  }
  return OUTCOME_WORDS[outcome];
}

/** Three significant digits, and all digits before the point. The claim's own numbers stand as they were stated. */
function plainNumber(value: number): string {
  return Math.abs(value) >= 100 ? String(Math.round(value)) : String(Number(value.toPrecision(3)));
}
