import { highestMean } from '../traces/highest-mean';
import { averagingOf, medianStepSeconds } from '../traces/step';
import { combineParts } from './combine';
import { instrumentUncertainty } from './stated-accuracy';
import { meanResolution, powerKindOf, type TraceStretch } from './trace-stretch';
import type { MeasuredFigure, StatedAccuracy, UncertaintyParts } from './types';

const WINDOW_SECONDS = 10;
/** A slower logger can't show a ten-second mean. */
const SLOWEST_STEP_SECONDS = 5;

/**
 * The highest ten-second mean of stretches, from loggers of five seconds or quicker: what a maker's maximum compares
 * with. A slower logger gives none: the highest of its own averages is no peak.
 *
 * @returns null where no trace is quick enough.
 * @example measureMaximum([a minute of 10 W at 1 s], accuracy)?.averagingSeconds // 10
 */
export function measureMaximum(stretches: readonly TraceStretch[], accuracy: StatedAccuracy): MeasuredFigure | null {
  let highest: { value: number; stretch: TraceStretch } | null = null;
  let seconds = 0;
  for (const stretch of stretches) {
    const { trace, fromSeconds, toSeconds } = stretch;
    if (Math.max(medianStepSeconds(trace), averagingOf(trace)) > SLOWEST_STEP_SECONDS) continue;
    const value = highestMean(trace, fromSeconds, toSeconds, WINDOW_SECONDS);
    if (value === null) continue;
    seconds += toSeconds - fromSeconds;
    if (highest === null || value > highest.value) highest = { value, stretch };
  }
  if (highest === null) return null;
  const { value, stretch } = highest;
  const parts: UncertaintyParts = {
    ...instrumentUncertainty(accuracy, value),
    resolution: meanResolution(stretch.trace, accuracy, WINDOW_SECONDS, 1),
    repeatability: 0,
    drift: 0,
    belowLimit: 0,
  };
  return {
    quantity: 'maximum-power',
    powerKind: powerKindOf(stretch.trace, accuracy),
    value,
    standardUncertainty: combineParts(parts),
    parts,
    censoredAt: null,
    averagingSeconds: WINDOW_SECONDS,
    coverage: null,
    countedSeconds: seconds,
  };
}
