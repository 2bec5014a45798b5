import { countStretch, type CountedSteps } from './steps';
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
  const level: TraceLevel = { from: [], minimum: [], maximum: [], mean: [] };
  const steps = countStretch(trace, fromSeconds, toSeconds);
  if (steps === null) return level;
  const { first, end } = steps.readings;
  const count = Math.min(blocks, end - first);
  for (let block = 0; block < count; block += 1) {
    const start = first + Math.floor((block * (end - first)) / count);
    const stop = first + Math.floor(((block + 1) * (end - first)) / count);
    addBlock(level, steps, start, stop);
  }
  return level;
}

function addBlock(level: TraceLevel, { starts, watts, weights }: CountedSteps, start: number, stop: number) {
  let minimum = Infinity;
  let maximum = -Infinity;
  let time = 0;
  let energy = 0;
  let plain = 0;
  for (let i = start; i < stop; i += 1) {
    const value = watts[i] as number;
    minimum = Math.min(minimum, value);
    maximum = Math.max(maximum, value);
    time += weights[i] as number;
    energy += value * (weights[i] as number);
    plain += value;
  }
  level.from.push(starts[start] as number);
  level.minimum.push(minimum);
  level.maximum.push(maximum);
  // A block that no time counts in, a lone sample before a gap, still has what was read.
  level.mean.push(time > 0 ? energy / time : plain / (stop - start));
}

/** Coarse levels of a whole trace, for a first drawing without its readings. */
export function traceLevels(trace: Trace): TraceLevel[] {
  const start = trace.timeSeconds[0] as number;
  const stop = trace.timeSeconds[trace.timeSeconds.length - 1] as number;
  const sizes = [200, 1600].filter((size, i) => i === 0 || trace.timeSeconds.length > 200);
  return sizes.map((size) => traceWindow(trace, start, stop, size));
}
