/** Entries of a series from first to end (half open), their mean (W), and how much they weigh. */
export interface Segment {
  first: number;
  end: number;
  meanWatts: number;
  weight: number;
}

/**
 * Joins neighbours whose means are closer than max(2 q, 0.3 W, 5 % of the larger), the closest in that ratio first, of
 * equals the earliest; means are recomputed after each.
 *
 * @param step q in W.
 * @example joinClose([50 W and 51 W of one weight], 0) // one of 50.5 W
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
  const weight = a.weight + b.weight;
  const meanWatts = (a.meanWatts * a.weight + b.meanWatts * b.weight) / weight;
  return { first: a.first, end: b.end, meanWatts, weight };
}
