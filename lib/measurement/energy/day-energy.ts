import type { Duty } from '../units/quantity';
import { sumOfTerms, type SumTerm, type UncertainValue } from '../uncertainty/combined-sum';
import { hoursOfDay } from './hours-of-day';

/** How a device spends a day, and on which figures its energy rests. */
export interface DayPattern {
  duty: Duty;
  /** Of a thermostat: its measured energy of a day (Wh/d). Its modes are not added up. */
  measuredDay: UncertainValue | null;
  /** Mean power (W) and hours of each mode. */
  modes: readonly { modeCode: string; watts: UncertainValue; hours: number }[];
  /** Mean power (W) in the hours that are left: the off mode or as declared; null where nothing is known of it. */
  rest: UncertainValue | null;
  uses: { perDay: number; hoursEach: number; wattHours: UncertainValue } | null;
  starts: { perDay: number; extraWattHours: UncertainValue } | null;
}

export type DayEnergy =
  | {
      ok: true;
      wattHours: number;
      standardUncertainty: number;
      /** What went in, for sums over several devices. */
      terms: SumTerm[];
      hours: { modeCode: string | null; hours: number }[];
      /** Hours that were counted as nothing drawn, since nothing is known of them. */
      unknownHours: number;
    }
  | { ok: false; reason: string };

/**
 * The energy of a day: Σ P_mode · h_mode + uses · E_use + starts · E_extra. Hours sum to 24; a thermostat's is its
 * measured energy of a day, never watts times hours.
 *
 * Source of the check: US DOE, Energy Saver, energy of a use pattern.
 * @example dayEnergy(44 W for 24 hours).wattHours // 1056
 */
export function dayEnergy(pattern: DayPattern): DayEnergy {
  const { duty, measuredDay, modes, rest, uses, starts } = pattern;
  if (duty === 'cyclic') {
    if (!measuredDay) {
      return {
        ok: false,
        reason: 'A thermostat’s day is measured over whole cycles; watts times hours don’t give it.',
      };
    }
    return sum([{ of: measuredDay, factor: 1 }], [], 0);
  }
  const counts = [uses?.perDay ?? 0, uses?.hoursEach ?? 0, starts?.perDay ?? 0];
  if (counts.some((count) => !(count >= 0))) return { ok: false, reason: 'Uses and starts are numbers of 0 or more.' };
  const day = hoursOfDay(modes, uses ? uses.perDay * uses.hoursEach : 0);
  if (!day.ok) return day;
  const terms = modes.map((mode, i) => ({ of: mode.watts, factor: day.hours[i]?.hours ?? 0 }));
  if (rest) terms.push({ of: rest, factor: day.restHours });
  if (uses) terms.push({ of: uses.wattHours, factor: uses.perDay });
  if (starts) terms.push({ of: starts.extraWattHours, factor: starts.perDay });
  const hours = [...day.hours, { modeCode: null, hours: day.restHours }];
  return sum(terms, hours, rest ? 0 : day.restHours);
}

function sum(terms: SumTerm[], hours: { modeCode: string | null; hours: number }[], unknownHours: number): DayEnergy {
  const { value, standardUncertainty } = sumOfTerms(terms);
  return { ok: true, wattHours: value, standardUncertainty, terms, hours, unknownHours };
}
