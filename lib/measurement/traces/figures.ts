import { CompensatedSum } from '../statistics/compensated-sum';
import { averagingOf } from './step';
import { countStretch, type CountedSteps } from './steps';
import type { Trace } from './trace';
import { weightedPercentiles } from './weighted-percentiles';

/** The figures of a stretch of a trace, over its counted time. */
export interface StretchFigures {
  readings: number;
  countedSeconds: number;
  /** Counted over recorded time, 0 to 1. Below 0.9 a figure says so. */
  coverage: number;
  /** Where nothing is known of the power. */
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
 * @param fromSeconds, toSeconds in the trace's own time; readings at both ends belong to the stretch, and where an edge
 *   falls between two readings, the part inside counts.
 * @returns null where no time counts: outside the trace, no length, or gaps alone.
 * @example stretchFigures(samples of 10 W at 0, 10 and 20 s, 0, 20)?.energyWattHours // 0.0555…
 */
export function stretchFigures(trace: Trace, fromSeconds: number, toSeconds: number): StretchFigures | null {
  const stretch = countStretch(trace, fromSeconds, toSeconds);
  if (stretch === null) return null;
  const steps = withKnownPower(stretch);
  const { countedSeconds, joules, powerSeconds, lowSeconds, negativeSeconds } = sumsOf(steps);
  if (!(countedSeconds > 0)) return null;
  const { minimum, maximum } = extremesOf(steps);
  const [p05, p50, p95] = weightedPercentiles(steps.watts, steps.weights, [0.05, 0.5, 0.95]);
  return {
    readings: steps.readings.end - steps.readings.first,
    countedSeconds,
    coverage: Math.min(1, countedSeconds / (steps.toSeconds - steps.fromSeconds)),
    gaps: steps.gaps,
    energyWattHours: joules / JOULES_A_WATT_HOUR,
    meanWatts: joules / countedSeconds,
    minimumWatts: minimum,
    maximumWatts: maximum,
    averagingSeconds: averagingOf(trace),
    p05Watts: p05 as number,
    p50Watts: p50 as number,
    p95Watts: p95 as number,
    shareBelowOneWatt: lowSeconds / powerSeconds,
    shareNegative: negativeSeconds / powerSeconds,
  };
}

/** Inside a counter's long silence nothing but its mean is known, and that stands for all of it. */
function withKnownPower(steps: CountedSteps): CountedSteps {
  return steps.weights.some((weight) => weight > 0) ? steps : { ...steps, weights: steps.seconds };
}

function sumsOf({ watts, seconds, joules, weights }: CountedSteps) {
  const [counted, energy, power, low, negative] = Array.from({ length: 5 }, () => new CompensatedSum()) as [
    CompensatedSum,
    CompensatedSum,
    CompensatedSum,
    CompensatedSum,
    CompensatedSum,
  ];
  for (let i = 0; i < watts.length; i += 1) {
    const weight = weights[i] as number;
    counted.add(seconds[i] as number);
    energy.add(joules[i] as number);
    power.add(weight);
    if ((watts[i] as number) < 1) low.add(weight);
    if ((watts[i] as number) < 0) negative.add(weight);
  }
  return {
    countedSeconds: counted.value,
    joules: energy.value,
    powerSeconds: power.value,
    lowSeconds: low.value,
    negativeSeconds: negative.value,
  };
}

/** Of what was read, not of what was interpolated at an edge, unless the stretch holds nothing else. */
function extremesOf({ watts, weights, readings }: CountedSteps): { minimum: number; maximum: number } {
  const isWithin = (i: number) => readings.end === readings.first || (i >= readings.first && i < readings.end);
  let minimum = Infinity;
  let maximum = -Infinity;
  for (let i = 0; i < watts.length; i += 1) {
    if (!((weights[i] as number) > 0) || !isWithin(i)) continue;
    minimum = Math.min(minimum, watts[i] as number);
    maximum = Math.max(maximum, watts[i] as number);
  }
  return { minimum, maximum };
}
