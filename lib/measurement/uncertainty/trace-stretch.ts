import type { PowerKind } from '../units/quantity';
import { averagingOf } from '../traces/step';
import type { Trace } from '../traces/trace';
import { traceStepWatts } from '../phases/trace-step-watts';
import { resolutionUncertainty } from './stated-accuracy';
import type { StatedAccuracy } from './types';

/** A stretch of a trace. */
export interface TraceStretch {
  trace: Trace;
  fromSeconds: number;
  toSeconds: number;
}

/** Volts times amperes are apparent power, and so is what an instrument reads that does not read true power. */
export function powerKindOf(trace: Trace, accuracy: Pick<StatedAccuracy, 'readsTruePower'>): PowerKind {
  return trace.powerKind === 'real' && accuracy.readsTruePower ? 'real' : 'apparent';
}

/**
 * The standard uncertainty (W) that the steps of a trace leave in a mean power over so many seconds: q/√12, not averaged
 * away; of a counter, which is read at both ends, q/√6 over the time.
 *
 * Source: JCGM 100:2008 (GUM), F.2.2.1; the difference of two readings has √2 of it.
 * @param readings of how many stretches the time consists: each has two ends of its own.
 * @example meanResolution(counter of 1 Wh, accuracy, 3600, 1) // 0.408…
 */
export function meanResolution(trace: Trace, accuracy: StatedAccuracy, seconds: number, readings: number): number {
  if (trace.kind === 'counter') return (counterStepUncertainty(trace.step) * Math.sqrt(readings) * 3600) / seconds;
  const own = traceStepWatts(trace);
  // What was averaged over many display steps has a finer step of its own; a logger's averages keep the display's.
  const step = averagingOf(trace) > 0 ? own : Math.max(own, accuracy.resolutionWatts);
  return resolutionUncertainty(step, accuracy);
}

/**
 * The standard uncertainty of an energy by a counter that steps by q: read twice, q/√6.
 *
 * @example counterStepUncertainty(1) // 0.408…
 */
export function counterStepUncertainty(step: number): number {
  return step / Math.sqrt(6);
}
