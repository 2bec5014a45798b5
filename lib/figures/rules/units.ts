import type { PowerKind, Quantity } from '@/lib/measurement/units/quantity';

const ENERGY_UNITS: Partial<Record<Quantity, string>> = {
  'day-energy': 'Wh/d',
  'use-energy': 'Wh/use',
  'start-extra-energy': 'Wh',
};

/** The unit a figure is stored and published in. */
export function unitOf(quantity: Quantity, powerKind: PowerKind): string {
  return ENERGY_UNITS[quantity] ?? (powerKind === 'apparent' ? 'VA' : 'W');
}
