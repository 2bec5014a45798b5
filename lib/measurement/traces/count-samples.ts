import { firstAbove, firstAtLeast } from './search-sorted';
import { gapLimitSeconds } from './step';
import type { CountedSteps } from './steps';
import type { Trace } from './trace';

/** A stretch inside a trace's reach. */
export interface Reach {
  fromSeconds: number;
  toSeconds: number;
}

/**
 * The trapezoids between instantaneous readings. An edge between two readings gets the value on the straight line
 * between them; an edge inside a gap gets none.
 *
 * Method: trapezoidal rule.
 */
export function countSamples(trace: Trace, reach: Reach): CountedSteps {
  const limit = gapLimitSeconds(trace);
  const { starts, watts, readings } = pointsOf(trace, reach, limit);
  const n = starts.length;
  const seconds = new Float64Array(n);
  const joules = new Float64Array(n);
  const weights = new Float64Array(n);
  const gaps: CountedSteps['gaps'] = [];
  const breaks: number[] = [];
  if (n > 0 && (starts[0] as number) > reach.fromSeconds) {
    gaps.push({ fromSeconds: reach.fromSeconds, toSeconds: starts[0] as number });
  }
  for (let i = 0; i + 1 < n; i += 1) {
    const step = (starts[i + 1] as number) - (starts[i] as number);
    if (step > limit) {
      gaps.push({ fromSeconds: starts[i] as number, toSeconds: starts[i + 1] as number });
      breaks.push(i + 1);
      continue;
    }
    seconds[i] = step;
    joules[i] = (((watts[i] as number) + (watts[i + 1] as number)) / 2) * step;
    weights[i] = (weights[i] as number) + step / 2;
    weights[i + 1] = step / 2;
  }
  if (n > 0 && (starts[n - 1] as number) < reach.toSeconds) {
    gaps.push({ fromSeconds: starts[n - 1] as number, toSeconds: reach.toSeconds });
  }
  return { starts, watts, seconds, joules, weights, readings, gaps, breaks, ...reach };
}

/** The readings inside, as views of the trace where no edge needs a value of its own. */
function pointsOf({ timeSeconds: times, values }: Trace, { fromSeconds, toSeconds }: Reach, limit: number) {
  const first = firstAtLeast(times, fromSeconds);
  const end = firstAbove(times, toSeconds);
  // The step that an edge falls into, by the reading at its end; 0 where the edge stands on a reading or in a gap.
  const into = (edge: number, next: number) => {
    const isBetween = next > 0 && next < times.length && times[next] !== edge && times[next - 1] !== edge;
    return isBetween && (times[next] as number) - (times[next - 1] as number) <= limit ? next : 0;
  };
  const before = into(fromSeconds, first);
  const after = into(toSeconds, end);
  const readings = { first: before > 0 ? 1 : 0, end: (before > 0 ? 1 : 0) + end - first };
  if (before === 0 && after === 0) {
    return { starts: times.subarray(first, end), watts: values.subarray(first, end), readings };
  }
  const at = (edge: number, next: number) => {
    const left = times[next - 1] as number;
    const share = (edge - left) / ((times[next] as number) - left);
    return (values[next - 1] as number) + share * ((values[next] as number) - (values[next - 1] as number));
  };
  const size = readings.end + (after > 0 ? 1 : 0);
  const starts = new Float64Array(size);
  const watts = new Float64Array(size);
  starts.set(times.subarray(first, end), readings.first);
  watts.set(values.subarray(first, end), readings.first);
  if (before > 0) {
    starts[0] = fromSeconds;
    watts[0] = at(fromSeconds, before);
  }
  if (after > 0) {
    starts[size - 1] = toSeconds;
    watts[size - 1] = at(toSeconds, after);
  }
  return { starts, watts, readings };
}
