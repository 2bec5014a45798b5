const DAY_HOURS = 24;
/** Hours that differ by less are the same: thirds of a day don't add up in binary. */
const ROUNDING = 1e-9;

/** Hours of each mode in a day; together with the hours in use they are 24. */
export type HoursOfDay =
  { ok: true; hours: { modeCode: string; hours: number }[]; restHours: number } | { ok: false; reason: string };

/**
 * Makes the hours of a day sum to 24. Hours in use are taken from the other modes, from each in proportion, where the
 * day has no room for them; what is left of the day is the rest: the off mode, or as declared.
 *
 * @param declared hours of each mode, ≥ 0.
 * @param useHours uses a day times the hours of one, ≥ 0.
 * @example hoursOfDay([{ modeCode: 'standby', hours: 24 }], 2) // standby 22 h, no rest
 */
export function hoursOfDay(declared: readonly { modeCode: string; hours: number }[], useHours: number): HoursOfDay {
  const all = [...declared.map((mode) => mode.hours), useHours];
  if (all.some((hours) => !(hours >= 0))) return { ok: false, reason: 'Hours are numbers of 0 or more.' };
  const sum = declared.reduce((total, mode) => total + mode.hours, 0);
  if (sum > DAY_HOURS + ROUNDING) {
    return { ok: false, reason: `The hours sum to ${Number(sum.toFixed(2))}; a day has 24.` };
  }
  if (useHours > DAY_HOURS + ROUNDING) {
    return { ok: false, reason: `The uses take ${Number(useHours.toFixed(2))} hours; a day has 24.` };
  }
  const free = Math.max(0, DAY_HOURS - useHours);
  const share = sum > free ? free / sum : 1;
  const hours = declared.map((mode) => ({ modeCode: mode.modeCode, hours: mode.hours * share }));
  return { ok: true, hours, restHours: Math.max(0, free - Math.min(sum, free)) };
}
