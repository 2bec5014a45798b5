import { CompensatedSum } from '../statistics/compensated-sum';
import { medianStepSeconds } from './step';
import { countSteps, indexRange } from './steps';
import type { Trace } from './trace';
import { weightedPercentiles } from './weighted-percentiles';

/** The figures of a stretch of a trace, over its counted time. */
export interface StretchFigures {
  readings: number;
  countedSeconds: number;
  /** Counted over (last − first) time, 0 to 1. Below 0.9 a figure says so. */
  coverage: number;
  gaps: { fromSeconds: number; toSeconds: number }[];
  energyWattHours: number;
  meanWatts: number;
  minimumWatts: number;
  maximumWatts: number;
  /** Over what the minimum and maximum average: 0 for instantaneous samples. Never publish a maximum without it. */
  averagingSeconds: number;
  p05Watts: number;
  p50Watts: number;
  p95Watts: number;
  /** Share of the time below 1 W. */
  shareBelowOneWatt: number;
  /** Share of the time with a reading below 0: a clamp or shunt the wrong way round. */
  shareNegative: number;
}

const JOULES_A_WATT_HOUR = 3600;

/**
 * Energy, mean, minimum, maximum and percentiles between two times, weighted by time, always: real loggers sample
 * unevenly, and the plain mean of the rows can be a third off.
 *
 * Source: energy as Σ interval average × interval: 10 CFR 430 subpart B, appendix Y; the trapezoidal rule for samples.
 * @param fromSeconds, toSeconds in the trace's own time; readings at both ends belong to the stretch.
 * @returns null where no time counts: fewer than two readings, or gaps alone.
 * @example stretchFigures(samples of 10 W at 0, 10 and 20 s, 0, 20)?.energyWattHours // 0.0555…
 */
export function stretchFigures(trace: Trace, fromSeconds: number, toSeconds: number): StretchFigures | null {
  const { first, end } = indexRange(trace, fromSeconds, toSeconds);
  if (end - first < 1) return null;
  const steps = countSteps(trace, first, end);
  const counted = new CompensatedSum();
  const joules = new CompensatedSum();
  const low = new CompensatedSum();
  const negative = new CompensatedSum();
  let minimum = Infinity;
  let maximum = -Infinity;
  for (let i = 0; i < steps.watts.length; i += 1) {
    const watts = steps.watts[i] as number;
    const weight = steps.weights[i] as number;
    counted.add(steps.seconds[i] as number);
    joules.add(steps.joules[i] as number);
    if (watts < 1) low.add(weight);
    if (watts < 0) negative.add(weight);
    if (watts < minimum) minimum = watts;
    if (watts > maximum) maximum = watts;
  }
  const countedSeconds = counted.value;
  if (!(countedSeconds > 0)) return null;
  const [p05, p50, p95] = weightedPercentiles(steps.watts, steps.weights, [0.05, 0.5, 0.95]);
  return {
    readings: end - first,
    countedSeconds,
    coverage: coverage(trace, first, end, countedSeconds),
    gaps: steps.gaps,
    energyWattHours: joules.value / JOULES_A_WATT_HOUR,
    meanWatts: joules.value / countedSeconds,
    minimumWatts: minimum,
    maximumWatts: maximum,
    averagingSeconds: averagingOf(trace),
    p05Watts: p05 as number,
    p50Watts: p50 as number,
    p95Watts: p95 as number,
    shareBelowOneWatt: low.value / countedSeconds,
    shareNegative: negative.value / countedSeconds,
  };
}

function coverage(trace: Trace, first: number, end: number, countedSeconds: number): number {
  const recorded = (trace.timeSeconds[end - 1] as number) - (trace.timeSeconds[first] as number);
  // Averages reach one interval beyond their times.
  const span = trace.kind === 'averages' ? recorded + (trace.averagingSeconds ?? medianStepSeconds(trace)) : recorded;
  return span > 0 ? Math.min(1, countedSeconds / span) : 1;
}

/** Over which interval a reading averages (s); 0 for what is read in an instant. */
export function averagingOf(trace: Trace): number {
  if (trace.kind === 'averages') return trace.averagingSeconds ?? medianStepSeconds(trace);
  return trace.kind === 'counter' ? medianStepSeconds(trace) : 0;
}
