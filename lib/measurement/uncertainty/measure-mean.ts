import { compensatedSum } from '../statistics/compensated-sum';
import { averagingOf, stretchFigures } from '../traces/figures';
import { medianStepSeconds } from '../traces/step';
import { countSteps, indexRange } from '../traces/steps';
import type { Trace } from '../traces/trace';
import { combineParts } from './combine';
import { driftUncertainty } from './drift';
import { steadyRepeatability } from './repeatability';
import { instrumentUncertainty, resolutionUncertainty } from './stated-accuracy';
import type { MeasuredFigure, StatedAccuracy, UncertaintyParts } from './types';

/** A stretch of a trace. */
export interface TraceStretch {
  trace: Trace;
  fromSeconds: number;
  toSeconds: number;
}

/**
 * The mean power over stretches of one mode: summed energy over summed time, with its uncertainty. Below the
 * instrument's lower limit it is censored: at most the limit, neither zero nor the limit itself.
 *
 * Source: JCGM 100:2008 (GUM), 4.3 and 5.1.
 * @param stretches one or more.
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
  const countedSeconds = compensatedSum(found.map(({ figures }) => figures.countedSeconds));
  const wattHours = compensatedSum(found.map(({ figures }) => figures.energyWattHours));
  const value = (wattHours * 3600) / countedSeconds;
  const parts: UncertaintyParts = {
    ...instrumentUncertainty(accuracy, value),
    resolution: resolutionUncertainty(stepWatts(one.stretch.trace, accuracy), accuracy.counts),
    repeatability: steadyRepeatability(concatenate(stretches)),
    drift: driftUncertainty(value, countedSeconds),
    belowLimit: 0,
  };
  const limit = accuracy.lowerLimitWatts ?? 0;
  parts.belowLimit = (shareBelow(stretches, limit) * limit) / Math.sqrt(3);
  const recorded = compensatedSum(found.map(({ figures }) => figures.countedSeconds / figures.coverage));
  return {
    quantity: 'mean-power',
    powerKind: one.stretch.trace.powerKind === 'real' && accuracy.readsTruePower ? 'real' : 'apparent',
    value,
    standardUncertainty: combineParts(parts),
    parts,
    censoredAt: limit > 0 && Math.abs(value) < limit ? limit : null,
    averagingSeconds: countedSeconds,
    coverage: Math.min(1, countedSeconds / recorded),
    countedSeconds,
  };
}

/** The step of a trace's power in W: its own or the instrument's, whichever is coarser. */
export function stepWatts(trace: Trace, accuracy: Pick<StatedAccuracy, 'resolutionWatts'>): number {
  const own = trace.kind === 'counter' ? (trace.step * 3600) / medianStepSeconds(trace) : trace.step;
  // What was averaged over many display steps has a finer step of its own; a logger's averages keep the display's.
  return averagingOf(trace) > 0 ? own : Math.max(own, accuracy.resolutionWatts);
}

function concatenate(stretches: readonly TraceStretch[]): Float64Array {
  const columns = stretches.map(({ trace, fromSeconds, toSeconds }) => {
    const { first, end } = indexRange(trace, fromSeconds, toSeconds);
    return countSteps(trace, first, end).watts;
  });
  const all = new Float64Array(columns.reduce((sum, column) => sum + column.length, 0));
  let at = 0;
  for (const column of columns) {
    all.set(column, at);
    at += column.length;
  }
  return all;
}

function shareBelow(stretches: readonly TraceStretch[], limit: number): number {
  if (limit === 0) return 0;
  let below = 0;
  let total = 0;
  for (const { trace, fromSeconds, toSeconds } of stretches) {
    const { first, end } = indexRange(trace, fromSeconds, toSeconds);
    const { watts, weights } = countSteps(trace, first, end);
    for (let i = 0; i < watts.length; i += 1) {
      total += weights[i] as number;
      if (Math.abs(watts[i] as number) < limit) below += weights[i] as number;
    }
  }
  return total > 0 ? below / total : 0;
}
