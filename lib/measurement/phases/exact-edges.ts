import { firstAtLeast } from '../traces/search-sorted';
import type { Segment } from './join-close';

/** A change in blocks lies within one block of the true one; twice that is looked through. */
const BLOCKS_AROUND = 2;

/** The readings behind a series of blocks. */
export interface Readings {
  watts: Float64Array;
  /** How long the readings before each stand in the series (s): one more than there are readings. */
  time: Float64Array;
}

/**
 * Moves the edges between segments of blocks to the exact reading: the place about the edge where the squares about the
 * two means are least.
 *
 * @param segments seamless, from the first block to the last.
 * @returns for each segment but the first the reading that it begins with, rising.
 */
export function exactEdges({ watts, time }: Readings, blockSeconds: number, segments: readonly Segment[]): number[] {
  const edges: number[] = [];
  // A millionth of a block: sums of lengths carry rounding.
  const slack = blockSeconds * 1e-6;
  for (let s = 1; s < segments.length; s += 1) {
    const { meanWatts: left } = segments[s - 1] as Segment;
    const { meanWatts: right, first } = segments[s] as Segment;
    const start = firstAtLeast(time, (first - BLOCKS_AROUND) * blockSeconds - slack);
    const end = firstAtLeast(time, (first + BLOCKS_AROUND) * blockSeconds - slack);
    let balance = 0;
    let least = 0;
    let edge = start;
    for (let i = start; i < Math.min(end, watts.length); i += 1) {
      const value = watts[i] as number;
      const seconds = (time[i + 1] as number) - (time[i] as number);
      balance += seconds * ((value - left) ** 2 - (value - right) ** 2);
      if (balance < least) {
        least = balance;
        edge = i + 1;
      }
    }
    edges.push(Math.max(edge, (edges[edges.length - 1] ?? 0) + 1));
  }
  return edges;
}
