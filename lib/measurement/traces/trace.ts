import type { PowerKind } from '../units/quantity';

/**
 * - samples: instantaneous readings; energy by the trapezoidal rule.
 * - averages: each value is the mean over an interval that ends (or starts) at its time.
 * - changes: written only when the value changes; a value holds until the next.
 * - counter: accumulated energy; power is the difference over the interval's length.
 */
export type TraceKind = 'samples' | 'averages' | 'changes' | 'counter';

/** A recorded series, in order, one reading a time. Both columns have the same length n ≥ 2. */
export interface Trace {
  kind: TraceKind;
  /** Seconds since 1970-01-01T00:00Z (or since the start where the file knew only that), strictly rising. */
  timeSeconds: Float64Array;
  /** W, or VA where powerKind is apparent; for a counter Wh since its first value, resets already joined. */
  values: Float64Array;
  powerKind: PowerKind;
  /** For averages: the averaging time in seconds. Otherwise null. */
  averagingSeconds: number | null;
  /** For averages: whether an interval ends or starts at its time. */
  stamp: 'end' | 'start';
  /** The logger's step q: the smallest difference between distinct raw readings, in the unit of values; 0 if none. */
  step: number;
}
