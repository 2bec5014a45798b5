import type { Computation } from './compute-figures';

export interface MethodMinimum {
  minimumSeconds: number;
  minimumCycles: number;
}

/** A method of hours is about the recording as a whole, one of minutes about each mode. */
const WHOLE_RECORDING_SECONDS = 3600;
/** These are over when they are over. */
const START_UPS = ['boot', 'start-up', 'motor-start'];
const LEAST_COVERAGE = 0.9;

/**
 * What a report lacks of its method's minimum, in words. It can be sent all the same: the moderator decides.
 *
 * @param countedSeconds of all its phases together.
 * @param nameOf a mode's name, as the category has it.
 */
export function whatIsMissing(
  method: MethodMinimum,
  computation: Computation,
  countedSeconds: number,
  nameOf: (modeCode: string) => string,
): string[] {
  const missing: string[] = [];
  const { minimumSeconds, minimumCycles } = method;
  if (minimumSeconds > WHOLE_RECORDING_SECONDS && countedSeconds < minimumSeconds) {
    missing.push(`The method asks for ${inWords(minimumSeconds)}; ${inWords(countedSeconds)} are there.`);
  }
  for (const { modeCode, quantity, countedSeconds: seconds, coverage } of computation.figures) {
    const name = modeCode === null ? 'The whole' : nameOf(modeCode);
    const isShort = minimumSeconds <= WHOLE_RECORDING_SECONDS && seconds < minimumSeconds;
    if (quantity === 'mean-power' && isShort && !START_UPS.includes(modeCode ?? '')) {
      missing.push(`${name}: the method asks for ${inWords(minimumSeconds)}; ${inWords(seconds)} are there.`);
    }
    if (coverage !== null && coverage < LEAST_COVERAGE) {
      missing.push(`${name}: only ${Math.floor(coverage * 100)} % of the time counts, the rest are gaps.`);
    }
  }
  const { wholeCycles } = computation;
  if (wholeCycles !== null && wholeCycles < minimumCycles) {
    missing.push(`The method asks for ${minimumCycles} whole cycles; ${wholeCycles} are there.`);
  }
  return missing;
}

function inWords(seconds: number): string {
  if (seconds >= 7200) return `${Math.round(seconds / 360) / 10} hours`;
  return seconds >= 120 ? `${Math.round(seconds / 6) / 10} minutes` : `${Math.round(seconds)} seconds`;
}
