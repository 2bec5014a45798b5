import type { ComparableClaim, ComparableFigure } from './types';

const DAYS_A_YEAR = 365;
const HOURS_A_DAY = 24;
const WATT_HOURS_A_KILOWATT_HOUR = 1000;

/**
 * The factor that turns a claim's unit into a figure's. kWh a year over 365 is Wh a day for what draws all day, and
 * over the maker's stated uses Wh a use for what is used. A day's energy of a continuous device is 24 h of its mean
 * power where the claim names the mode that was measured. Null where the two can't be converted.
 *
 * @example claimFactor({ unit: 'kWh/a', usesPerYear: null, … }, { quantity: 'day-energy', duty: 'cyclic', … }) // 2.739…
 */
export function claimFactor(
  claim: Pick<ComparableClaim, 'unit' | 'usesPerYear' | 'modeCode'>,
  figure: Pick<ComparableFigure, 'quantity' | 'duty' | 'modeCode'>,
): number | null {
  const { quantity } = figure;
  switch (claim.unit) {
    case 'W':
    case 'VA':
      return quantity === 'mean-power' || quantity === 'maximum-power' ? 1 : null;
    case 'Wh/use':
      return quantity === 'use-energy' ? 1 : null;
    case 'Wh/d':
      return quantity === 'day-energy' ? 1 : fromDayToMeanPower(claim, figure);
    case 'kWh/a':
      return quantity === 'use-energy' ? fromYearToUse(claim.usesPerYear) : fromYearToDay(claim, figure);
  }
}

function fromYearToUse(usesPerYear: number | null): number | null {
  return usesPerYear !== null && usesPerYear > 0 ? WATT_HOURS_A_KILOWATT_HOUR / usesPerYear : null;
}

/** What a modulating device takes in a day follows the weather: a year over 365 is no day of it. */
function fromYearToDay(
  claim: Pick<ComparableClaim, 'modeCode'>,
  figure: Pick<ComparableFigure, 'quantity' | 'duty' | 'modeCode'>,
): number | null {
  const { quantity, duty } = figure;
  const aDay = WATT_HOURS_A_KILOWATT_HOUR / DAYS_A_YEAR;
  if (quantity === 'day-energy') return duty === 'continuous' || duty === 'cyclic' ? aDay : null;
  const toMeanPower = fromDayToMeanPower(claim, figure);
  return toMeanPower === null ? null : aDay * toMeanPower;
}

function fromDayToMeanPower(
  claim: Pick<ComparableClaim, 'modeCode'>,
  { quantity, duty, modeCode }: Pick<ComparableFigure, 'quantity' | 'duty' | 'modeCode'>,
): number | null {
  const allDay = duty === 'continuous' && modeCode !== null && modeCode === claim.modeCode;
  return quantity === 'mean-power' && allDay ? 1 / HOURS_A_DAY : null;
}
