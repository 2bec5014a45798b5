import type { StatedAccuracy } from './types';

/** Half-width of a rectangular distribution to standard uncertainty. Source: JCGM 100:2008 (GUM), 4.3.7. */
const RECTANGULAR = Math.sqrt(3);

/**
 * The standard uncertainty that an instrument's stated accuracy ±(a % of reading + b % of range + c counts) leaves at a
 * reading: its half-width over √3, taken as rectangular. The part that scales with the reading is kept apart, since it
 * is shared by everything the instrument reads.
 *
 * Source: JCGM 100:2008 (GUM), 4.3.7.
 * @param watts the reading.
 * @returns gain and offset in the reading's unit; they add linearly in the half-width, so their sum is the whole.
 * @example instrumentUncertainty({ percentOfReading: 1, percentOfRange: 0, counts: 0, … }, 100).gain // 0.577…
 */
export function instrumentUncertainty(
  accuracy: Pick<StatedAccuracy, 'percentOfReading' | 'percentOfRange' | 'rangeWatts' | 'counts' | 'resolutionWatts'>,
  watts: number,
): { gain: number; offset: number } {
  const gain = (accuracy.percentOfReading / 100) * Math.abs(watts);
  const ofRange = (accuracy.percentOfRange / 100) * (accuracy.rangeWatts ?? 0);
  const offset = ofRange + accuracy.counts * accuracy.resolutionWatts;
  return { gain: gain / RECTANGULAR, offset: offset / RECTANGULAR };
}

/**
 * The standard uncertainty of a display or logger that reads in steps of q: q/√12; nothing where stated counts hold it
 * already. They hold the display's own step, not that of a logger which writes down less than the display shows.
 *
 * Source: JCGM 100:2008 (GUM), F.2.2.1.
 * @param step q, in the unit of the reading.
 * @example resolutionUncertainty(0.1, { counts: 0, resolutionWatts: 0.1 }) // 0.0288…
 */
export function resolutionUncertainty(
  step: number,
  accuracy: Pick<StatedAccuracy, 'counts' | 'resolutionWatts'>,
): number {
  const isHeld = accuracy.counts > 0 && step <= accuracy.resolutionWatts * (1 + 1e-9);
  return isHeld ? 0 : step / Math.sqrt(12);
}
