/** A stretch of one of two sets. */
export interface SetStretch {
  fromSeconds: number;
  toSeconds: number;
}

export type Interleaving = { interleaved: true } | { interleaved: false; reason: string };

/**
 * Whether two sets of stretches are interleaved in time: in order of time, the set changes at least as often as the
 * smaller set has stretches, so that whatever else drifts reaches both alike. Stretches may touch, not overlap.
 *
 * @example testInterleaving([0–10, 20–30, 40–50], [10–20, 30–40, 50–60]).interleaved // true
 */
export function testInterleaving(first: readonly SetStretch[], second: readonly SetStretch[]): Interleaving {
  const all = [
    ...first.map((stretch) => ({ ...stretch, set: 0 })),
    ...second.map((stretch) => ({ ...stretch, set: 1 })),
  ].sort((a, b) => a.fromSeconds - b.fromSeconds || a.toSeconds - b.toSeconds);
  let changes = 0;
  for (let i = 1; i < all.length; i += 1) {
    const [before, after] = [all[i - 1], all[i]];
    if (!before || !after) continue;
    if (after.fromSeconds < before.toSeconds) return { interleaved: false, reason: 'Two of the stretches overlap.' };
    if (after.set !== before.set) changes += 1;
  }
  const least = Math.min(first.length, second.length);
  return changes >= least && changes > 1
    ? { interleaved: true }
    : { interleaved: false, reason: 'The two sets do not alternate in time.' };
}
