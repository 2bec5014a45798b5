import { CompensatedSum } from '../statistics/compensated-sum';
import { mean } from '../statistics/mean';
import { medianStepSeconds } from '../traces/step';
import { countStretch, type CountedSteps } from '../traces/steps';
import type { Trace } from '../traces/trace';
import { averageIntoBlocks, type Blocks } from './blocks';
import { changePoints } from './change-points';
import { exactEdges } from './exact-edges';
import { joinClose, type Segment } from './join-close';
import { noiseOf } from './noise';
import { traceStepWatts } from './trace-step-watts';

/** A time span, seconds of the trace. */
export interface Span {
  fromSeconds: number;
  toSeconds: number;
}

/** A part of a trace, ready to be divided into steady levels. */
export interface SteadyPart {
  steps: CountedSteps;
  blocks: Blocks;
  isSamples: boolean;
  step: number;
  /** 3 σ² ln n of its blocks. */
  penalty: number;
}

const LEAST_BLOCKS = 3;

/** @returns null where no time counts. */
export function steadyPart(trace: Trace, { fromSeconds, toSeconds }: Span): SteadyPart | null {
  const steps = countStretch(trace, fromSeconds, toSeconds);
  const blocks = steps && averageIntoBlocks(steps, trace.kind, medianStepSeconds(trace));
  if (!steps || !blocks) return null;
  const step = traceStepWatts(trace);
  const penalty = 3 * noiseOf(blocks.means, step) ** 2 * Math.log(blocks.means.length);
  return { steps, blocks, isSamples: trace.kind === 'samples', step, penalty };
}

/**
 * The steady levels of a part, by reading: the segments of blocks with the least squares about their means, a penalty a
 * change, their edges moved to the exact reading, neighbours too close joined. A block that a change falls into has a
 * level of its own that nobody read: what was made of it joins its neighbour once the edges are exact.
 *
 * @param factor by which the part's own penalty is multiplied.
 */
export function levelsOf({ steps, blocks, step, penalty }: SteadyPart, factor: number): Segment[] {
  const { means, blockSeconds, time, energy } = blocks;
  const starts = [0, ...changePoints(means, penalty * factor, LEAST_BLOCKS)];
  const inBlocks = starts.map((first, i) => {
    const end = starts[i + 1] ?? means.length;
    const sum = means.subarray(first, end).reduce((total, watts) => total + watts, 0);
    return { first, end, meanWatts: sum / (end - first), weight: end - first };
  });
  const joined = joinClose(inBlocks, step);
  const edges = [0, ...exactEdges({ watts: steps.watts, time }, blockSeconds, joined), steps.watts.length];
  const exact = joined.flatMap((_, i) => {
    const [first, end] = [edges[i] as number, edges[i + 1] as number];
    const weight = (time[end] as number) - (time[first] as number);
    return weight > 0
      ? [{ first, end, weight, meanWatts: ((energy[end] as number) - (energy[first] as number)) / weight }]
      : [];
  });
  return joinClose(exact, step);
}

/**
 * Where levels lie in the trace. Between two samples of different levels the power went from one to the other: that step
 * belongs to neither.
 */
export function spansOf(
  { steps, isSamples }: SteadyPart,
  levels: readonly Segment[],
): (Span & { meanWatts: number })[] {
  return levels.map(({ first, end, meanWatts }) => ({
    fromSeconds: steps.starts[first] as number,
    toSeconds: (steps.starts[end - 1] as number) + (isSamples ? 0 : (steps.seconds[end - 1] as number)),
    meanWatts,
  }));
}

/** Squares (W² s) of the blocks about the levels and about the part's own mean: what is left, and what there was. */
export function squaresOf({ blocks }: SteadyPart, levels: readonly Segment[]): { left: number; total: number } {
  const { means, blockSeconds, time } = blocks;
  const whole = mean(means);
  const [left, total] = [new CompensatedSum(), new CompensatedSum()];
  let at = 0;
  means.forEach((watts, block) => {
    const middle = (block + 0.5) * blockSeconds;
    while (at + 1 < levels.length && (time[(levels[at] as Segment).end] as number) <= middle) at += 1;
    left.add(blockSeconds * (watts - (levels[at] as Segment).meanWatts) ** 2);
    total.add(blockSeconds * (watts - whole) ** 2);
  });
  return { left: left.value, total: total.value };
}
