import type { TraceLevel } from '@/lib/measurement/traces/levels';
import type { Stretch } from './trace-window';

export interface TraceRow extends Stretch {
  minimum: number;
  mean: number;
  maximum: number;
}

/** The blocks of a level as rows with their ends: each lasts until the next begins. */
function blocksOf(level: TraceLevel, end: number): TraceRow[] {
  return level.from.flatMap((from, index) => {
    const minimum = level.minimum[index];
    const maximum = level.maximum[index];
    const mean = level.mean[index];
    if (minimum === undefined || maximum === undefined || mean === undefined) return [];
    return [{ from, to: level.from[index + 1] ?? end, minimum, mean, maximum }];
  });
}

function join(blocks: readonly TraceRow[], stretch: Stretch): TraceRow {
  let time = 0;
  let sum = 0;
  for (const block of blocks) {
    // The last block of a trace has no length of its own; alone it still counts.
    const length = Math.max(1e-9, Math.min(block.to, stretch.to) - Math.max(block.from, stretch.from));
    time += length;
    sum += length * block.mean;
  }
  return {
    ...stretch,
    minimum: Math.min(...blocks.map((block) => block.minimum)),
    mean: sum / time,
    maximum: Math.max(...blocks.map((block) => block.maximum)),
  };
}

/**
 * What is drawn between two moments, in at most `rows` equal stretches; stretches without readings are left out.
 *
 * @param end when the level's last block ends: the end of the trace or of the fetched window.
 */
export function summarise(level: TraceLevel, window: Stretch, rows: number, end: number): TraceRow[] {
  const blocks = blocksOf(level, end);
  const length = (window.to - window.from) / rows;
  return Array.from({ length: rows }, (_, row) => ({
    from: window.from + row * length,
    to: window.from + (row + 1) * length,
  })).flatMap((stretch, row) => {
    const inside = blocks.filter(
      (block) =>
        Math.max(block.to, block.from + 1e-9) > stretch.from &&
        (block.from < stretch.to || (row === rows - 1 && block.from <= stretch.to)),
    );
    return inside.length > 0 ? [join(inside, stretch)] : [];
  });
}
