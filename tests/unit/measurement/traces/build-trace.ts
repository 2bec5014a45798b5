import type { Trace, TraceKind } from '@/lib/measurement/traces/trace';

/** A trace of [seconds, value] points. */
export function traceOf(
  kind: TraceKind,
  points: readonly (readonly [number, number])[],
  more: Partial<Trace> = {},
): Trace {
  return {
    kind,
    timeSeconds: Float64Array.from(points, ([seconds]) => seconds),
    values: Float64Array.from(points, ([, value]) => value),
    powerKind: 'real',
    averagingSeconds: null,
    stamp: 'end',
    step: 0.1,
    ...more,
  };
}

/** Evenly spaced from 0 on. */
export function evenTrace(kind: TraceKind, dt: number, values: readonly number[], more: Partial<Trace> = {}): Trace {
  return traceOf(
    kind,
    values.map((value, i) => [i * dt, value] as const),
    more,
  );
}

/** A level for so many readings, again and again. */
export function levels(...parts: readonly (readonly [watts: number, count: number])[]): number[] {
  return parts.flatMap(([watts, count]) => new Array<number>(count).fill(watts));
}

/** Noise that is the same each time, between −1 and 1. */
export function noiseFrom(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 1_664_525 + 1_013_904_223) % 4_294_967_296;
    return state / 2_147_483_648 - 1;
  };
}
