import type { Reach } from './count-samples';
import { firstAbove, firstAtLeast } from './search-sorted';
import { gapLimitSeconds, medianStepSeconds } from './step';
import type { CountedSteps } from './steps';
import type { Trace } from './trace';

/** A counter's interval longer than this many dt hides how the power went within it. */
const LONGEST_COUNTER_STEP = 2.5;

/**
 * The intervals over which averages, held values and a counter's differences stand. Of an average beside a gap its own
 * last (or first) dt counts. A counter misses no energy, but over a long silence its power is known only where the
 * counter rose by no more than one step: there was nothing to hide.
 */
export function countCells(trace: Trace, reach: Reach): CountedSteps {
  const { timeSeconds: times, values, kind, stamp } = trace;
  const isForward = kind === 'changes' || (kind === 'averages' && stamp === 'start');
  const own = medianStepSeconds(trace);
  const limit = gapLimitSeconds(trace);
  const { first, end } = cellsWithin(trace, reach, isForward);
  const n = Math.max(0, end - first);
  const starts = new Float64Array(n);
  const seconds = new Float64Array(n);
  const joules = new Float64Array(n);
  const watts = kind === 'counter' ? new Float64Array(n) : values.subarray(first, first + n);
  const weights = kind === 'counter' ? new Float64Array(n) : seconds;
  const gaps: CountedSteps['gaps'] = [];
  const breaks: number[] = [];
  const clip = (time: number) => Math.min(reach.toSeconds, Math.max(reach.fromSeconds, time));
  for (let j = 0; j < n; j += 1) {
    const i = first + j;
    let from = isForward ? (times[i] as number) : (times[i - 1] ?? (times[i] as number) - own);
    let to = isForward ? (times[i + 1] ?? (times[i] as number) + own) : (times[i] as number);
    if (to - from > limit) {
      const gap = isForward ? [from + own, to] : [from, to - own];
      const [fromSeconds, toSeconds] = [clip(gap[0] as number), clip(gap[1] as number)];
      if (toSeconds > fromSeconds) gaps.push({ fromSeconds, toSeconds });
      breaks.push(isForward ? j + 1 : j);
      if (isForward) to = from + own;
      else from = to - own;
    }
    starts[j] = clip(from);
    seconds[j] = clip(to) - clip(from);
    if (kind === 'counter') {
      const rise = (values[i] as number) - (values[i - 1] as number);
      watts[j] = (rise * 3600) / (to - from);
      const isKnown = to - from <= LONGEST_COUNTER_STEP * own || rise <= 1.5 * trace.step;
      if (isKnown) weights[j] = seconds[j] as number;
      else {
        gaps.push({ fromSeconds: clip(from), toSeconds: clip(to) });
        breaks.push(j, j + 1);
      }
    }
    joules[j] = (watts[j] as number) * (seconds[j] as number);
  }
  return { starts, watts, seconds, joules, weights, readings: { first: 0, end: n }, gaps, breaks, ...reach };
}

/** The cells that a stretch touches. A change holds forward, so the last has none; a counter's first reading opens one. */
function cellsWithin(trace: Trace, { fromSeconds, toSeconds }: Reach, isForward: boolean) {
  const { timeSeconds: times, kind } = trace;
  if (isForward) {
    const last = kind === 'changes' ? times.length - 1 : times.length;
    return {
      first: Math.max(0, firstAbove(times, fromSeconds) - 1),
      end: Math.min(last, firstAtLeast(times, toSeconds)),
    };
  }
  return {
    first: Math.max(kind === 'counter' ? 1 : 0, firstAbove(times, fromSeconds)),
    end: Math.min(times.length, firstAtLeast(times, toSeconds) + 1),
  };
}
