import { compensatedSum } from '../statistics/compensated-sum';
import { stretchFigures } from '../traces/figures';
import { countStretch } from '../traces/steps';
import { belowLimitUncertainty, shareBelowLimit } from './below-limit';
import { combineParts } from './combine';
import { driftUncertainty } from './drift';
import { steadyRepeatability } from './repeatability';
import { instrumentUncertainty } from './stated-accuracy';
import { meanResolution, powerKindOf, type TraceStretch } from './trace-stretch';
import type { MeasuredFigure, StatedAccuracy, UncertaintyParts } from './types';

export type { TraceStretch } from './trace-stretch';

/**
 * The mean power over stretches of one mode: summed energy over summed time, with its uncertainty. Below the
 * instrument's lower limit it is censored: at most the limit, neither zero nor the limit itself.
 *
 * Source: JCGM 100:2008 (GUM), 4.3 and 5.1.
 * @param stretches one or more, of one kind of power and one instrument.
 * @returns null where no time counts in any of them.
 * @example measureMeanPower([a steady hour of 43 W], accuracy)?.value // 43
 */
export function measureMeanPower(stretches: readonly TraceStretch[], accuracy: StatedAccuracy): MeasuredFigure | null {
  const found = stretches.flatMap((stretch) => {
    const figures = stretchFigures(stretch.trace, stretch.fromSeconds, stretch.toSeconds);
    return figures ? [{ stretch, figures }] : [];
  });
  const [one] = found;
  if (!one) return null;
  const { trace } = one.stretch;
  const countedSeconds = compensatedSum(found.map(({ figures }) => figures.countedSeconds));
  const wattHours = compensatedSum(found.map(({ figures }) => figures.energyWattHours));
  const recordedSeconds = compensatedSum(found.map(({ figures }) => figures.countedSeconds / figures.coverage));
  const value = (wattHours * 3600) / countedSeconds;
  const limit = accuracy.lowerLimitWatts ?? 0;
  const { watts, weights } = concatenate(stretches);
  const parts: UncertaintyParts = {
    ...instrumentUncertainty(accuracy, value),
    resolution: meanResolution(trace, accuracy, countedSeconds, found.length),
    repeatability: steadyRepeatability(watts, weights),
    drift: driftUncertainty(value, countedSeconds),
    belowLimit: belowLimitUncertainty(shareBelowLimit(stretches, limit), limit),
  };
  return {
    quantity: 'mean-power',
    powerKind: powerKindOf(trace, accuracy),
    value,
    standardUncertainty: combineParts(parts),
    parts,
    censoredAt: limit > 0 && Math.abs(value) < limit ? limit : null,
    averagingSeconds: countedSeconds,
    coverage: Math.min(1, countedSeconds / recordedSeconds),
    countedSeconds,
  };
}

/** The readings of all stretches, one after the other, as far as time counts for them. */
function concatenate(stretches: readonly TraceStretch[]): { watts: Float64Array; weights: Float64Array } {
  const all = stretches.flatMap(({ trace, fromSeconds, toSeconds }) => {
    return countStretch(trace, fromSeconds, toSeconds) ?? [];
  });
  const [one] = all;
  if (one && all.length === 1) return one;
  const size = all.reduce((sum, steps) => sum + steps.watts.length, 0);
  const watts = new Float64Array(size);
  const weights = new Float64Array(size);
  let at = 0;
  for (const steps of all) {
    watts.set(steps.watts, at);
    weights.set(steps.weights, at);
    at += steps.watts.length;
  }
  return { watts, weights };
}
