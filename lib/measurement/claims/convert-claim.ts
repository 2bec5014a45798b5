import type { Quantity } from '../units/quantity';
import type { ComparableClaim, ComparableFigure } from './types';

const DAYS_A_YEAR = 365;

/**
 * The factor that turns a claim's unit into a figure's: kWh a year over 365 is Wh a day for what draws all day, and
 * over the maker's stated uses Wh a use for what is used. Null where the two can't be converted.
 *
 * @example claimFactor({ unit: 'kWh/a', usesPerYear: null }, { quantity: 'day-energy', duty: 'cyclic' }) // 2.739…
 */
export function claimFactor(
  claim: Pick<ComparableClaim, 'unit' | 'usesPerYear'>,
  figure: Pick<ComparableFigure, 'quantity' | 'duty'>,
): number | null {
  const { quantity, duty } = figure;
  switch (claim.unit) {
    case 'W':
    case 'VA':
      return isPower(quantity) ? 1 : null;
    case 'Wh/d':
      return quantity === 'day-energy' ? 1 : null;
    case 'Wh/use':
      return quantity === 'use-energy' ? 1 : null;
    case 'kWh/a':
      if (quantity === 'use-energy') return claim.usesPerYear ? 1000 / claim.usesPerYear : null;
      return quantity === 'day-energy' && duty !== 'per-use' ? 1000 / DAYS_A_YEAR : null;
  }
}

function isPower(quantity: Quantity): boolean {
  return quantity === 'mean-power' || quantity === 'minimum-power' || quantity === 'maximum-power';
}
