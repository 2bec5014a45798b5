import { medianStepSeconds } from '../traces/step';
import type { Trace } from '../traces/trace';

/**
 * The logger's step q as a step of power (W): of a counter its step of energy over one interval.
 *
 * @example traceStepWatts(counter of 1 Wh every 60 s) // 60
 */
export function traceStepWatts(trace: Trace): number {
  return trace.kind === 'counter' ? (trace.step * 3600) / medianStepSeconds(trace) : trace.step;
}
