import { findCycles, type AcceptedCycles } from '../phases/cycles';
import type { Cycle } from '../phases/whole-cycles';
import { standardDeviation } from '../statistics/standard-deviation';
import { stretchFigures } from '../traces/figures';
import { combineParts, scaleParts } from './combine';
import { driftUncertainty } from './drift';
import { belowLimitUncertainty, shareBelowLimit } from './below-limit';
import { cyclicRepeatability } from './repeatability';
import { instrumentUncertainty } from './stated-accuracy';
import { meanResolution, powerKindOf, type TraceStretch } from './trace-stretch';
import type { MeasuredFigure, StatedAccuracy, UncertaintyParts } from './types';

/** What a stretch of a thermostat yields, or why it yields no energy of a day. */
export type CyclicMeasurement =
  | {
      accepted: true;
      finding: AcceptedCycles;
      dayEnergy: MeasuredFigure;
      running: MeasuredFigure;
      between: MeasuredFigure;
    }
  | { accepted: false; reason: string };

const HOURS_A_DAY = 24;

/**
 * The energy of a day from whole cycles, and the mean power of their two parts, each with its uncertainty.
 *
 * @param stretch one stretch that cycles.
 * @example measureCyclic(two days of a freezer, accuracy).accepted // true
 */
export function measureCyclic(stretch: TraceStretch, accuracy: StatedAccuracy): CyclicMeasurement {
  const { trace, fromSeconds, toSeconds } = stretch;
  const finding = findCycles(trace, fromSeconds, toSeconds);
  if (!finding.accepted) return finding;
  const coverage = stretchFigures(trace, fromSeconds, toSeconds)?.coverage ?? null;
  const limit = accuracy.lowerLimitWatts ?? 0;
  const figure = (value: number, seconds: number, repeatability: number): MeasuredFigure => {
    const parts: UncertaintyParts = {
      ...instrumentUncertainty(accuracy, value),
      resolution: meanResolution(trace, accuracy, seconds, 1),
      repeatability,
      drift: driftUncertainty(value, seconds),
      belowLimit: 0,
    };
    return {
      quantity: 'mean-power',
      powerKind: powerKindOf(trace, accuracy),
      value,
      standardUncertainty: combineParts(parts),
      parts,
      censoredAt: limit > 0 && Math.abs(value) < limit ? limit : null,
      averagingSeconds: seconds,
      coverage,
      countedSeconds: seconds,
    };
  };
  const covered = finding.running.seconds + finding.between.seconds;
  const mean = figure(finding.meanWatts, covered, cyclicRepeatability(finding.cycles));
  // Between cycles a plug-in meter often reads nothing: what it can't see may be there all the same.
  mean.parts.belowLimit = belowLimitUncertainty(shareBelowLimit([stretch], limit), limit);
  mean.standardUncertainty = combineParts(mean.parts);
  return {
    accepted: true,
    finding,
    dayEnergy: overADay(mean),
    running: figure(finding.running.meanWatts, finding.running.seconds, partRepeatability(finding.cycles, 'on')),
    between: figure(finding.between.meanWatts, finding.between.seconds, partRepeatability(finding.cycles, 'off')),
  };
}

function overADay(mean: MeasuredFigure): MeasuredFigure {
  return {
    ...mean,
    quantity: 'day-energy',
    value: mean.value * HOURS_A_DAY,
    standardUncertainty: mean.standardUncertainty * HOURS_A_DAY,
    parts: scaleParts(mean.parts, HOURS_A_DAY),
    censoredAt: null,
  };
}

/** The standard error of a part's mean power over the cycles: s/√n of what each cycle's part drew. */
function partRepeatability(cycles: readonly Cycle[], part: 'on' | 'off'): number {
  const watts = cycles.map(({ seconds, onSeconds, wattHours, onWattHours }) =>
    part === 'on' ? (onWattHours * 3600) / onSeconds : ((wattHours - onWattHours) * 3600) / (seconds - onSeconds),
  );
  return standardDeviation(watts) / Math.sqrt(watts.length);
}
