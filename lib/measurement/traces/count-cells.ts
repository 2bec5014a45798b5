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
  const [starts, seconds, joules] = [new Float64Array(n), new Float64Array(n), new Float64Array(n)];
  const watts = kind === 'counter' ? new Float64Array(n) : values.subarray(first, first + n);
  const weights = kind === 'counter' ? new Float64Array(n) : seconds;
  const gaps: CountedSteps['gaps'] = [];
  const breaks: number[] = [];
  const clip = (time: number) => Math.min(reach.toSeconds, Math.max(reach.fromSeconds, time));
  for (let j = 0; j < n; j += 1) {
    const i = first + j;
    const at = times[i] as number;
    const neighbour = times[isForward ? i + 1 : i - 1] ?? (isForward ? at + own : at - own);
    const isGap = Math.abs(at - neighbour) > limit;
    const edge = isGap ? at + Math.sign(neighbour - at) * own : neighbour;
    const [from, to] = [clip(Math.min(at, edge)), clip(Math.max(at, edge))];
    if (isGap) {
      const [fromSeconds, toSeconds] = [clip(Math.min(edge, neighbour)), clip(Math.max(edge, neighbour))];
      if (toSeconds > fromSeconds) gaps.push({ fromSeconds, toSeconds });
      breaks.push(isForward ? j + 1 : j);
    }
    starts[j] = from;
    seconds[j] = to - from;
    if (kind === 'counter') {
      const rise = (values[i] as number) - (values[i - 1] as number);
      watts[j] = (rise * 3600) / (at - neighbour);
      if (at - neighbour <= LONGEST_COUNTER_STEP * own || rise <= 1.5 * trace.step) weights[j] = to - from;
      else {
        gaps.push({ fromSeconds: from, toSeconds: to });
        breaks.push(j, j + 1);
      }
    }
    joules[j] = (watts[j] as number) * (to - from);
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
