import { sumOfTerms, type UncertainValue } from '../uncertainty/combined-sum';
import type { Duty } from '../units/quantity';

/** What a measured pause of a thermostat took, from switching off until it cycles as before. */
export interface MeasuredPause {
  /** Pause and recovery together (s). */
  seconds: number;
  wattHours: UncertainValue;
}

export interface Pause {
  duty: Duty;
  /** Mean power (W) of what it would be left in: a mode, or of a thermostat the mean over whole cycles. */
  watts: UncertainValue;
  offWatts: UncertainValue;
  /** Energy (Wh) that starting up again costs beyond the mode that follows. */
  startExtra: UncertainValue;
  hours: number;
  /** Only a thermostat needs one. */
  measured: MeasuredPause | null;
}

export type PauseSaving =
  | {
      ok: true;
      /** Negative where the pause costs more than it saves. */
      savedWattHours: number;
      standardUncertainty: number;
      /** From this length on a pause pays (h); null where that does not follow, as for a thermostat. */
      breakEvenHours: number | null;
    }
  | { ok: false; reason: string };

/**
 * What switching off for so many hours saves: (P_m − P_off) · t − E_extra; it pays from t* = E_extra / (P_m − P_off). Of
 * a thermostat only a measured pause with its recovery tells: the heat comes back.
 *
 * Check: common practice, no source.
 * @example pauseSaving(44 W, nothing when off, no start-up, 11 hours).savedWattHours // 484
 */
export function pauseSaving(pause: Pause): PauseSaving {
  const { duty, watts, offWatts, startExtra, hours, measured } = pause;
  if (!(hours > 0)) return { ok: false, reason: 'A pause has a length above 0.' };
  if (duty === 'cyclic') return measured ? ofMeasured(watts, measured) : { ok: false, reason: NEEDS_RECOVERY };
  const less = watts.value - offWatts.value;
  if (!(less > 0)) return { ok: false, reason: 'It draws no less when off, so a pause saves nothing.' };
  const saved = sumOfTerms([
    { of: watts, factor: hours },
    { of: offWatts, factor: -hours },
    { of: startExtra, factor: -1 },
  ]);
  return {
    ok: true,
    savedWattHours: saved.value,
    standardUncertainty: saved.standardUncertainty,
    // A start-up that draws less than what follows costs nothing: any pause pays.
    breakEvenHours: Math.max(0, startExtra.value) / less,
  };
}

const NEEDS_RECOVERY =
  'A thermostat makes up for a pause afterwards. Measure one, until it cycles as before; then its saving is known.';

function ofMeasured(watts: UncertainValue, { seconds, wattHours }: MeasuredPause): PauseSaving {
  if (!(seconds > 0)) return { ok: false, reason: NEEDS_RECOVERY };
  const saved = sumOfTerms([
    { of: watts, factor: seconds / 3600 },
    { of: wattHours, factor: -1 },
  ]);
  return {
    ok: true,
    savedWattHours: saved.value,
    standardUncertainty: saved.standardUncertainty,
    breakEvenHours: null,
  };
}
