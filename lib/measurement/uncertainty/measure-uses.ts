import { compensatedSum } from '../statistics/compensated-sum';
import { standardDeviation } from '../statistics/standard-deviation';
import { studentTQuantile } from '../statistics/student-t';
import { stretchFigures } from '../traces/figures';
import { combineParts } from './combine';
import { stepWatts, type TraceStretch } from './measure-mean';
import { instrumentUncertainty } from './stated-accuracy';
import type { MeasuredFigure, StatedAccuracy, UncertaintyParts } from './types';

/** Half the width that 95 % of a normal distribution has in standard deviations: turns t into a standard uncertainty. */
const NORMAL_95 = 1.959963984540054;

/**
 * The energy of a use, over the whole of each use, with its uncertainty. Several uses give the repeatability
 * t · s/√n; of a single one nothing is known, and the drift of the recording stands in.
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
  const ofMean = instrumentUncertainty(accuracy, value / hours);
  const parts: UncertaintyParts = {
    gain: ofMean.gain * hours,
    offset: ofMean.offset * hours,
    resolution: energyResolution(first, accuracy, hours),
    repeatability:
      n < 2 ? 0 : ((studentTQuantile(0.975, n - 1) / NORMAL_95) * standardDeviation(energies)) / Math.sqrt(n),
    drift: n < 2 ? 0.02 * value : 0,
    belowLimit: 0,
  };
  return {
    quantity: 'use-energy',
    powerKind: first.trace.powerKind === 'real' && accuracy.readsTruePower ? 'real' : 'apparent',
    value,
    standardUncertainty: combineParts(parts),
    parts,
    censoredAt: null,
    averagingSeconds: seconds / n,
    coverage: Math.min(...uses.map((figures) => figures.coverage)),
    countedSeconds: seconds,
  };
}

/** A counter is read twice, so its step counts twice: q/√6. Power keeps its step through the whole use. */
function energyResolution({ trace }: TraceStretch, accuracy: StatedAccuracy, hours: number): number {
  if (trace.kind === 'counter') return trace.step / Math.sqrt(6);
  return accuracy.counts > 0 ? 0 : (stepWatts(trace, accuracy) / Math.sqrt(12)) * hours;
}
