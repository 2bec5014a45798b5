import { gapLimitSeconds, medianStepSeconds } from './step';
import type { Trace } from './trace';

/** What a stretch of a trace is summed over: one entry a reading. */
export interface CountedSteps {
  /** W (or VA) that reading i stands for. */
  watts: Float64Array;
  /** Seconds that reading i's energy counts over. */
  seconds: Float64Array;
  /** J of those seconds. */
  joules: Float64Array;
  /** Seconds that reading i weighs in a percentile: half of each counted neighbouring step for samples. */
  weights: Float64Array;
  gaps: { fromSeconds: number; toSeconds: number }[];
}

/** The readings of a trace with from ≤ time ≤ to, as a half-open range of indices. */
export function indexRange(trace: Trace, fromSeconds: number, toSeconds: number): { first: number; end: number } {
  return { first: lowerBound(trace.timeSeconds, fromSeconds), end: upperBound(trace.timeSeconds, toSeconds) };
}

/**
 * What counts between two readings, by the trace's kind: the trapezoid of samples, value times interval of averages,
 * a held value of changes, the difference of a counter. Steps across a gap count nothing; of an average that follows a
 * gap its own averaging time counts.
 *
 * @param first, end a range of indices with at least one reading.
 */
export function countSteps(trace: Trace, first: number, end: number): CountedSteps {
  const n = end - first;
  const out: CountedSteps = {
    watts: new Float64Array(n),
    seconds: new Float64Array(n),
    joules: new Float64Array(n),
    weights: new Float64Array(n),
    gaps: [],
  };
  if (trace.kind === 'averages') countAverages(trace, first, n, out);
  else countBetween(trace, first, n, out);
  return out;
}

function countAverages(trace: Trace, first: number, n: number, out: CountedSteps): void {
  const { timeSeconds: times, values, stamp } = trace;
  const own = trace.averagingSeconds ?? medianStepSeconds(trace);
  const limit = gapLimitSeconds(trace);
  for (let i = 0; i < n; i += 1) {
    const at = first + i;
    const neighbour = stamp === 'end' ? at - 1 : at + 1;
    const inside = neighbour >= first && neighbour < first + n;
    const step = inside ? Math.abs((times[at] as number) - (times[neighbour] as number)) : own;
    const seconds = step > limit ? own : step;
    if (step > limit) {
      const edge = Math.min(at, neighbour);
      out.gaps.push({ fromSeconds: times[edge] as number, toSeconds: times[edge + 1] as number });
    }
    out.watts[i] = values[at] as number;
    out.seconds[i] = seconds;
    out.joules[i] = (values[at] as number) * seconds;
    out.weights[i] = seconds;
  }
}

function countBetween(trace: Trace, first: number, n: number, out: CountedSteps): void {
  const { timeSeconds: times, values, kind } = trace;
  const limit = gapLimitSeconds(trace);
  for (let i = 0; i < n; i += 1) out.watts[i] = kind === 'counter' ? 0 : (values[first + i] as number);
  for (let i = 1; i < n; i += 1) {
    const at = first + i;
    const step = (times[at] as number) - (times[at - 1] as number);
    if (step > limit) {
      out.gaps.push({ fromSeconds: times[at - 1] as number, toSeconds: times[at] as number });
      continue;
    }
    out.seconds[i] = step;
    if (kind === 'samples') {
      out.joules[i] = (((values[at - 1] as number) + (values[at] as number)) / 2) * step;
      out.weights[i - 1] = (out.weights[i - 1] as number) + step / 2;
      out.weights[i] = step / 2;
    } else if (kind === 'changes') {
      out.joules[i] = (values[at - 1] as number) * step;
      out.weights[i - 1] = step;
    } else {
      out.joules[i] = ((values[at] as number) - (values[at - 1] as number)) * 3600;
      out.watts[i] = (out.joules[i] as number) / step;
      out.weights[i] = step;
    }
  }
  // The first reading of a counter only opens its first interval: it has no power of its own.
  if (kind === 'counter' && n > 1) out.watts[0] = out.watts[1] as number;
}

function lowerBound(sorted: Float64Array, value: number): number {
  let low = 0;
  let high = sorted.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((sorted[middle] as number) < value) low = middle + 1;
    else high = middle;
  }
  return low;
}

function upperBound(sorted: Float64Array, value: number): number {
  let low = 0;
  let high = sorted.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((sorted[middle] as number) <= value) low = middle + 1;
    else high = middle;
  }
  return low;
}
