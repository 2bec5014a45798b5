import { sumOfTerms } from '../uncertainty/combined-sum';
import type { DayEnergy } from './day-energy';

/**
 * The energy of a day of several devices, with what they share: lines on one figure or one instrument are dependent,
 * lines on different instruments are not.
 *
 * @param days the lines that have an energy of a day.
 * @returns Wh/d.
 * @example householdDay([1056 ± 10 by one meter, 500 ± 5 by the same]) // 1556 ± 15
 */
export function householdDay(days: readonly Extract<DayEnergy, { ok: true }>[]): {
  wattHours: number;
  standardUncertainty: number;
} {
  const { value, standardUncertainty } = sumOfTerms(days.flatMap((day) => day.terms));
  return { wattHours: value, standardUncertainty };
}
