/** Blocks from first to end (half open) and their mean (W). */
export interface Segment {
  first: number;
  end: number;
  meanWatts: number;
}

/**
 * Joins neighbours whose means are closer than max(2 q, 0.3 W, 5 % of the larger), the closest in that ratio first, of
 * equals the earliest; means are recomputed after each.
 *
 * @param step q in W.
 * @example joinClose([{ first: 0, end: 5, meanWatts: 50 }, { first: 5, end: 10, meanWatts: 51 }], 0) // one of 50.5 W
 */
export function joinClose(segments: readonly Segment[], step: number): Segment[] {
  const kept = [...segments];
  for (;;) {
    let closest = -1;
    let least = 1;
    for (let i = 0; i + 1 < kept.length; i += 1) {
      const ratio = closeness(kept[i] as Segment, kept[i + 1] as Segment, step);
      if (ratio < least) {
        least = ratio;
        closest = i;
      }
    }
    if (closest < 0) return kept;
    kept.splice(closest, 2, join(kept[closest] as Segment, kept[closest + 1] as Segment));
  }
}

/** How far two levels are apart, in parts of what tells levels apart: below 1 they are one. */
export function closeness(a: { meanWatts: number }, b: { meanWatts: number }, step: number): number {
  const larger = Math.max(Math.abs(a.meanWatts), Math.abs(b.meanWatts));
  return Math.abs(a.meanWatts - b.meanWatts) / Math.max(2 * step, 0.3, 0.05 * larger);
}

function join(a: Segment, b: Segment): Segment {
  const [ofA, ofB] = [a.end - a.first, b.end - b.first];
  return {
    first: a.first,
    end: b.end,
    meanWatts: (a.meanWatts * ofA + b.meanWatts * ofB) / (ofA + ofB),
  };
}
