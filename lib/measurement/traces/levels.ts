import { countSteps, indexRange } from './steps';
import type { Trace } from './trace';

/** A stretch of a trace as drawn: its extremes are kept, never thinned away. Columns of one length. */
export interface TraceLevel {
  /** Seconds at which each block begins. */
  from: number[];
  minimum: number[];
  maximum: number[];
  mean: number[];
}

/**
 * Divides a window of a trace into at most so many blocks of equal readings, each with its minimum, maximum and
 * time-weighted mean.
 *
 * @param blocks at most this many, ≥ 1.
 * @example traceWindow(trace of 1,000,000 readings, from, to, 2000).from.length // 2000
 */
export function traceWindow(trace: Trace, fromSeconds: number, toSeconds: number, blocks: number): TraceLevel {
  const { first, end } = indexRange(trace, fromSeconds, toSeconds);
  const level: TraceLevel = { from: [], minimum: [], maximum: [], mean: [] };
  const n = end - first;
  if (n < 1) return level;
  const { watts, seconds, joules } = countSteps(trace, first, end);
  const count = Math.min(blocks, n);
  for (let block = 0; block < count; block += 1) {
    const start = Math.floor((block * n) / count);
    const stop = Math.floor(((block + 1) * n) / count);
    let minimum = Infinity;
    let maximum = -Infinity;
    let time = 0;
    let energy = 0;
    let plain = 0;
    for (let i = start; i < stop; i += 1) {
      const value = watts[i] as number;
      if (value < minimum) minimum = value;
      if (value > maximum) maximum = value;
      time += seconds[i] as number;
      energy += joules[i] as number;
      plain += value;
    }
    level.from.push(trace.timeSeconds[first + start] as number);
    level.minimum.push(minimum);
    level.maximum.push(maximum);
    level.mean.push(time > 0 ? energy / time : plain / (stop - start));
  }
  return level;
}

/** Coarse levels of a whole trace, for a first drawing without its readings. */
export function traceLevels(trace: Trace): TraceLevel[] {
  const start = trace.timeSeconds[0] as number;
  const stop = trace.timeSeconds[trace.timeSeconds.length - 1] as number;
  const sizes = [200, 1600].filter((size, i) => i === 0 || trace.timeSeconds.length > 200);
  return sizes.map((size) => traceWindow(trace, start, stop, size));
}
