import type { PowerKind, Quantity } from './quantity';

const ENERGY_UNITS: Partial<Record<Quantity, string>> = {
  'day-energy': 'Wh/d',
  'use-energy': 'Wh/use',
  'start-extra-energy': 'Wh',
};

/**
 * The unit a figure is stored and published in.
 *
 * @example unitOf('mean-power', 'apparent') // 'VA'
 */
export function unitOf(quantity: Quantity, powerKind: PowerKind): string {
  return ENERGY_UNITS[quantity] ?? (powerKind === 'apparent' ? 'VA' : 'W');
}
