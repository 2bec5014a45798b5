/** A stretch of time in seconds, on the trace's own clock. */
export interface Stretch {
  from: number;
  to: number;
}

/** No closer than this: finer than any logger's readings. */
const CLOSEST_SECONDS = 5;

const within = (value: number, low: number, high: number) => Math.min(high, Math.max(low, value));

/** The window moved inside the trace, keeping its length where the trace is long enough. */
export function keepInside(window: Stretch, whole: Stretch): Stretch {
  const length = Math.min(window.to - window.from, whole.to - whole.from);
  const from = within(window.from, whole.from, whole.to - length);
  return { from, to: from + length };
}

/** Closer with a factor below 1, and the moment `around` stays where it is on the screen. */
export function zoom(window: Stretch, factor: number, around: number, whole: Stretch): Stretch {
  const length = window.to - window.from;
  const wanted = within(length * factor, Math.min(CLOSEST_SECONDS, whole.to - whole.from), whole.to - whole.from);
  const share = length > 0 ? (around - window.from) / length : 0.5;
  const from = around - share * wanted;
  return keepInside({ from, to: from + wanted }, whole);
}

/** Later by a share of the window; earlier where it is negative. */
export function pan(window: Stretch, share: number, whole: Stretch): Stretch {
  const shift = share * (window.to - window.from);
  return keepInside({ from: window.from + shift, to: window.to + shift }, whole);
}

export interface TracePhase extends Stretch {
  id: string;
  /** Its operating mode: "standby". */
  name: string;
}

/**
 * A phase with one edge moved: it keeps at least `shortest` seconds, stays in the trace and takes nothing from a
 * neighbouring phase.
 */
export function moveEdge(
  phases: readonly TracePhase[],
  id: string,
  edge: 'from' | 'to',
  to: number,
  whole: Stretch,
  shortest = 1,
): Stretch | null {
  const phase = phases.find((one) => one.id === id);
  if (!phase) return null;
  const others = phases.filter((one) => one.id !== id);
  if (edge === 'from') {
    const before = Math.max(whole.from, ...others.filter((one) => one.to <= phase.from).map((one) => one.to));
    return { from: within(to, before, phase.to - shortest), to: phase.to };
  }
  const after = Math.min(whole.to, ...others.filter((one) => one.from >= phase.to).map((one) => one.from));
  return { from: phase.from, to: within(to, phase.from + shortest, after) };
}
