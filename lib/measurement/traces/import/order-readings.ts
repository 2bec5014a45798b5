import { quantileType7 } from '../../statistics/quantile-type-7';
import { ZoneClock } from './zone';

export interface OrderedReadings {
  seconds: Float64Array;
  values: Float64Array;
  newestFirst: boolean;
  sortedRows: number;
  averagedDuplicates: number;
  /** Half-open ranges that a step back in time parts. */
  segments: { first: number; end: number }[];
}

/**
 * Brings readings into order: newest-first files are turned, local times become UTC (the hour that comes twice is told
 * by its order), single rows out of order are sorted in, a large step back parts the trace, and readings at one time
 * are averaged. No reading is changed otherwise.
 *
 * @param seconds, values columns of one length n ≥ 2, in the file's order.
 * @param zone for local times, or null where they are absolute or counted from a start.
 */
export function orderReadings(seconds: Float64Array, values: Float64Array, zone: string | null): OrderedReadings {
  const newestFirst = isNewestFirst(seconds);
  const times = newestFirst ? seconds.slice().reverse() : seconds.slice();
  const readings = newestFirst ? values.slice().reverse() : values;
  if (zone !== null) toUtc(times, new ZoneClock(zone));
  const limit = Math.max(10 * medianStep(times), 60);
  const segments = cutAtStepsBack(times, limit);
  let sortedRows = 0;
  let averagedDuplicates = 0;
  const outTimes = new Float64Array(times.length);
  const outValues = new Float64Array(times.length);
  let size = 0;
  const parts: { first: number; end: number }[] = [];
  for (const { first, end } of segments) {
    const start = size;
    const order = orderOf(times, first, end);
    sortedRows += order.moved;
    for (let i = first; i < end;) {
      const at = order.index(i);
      const time = times[at] as number;
      let sum = 0;
      let count = 0;
      while (i < end && (times[order.index(i)] as number) === time) {
        sum += readings[order.index(i)] as number;
        count += 1;
        i += 1;
      }
      averagedDuplicates += count - 1;
      outTimes[size] = time;
      outValues[size] = count === 1 ? sum : sum / count;
      size += 1;
    }
    parts.push({ first: start, end: size });
  }
  return {
    seconds: outTimes.subarray(0, size),
    values: outValues.subarray(0, size),
    newestFirst,
    sortedRows,
    averagedDuplicates,
    segments: parts,
  };
}

function isNewestFirst(seconds: Float64Array): boolean {
  let back = 0;
  let forth = 0;
  for (let i = 1; i < seconds.length; i += 1) {
    const step = (seconds[i] as number) - (seconds[i - 1] as number);
    if (step < 0) back += 1;
    else if (step > 0) forth += 1;
  }
  return back > forth;
}

/**
 * In place. In the hour that comes twice the earlier meaning counts until the clock has been set back, which shows as a
 * step back of most of an hour (a smaller one is a row out of order), or, in a log by the hour, as the same hour again.
 */
function toUtc(times: Float64Array, clock: ZoneClock): void {
  const byTheHour = medianStep(times) >= 1800;
  let before = -Infinity;
  for (let i = 0; i < times.length; i += 1) {
    const [early = 0, late = early] = clock.candidates(times[i] as number);
    const wasSetBack = early < before - 1800 || (byTheHour && early <= before);
    const time = wasSetBack && late >= before ? late : early;
    times[i] = time;
    before = Math.max(before, time);
  }
}

function medianStep(times: Float64Array): number {
  const steps = new Float64Array(Math.max(0, times.length - 1));
  let size = 0;
  for (let i = 1; i < times.length; i += 1) {
    const step = (times[i] as number) - (times[i - 1] as number);
    if (step > 0) {
      steps[size] = step;
      size += 1;
    }
  }
  return size === 0 ? 0 : quantileType7(steps.subarray(0, size).sort(), 0.5);
}

function cutAtStepsBack(times: Float64Array, limit: number): { first: number; end: number }[] {
  const cuts = [0];
  let latest = -Infinity;
  for (let i = 0; i < times.length; i += 1) {
    const time = times[i] as number;
    // One row far back is a stray; the trace parts only where the rows go on from there.
    if (latest - time > limit && i + 1 < times.length && latest - (times[i + 1] as number) > limit) {
      cuts.push(i);
      latest = time;
    }
    latest = Math.max(latest, time);
  }
  return cuts.map((first, i) => ({ first, end: cuts[i + 1] ?? times.length }));
}

/** The rising order of a range: as it stands where it is in order already, which is the ordinary case. */
function orderOf(times: Float64Array, first: number, end: number): { index: (i: number) => number; moved: number } {
  let moved = 0;
  for (let i = first + 1; i < end; i += 1) if ((times[i] as number) < (times[i - 1] as number)) moved += 1;
  if (moved === 0) return { index: (i) => i, moved };
  const order = Uint32Array.from({ length: end - first }, (_, i) => first + i);
  order.sort((a, b) => (times[a] as number) - (times[b] as number) || a - b);
  return { index: (i) => order[i - first] as number, moved };
}
