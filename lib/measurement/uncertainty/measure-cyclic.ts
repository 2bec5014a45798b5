import { findCycles, type Cycle, type CycleFinding } from '../phases/cycles';
import { standardDeviation } from '../statistics/standard-deviation';
import { stretchFigures } from '../traces/figures';
import { combineParts, scaleParts } from './combine';
import { driftUncertainty } from './drift';
import { stepWatts, type TraceStretch } from './measure-mean';
import { cyclicRepeatability } from './repeatability';
import { instrumentUncertainty, resolutionUncertainty } from './stated-accuracy';
import type { MeasuredFigure, StatedAccuracy, UncertaintyParts } from './types';

/** What a stretch of a thermostat yields, or why it yields no energy of a day. */
export type CyclicMeasurement =
  | {
      accepted: true;
      finding: Extract<CycleFinding, { accepted: true }>;
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
      resolution: resolutionUncertainty(stepWatts(trace, accuracy), accuracy.counts),
      repeatability,
      drift: driftUncertainty(value, seconds),
      belowLimit: 0,
    };
    return {
      quantity: 'mean-power',
      powerKind: trace.powerKind === 'real' && accuracy.readsTruePower ? 'real' : 'apparent',
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
  if (finding.between.meanWatts < limit) {
    mean.parts.belowLimit = ((1 - finding.dutyCycle) * limit) / Math.sqrt(3);
    mean.standardUncertainty = combineParts(mean.parts);
  }
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
