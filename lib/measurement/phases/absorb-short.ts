import { ShortestFirst } from './shortest-first';

/** Entries from first to end (half open) that are all on or all off, and how long they count. */
export interface Run {
  on: boolean;
  first: number;
  end: number;
  seconds: number;
}

/**
 * Joins each run shorter than the least with both its neighbours, the shortest first, of equals the earliest: it was a
 * flicker of what stands around it. At an end there is one neighbour only, and a run alone stays.
 *
 * Method: a queue over a linked list; n log n.
 * @param runs alternating on and off, in order, seamless.
 * @returns alternating runs again; the list given is left as it is.
 * @example absorbShort([100 s on, 5 s off, 100 s on], 30) // [205 s on]
 */
export function absorbShort(runs: readonly Run[], leastSeconds: number): Run[] {
  const n = runs.length;
  const kept = runs.map((run) => ({ ...run }));
  const seconds = Float64Array.from(runs, (run) => run.seconds);
  const before = Int32Array.from(runs, (_, k) => k - 1);
  const after = Int32Array.from(runs, (_, k) => (k + 1 < n ? k + 1 : -1));
  const isGone = new Uint8Array(n);
  const queue = new ShortestFirst(seconds);
  for (let k = 0; k < n; k += 1) if ((seconds[k] as number) < leastSeconds) queue.add(k);
  for (let k = queue.take(); k !== null; k = queue.take()) {
    const neighbours = [before[k] as number, after[k] as number].filter((at) => at >= 0);
    if (isGone[k] === 1 || neighbours.length === 0) continue;
    const run = kept[k] as Run;
    run.on = !run.on;
    for (const at of neighbours) {
      const host = kept[at] as Run;
      isGone[at] = 1;
      run.first = Math.min(run.first, host.first);
      run.end = Math.max(run.end, host.end);
      run.seconds += host.seconds;
      if (at < k) before[k] = before[at] as number;
      else after[k] = after[at] as number;
    }
    seconds[k] = run.seconds;
    const [left, right] = [before[k] as number, after[k] as number];
    if (left >= 0) after[left] = k;
    if (right >= 0) before[right] = k;
    if (run.seconds < leastSeconds) queue.add(k);
  }
  return kept.filter((_, k) => isGone[k] === 0);
}
