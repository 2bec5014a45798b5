import { compensatedSum } from '../statistics/compensated-sum';
import { stretchFigures } from '../traces/figures';
import { belowLimitUncertainty, shareBelowLimit } from './below-limit';
import { combineParts } from './combine';
import { driftUncertainty } from './drift';
import { repeatedReadings } from './repeatability';
import { instrumentUncertainty } from './stated-accuracy';
import { meanResolution, powerKindOf, type TraceStretch } from './trace-stretch';
import type { MeasuredFigure, StatedAccuracy, UncertaintyParts } from './types';

/**
 * The energy of a use, over the whole of each use, with its uncertainty. Several uses give the repeatability
 * t · s/√n; of a single one nothing is known of how it repeats.
 *
 * Source: JCGM 100:2008 (GUM), 4.2 and G.3 (Student's t: 12.7, 4.3, 2.8 at n = 2, 3, 5).
 * @param stretches each one whole use, one or more.
 * @returns null where no time counts in one of them: a use that is not whole has no energy of a use.
 * @example measureUseEnergy([one programme of 620 Wh], accuracy)?.value // 620
 */
export function measureUseEnergy(stretches: readonly TraceStretch[], accuracy: StatedAccuracy): MeasuredFigure | null {
  const found = stretches.map(({ trace, fromSeconds, toSeconds }) => stretchFigures(trace, fromSeconds, toSeconds));
  const uses = found.filter((figures) => figures !== null);
  const [first] = stretches;
  if (!first || uses.length < stretches.length) return null;
  const energies = uses.map((figures) => figures.energyWattHours);
  const seconds = compensatedSum(uses.map((figures) => figures.countedSeconds));
  const n = energies.length;
  const value = compensatedSum(energies) / n;
  const hours = seconds / n / 3600;
  const limit = accuracy.lowerLimitWatts ?? 0;
  const ofMean = instrumentUncertainty(accuracy, value / hours);
  const parts: UncertaintyParts = {
    gain: ofMean.gain * hours,
    offset: ofMean.offset * hours,
    // Each use has its own ends, and a step through the whole of it.
    resolution: meanResolution(first.trace, accuracy, seconds / n, 1) * hours,
    repeatability: n < 2 ? 0 : repeatedReadings(energies),
    drift: driftUncertainty(value, seconds),
    belowLimit: belowLimitUncertainty(shareBelowLimit(stretches, limit), limit) * hours,
  };
  return {
    quantity: 'use-energy',
    powerKind: powerKindOf(first.trace, accuracy),
    value,
    standardUncertainty: combineParts(parts),
    parts,
    censoredAt: null,
    averagingSeconds: seconds / n,
    coverage: Math.min(...uses.map((figures) => figures.coverage)),
    countedSeconds: seconds,
  };
}
