import type { CountedSteps } from '../traces/steps';
import type { Blocks } from './blocks';
import type { Segment } from './join-close';

/** A change in blocks lies within one block of the true one; twice that is looked through. */
const BLOCKS_AROUND = 2;

/**
 * Moves the edges between segments of blocks to the exact reading: the place about the edge where the squares about the
 * two means are least.
 *
 * @param segments seamless, from the first block to the last.
 * @returns for each segment but the first the entry of the steps that it begins with, rising.
 */
export function exactEdges(steps: CountedSteps, blocks: Blocks, segments: readonly Segment[]): number[] {
  const { blockSeconds, entrySeconds } = blocks;
  const { watts } = steps;
  const edges: number[] = [];
  let entry = 0;
  let reached = 0;
  for (let s = 1; s < segments.length; s += 1) {
    const { meanWatts: left } = segments[s - 1] as Segment;
    const { meanWatts: right, first } = segments[s] as Segment;
    const from = (first - BLOCKS_AROUND) * blockSeconds;
    const to = (first + BLOCKS_AROUND) * blockSeconds;
    // Half a millionth of a block: sums of lengths carry rounding.
    const slack = blockSeconds * 5e-7;
    while (entry < watts.length && reached < from - slack) {
      reached += entrySeconds[entry] as number;
      entry += 1;
    }
    let balance = 0;
    let least = 0;
    let edge = entry;
    let at = reached;
    for (let i = entry; i < watts.length && at < to - slack; i += 1) {
      const value = watts[i] as number;
      const seconds = entrySeconds[i] as number;
      balance += seconds * ((value - left) ** 2 - (value - right) ** 2);
      at += seconds;
      if (balance < least) {
        least = balance;
        edge = i + 1;
      }
    }
    edges.push(Math.max(edge, (edges[edges.length - 1] ?? 0) + 1));
  }
  return edges;
}
