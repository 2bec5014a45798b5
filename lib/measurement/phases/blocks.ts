import type { CountedSteps } from '../traces/steps';
import type { TraceKind } from '../traces/trace';

/** The least time in which phases are looked for is three blocks of so many. */
export const MOST_BLOCKS = 4096;

/** A series averaged into equal blocks of counted time: gaps have no length in it. */
export interface Blocks {
  /** W, one a block. */
  means: Float64Array;
  blockSeconds: number;
  /** How long each entry of the steps stands in the series (s). */
  entrySeconds: Float64Array;
}

/**
 * Averages what counts of a stretch into equal blocks: as many as there are readings' lengths, 4,096 at most. An evenly
 * sampled series that is short enough is its own blocks.
 *
 * @param dt the median interval (s).
 * @returns null where no time counts.
 * @example averageIntoBlocks(steps of 470 even samples, 'samples', 1)?.means.length // 470
 */
export function averageIntoBlocks(steps: CountedSteps, kind: TraceKind, dt: number): Blocks | null {
  const entrySeconds = kind === 'samples' ? lengthsOf(steps) : steps.weights;
  const total = entrySeconds.reduce((sum, seconds) => sum + seconds, 0);
  if (!(total > 0)) return null;
  const count = Math.max(1, Math.min(MOST_BLOCKS, Math.round(total / dt)));
  const blockSeconds = total / count;
  const joules = new Float64Array(count);
  let reached = 0;
  for (let i = 0; i < entrySeconds.length; i += 1) {
    const end = reached + (entrySeconds[i] as number);
    let block = Math.min(count - 1, Math.floor(reached / blockSeconds + 1e-9));
    let from = reached;
    while (from < end) {
      const to = block === count - 1 ? end : Math.min(end, (block + 1) * blockSeconds);
      if (to > from) joules[block] = (joules[block] as number) + (to - from) * (steps.watts[i] as number);
      from = Math.max(from, to);
      block += 1;
    }
    reached = end;
  }
  return { means: joules.map((energy) => energy / blockSeconds), blockSeconds, entrySeconds };
}

/**
 * A sample beside a gap or an edge weighs only the half step that counts. In a series of blocks it stands for a whole
 * one, as if that half were mirrored: otherwise even samples would fall across the blocks' edges.
 */
function lengthsOf({ seconds, weights, breaks }: CountedSteps): Float64Array {
  const n = weights.length;
  const lengths = Float64Array.from(weights);
  const isBroken = new Set([0, ...breaks]);
  for (const first of isBroken) {
    if (first < n && !(isBroken.has(first + 1) || first + 1 === n)) lengths[first] = seconds[first] as number;
    if (first > 1 && !isBroken.has(first - 1)) lengths[first - 1] = seconds[first - 2] as number;
  }
  if (n > 1 && !isBroken.has(n - 1)) lengths[n - 1] = seconds[n - 2] as number;
  return lengths;
}
