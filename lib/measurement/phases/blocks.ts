import { CompensatedSum } from '../statistics/compensated-sum';
import type { CountedSteps } from '../traces/steps';
import type { TraceKind } from '../traces/trace';

/** The least time in which phases are looked for is three blocks of so many. */
export const MOST_BLOCKS = 4096;

/** A series averaged into equal blocks of counted time: gaps have no length in it. */
export interface Blocks {
  /** W, one a block. */
  means: Float64Array;
  blockSeconds: number;
  /** How long the entries before each stand in the series (s), and the energy (J) of them: one more than entries. */
  time: Float64Array;
  energy: Float64Array;
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
  const lengths = kind === 'samples' ? lengthsOf(steps) : steps.weights;
  const { time, energy } = cumulate(lengths, steps.watts);
  const total = time[lengths.length] as number;
  if (!(total > 0)) return null;
  const count = Math.max(1, Math.min(MOST_BLOCKS, Math.round(total / dt)));
  const blockSeconds = total / count;
  const means = new Float64Array(count);
  let entry = 0;
  let before = 0;
  for (let block = 0; block < count; block += 1) {
    const edge = block === count - 1 ? total : (block + 1) * blockSeconds;
    while (entry < lengths.length - 1 && (time[entry + 1] as number) <= edge) entry += 1;
    const upTo = (energy[entry] as number) + (edge - (time[entry] as number)) * (steps.watts[entry] as number);
    means[block] = (upTo - before) / blockSeconds;
    before = upTo;
  }
  return { means, blockSeconds, time, energy };
}

function cumulate(lengths: Float64Array, watts: Float64Array): { time: Float64Array; energy: Float64Array } {
  const [time, energy] = [new Float64Array(lengths.length + 1), new Float64Array(lengths.length + 1)];
  const [ofTime, ofEnergy] = [new CompensatedSum(), new CompensatedSum()];
  for (let i = 0; i < lengths.length; i += 1) {
    ofTime.add(lengths[i] as number);
    ofEnergy.add((lengths[i] as number) * (watts[i] as number));
    time[i + 1] = ofTime.value;
    energy[i + 1] = ofEnergy.value;
  }
  return { time, energy };
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
