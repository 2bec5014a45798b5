import { countCells } from './count-cells';
import { countSamples } from './count-samples';
import { medianStepSeconds } from './step';
import type { Trace } from './trace';

/** What a stretch of a trace is summed over: one entry a reading, all columns of one length. Not to be written to. */
export interface CountedSteps {
  /** Seconds at which what an entry stands for begins: a sample's own time, an interval's start. */
  starts: Float64Array;
  /** W (or VA). */
  watts: Float64Array;
  /** Seconds that count from an entry's start on: to the next sample, or to the interval's end. */
  seconds: Float64Array;
  /** J of those seconds. */
  joules: Float64Array;
  /** Seconds that an entry's power stands for: half of each counted neighbouring step for samples. */
  weights: Float64Array;
  /** Entries from first to end (half open) are readings; what stands outside was interpolated at the stretch's edges. */
  readings: { first: number; end: number };
  /** Where the power is not known. Only a counter's time and energy count there. */
  gaps: { fromSeconds: number; toSeconds: number }[];
  /** Entries that follow on a gap, rising: nothing may be summed across them that must be seamless. */
  breaks: number[];
  /** The stretch, clipped to what the trace covers. */
  fromSeconds: number;
  toSeconds: number;
}

/**
 * What counts of a stretch, by the trace's kind: the trapezoid of samples, value times interval of averages, a held
 * value of changes, the difference of a counter. Where an edge of the stretch falls between two readings, the part
 * inside counts, so that the parts of a divided stretch add up to it wherever it is divided.
 *
 * The interval of the very first average (or, with starting times, of the last) lies outside the trace's times and
 * belongs to every stretch that reaches to that reading.
 * @returns null where the stretch lies outside the trace or has no length.
 * @example countStretch(samples of 10 W at 0, 10 and 20 s, 5, 20)?.seconds // 5, 10, 0
 */
export function countStretch(trace: Trace, fromSeconds: number, toSeconds: number): CountedSteps | null {
  const { kind, stamp, timeSeconds: times } = trace;
  const own = kind === 'averages' ? medianStepSeconds(trace) : 0;
  const first = times[0] as number;
  const last = times[times.length - 1] as number;
  const reach = {
    fromSeconds: fromSeconds <= first ? first - (stamp === 'end' ? own : 0) : fromSeconds,
    toSeconds: toSeconds >= last ? last + (stamp === 'start' ? own : 0) : toSeconds,
  };
  // A stretch beside the trace would otherwise be drawn to its nearer end.
  if (toSeconds < first || fromSeconds > last || !(reach.toSeconds > reach.fromSeconds)) return null;
  return kind === 'samples' ? countSamples(trace, reach) : countCells(trace, reach);
}
