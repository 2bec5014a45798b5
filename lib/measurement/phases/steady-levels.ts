import { medianStepSeconds } from '../traces/step';
import { countStretch, type CountedSteps } from '../traces/steps';
import type { Trace } from '../traces/trace';
import { averageIntoBlocks, type Blocks } from './blocks';
import { changePoints, segmentCost } from './change-points';
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
 * The segments of blocks with the least squares about their means, a penalty a change; neighbours too close are joined.
 *
 * @param factor by which the part's own penalty is multiplied.
 */
export function segmentsOf({ blocks, step, penalty }: SteadyPart, factor: number): Segment[] {
  const starts = [0, ...changePoints(blocks.means, penalty * factor, LEAST_BLOCKS)];
  const segments = starts.map((first, i) => {
    const end = starts[i + 1] ?? blocks.means.length;
    const sum = blocks.means.subarray(first, end).reduce((total, watts) => total + watts, 0);
    return { first, end, meanWatts: sum / (end - first) };
  });
  return joinClose(segments, step);
}

/**
 * Where the segments lie in the trace, to the reading. Between two samples of different levels the power went from one
 * to the other: that step belongs to neither.
 */
export function spansOf(
  { steps, blocks, isSamples }: SteadyPart,
  segments: readonly Segment[],
): (Span & { meanWatts: number })[] {
  const n = steps.starts.length;
  const edges = [0, ...exactEdges(steps, blocks, segments), n];
  return segments.map(({ meanWatts }, i) => {
    const first = edges[i] as number;
    const last = (edges[i + 1] as number) - 1;
    const end = (steps.starts[last] as number) + (isSamples ? 0 : (steps.seconds[last] as number));
    return { fromSeconds: steps.starts[first] as number, toSeconds: end, meanWatts };
  });
}

/** Squares about the segments' means and about the part's own, both over time: what is left, and what there was. */
export function squaresOf({ blocks }: SteadyPart, segments: readonly Segment[]): { left: number; total: number } {
  const cost = segmentCost(blocks.means);
  const left = segments.reduce((sum, { first, end }) => sum + cost(first, end), 0);
  return { left: left * blocks.blockSeconds, total: cost(0, blocks.means.length) * blocks.blockSeconds };
}
