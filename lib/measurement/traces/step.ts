import { quantileType7 } from '../statistics/quantile-type-7';
import type { Trace } from './trace';

const known = new WeakMap<Trace, number>();

/**
 * dt: the median of the intervals between readings, in seconds.
 *
 * @param trace n ≥ 2 readings, strictly rising in time.
 * @example medianStepSeconds(trace at 0, 10, 20, 80 s) // 10
 */
export function medianStepSeconds(trace: Trace): number {
  const before = known.get(trace);
  if (before !== undefined) return before;
  const times = trace.timeSeconds;
  const steps = new Float64Array(times.length - 1);
  for (let i = 1; i < times.length; i += 1) steps[i - 1] = (times[i] as number) - (times[i - 1] as number);
  const dt = quantileType7(steps.sort(), 0.5);
  known.set(trace, dt);
  return dt;
}

/**
 * A step longer than this is a gap: neither its time nor its energy counts. A silence of a logger that writes changes
 * only is no gap, and a counter has none in its energy.
 *
 * @returns seconds: max(10 dt, 60 s) for samples, 2.5 dt for averages, otherwise Infinity.
 * @example gapLimitSeconds(samples at 1 s) // 60
 */
export function gapLimitSeconds(trace: Trace): number {
  const dt = medianStepSeconds(trace);
  switch (trace.kind) {
    case 'samples':
      return Math.max(10 * dt, 60);
    case 'averages':
      return 2.5 * dt;
    case 'changes':
    case 'counter':
      return Infinity;
  }
}

/** Over which interval a reading averages (s); 0 for what is read in an instant. */
export function averagingOf(trace: Trace): number {
  if (trace.kind === 'averages') return trace.averagingSeconds ?? medianStepSeconds(trace);
  return trace.kind === 'counter' ? medianStepSeconds(trace) : 0;
}
