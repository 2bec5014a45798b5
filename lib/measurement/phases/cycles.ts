import { compensatedSum } from '../statistics/compensated-sum';
import { mean } from '../statistics/mean';
import { standardDeviation } from '../statistics/standard-deviation';
import { medianStepSeconds } from '../traces/step';
import { countSteps, indexRange, type CountedSteps } from '../traces/steps';
import type { Trace } from '../traces/trace';
import { findOnOffRuns, type Run } from './on-off-runs';
import { runningMedian5 } from './running-median';

/** One whole cycle: from one switching-on to the next. */
export interface Cycle {
  fromSeconds: number;
  toSeconds: number;
  seconds: number;
  onSeconds: number;
  wattHours: number;
  onWattHours: number;
}

export type CycleFinding =
  | {
      accepted: true;
      cycles: Cycle[];
      /** Over whole cycles (W): the day's energy is 24 h of it. */
      meanWatts: number;
      dayWattHours: number;
      /** On-time over cycle time. */
      dutyCycle: number;
      cyclesPerDay: number;
      wattHoursPerCycle: { mean: number; standardDeviation: number };
      secondsPerCycle: { mean: number; standardDeviation: number };
      /** Means of the parts of the whole cycles (W), and how long they counted. */
      running: { meanWatts: number; seconds: number };
      between: { meanWatts: number; seconds: number };
    }
  | { accepted: false; reason: string };

const LEAST_CYCLES = 3;
const LEAST_SHARE = 0.5;
const LARGEST_VARIATION = 0.5;

/**
 * Finds the whole cycles of a thermostat. Accepted where the levels are apart by max(2 W, 4 q, 20 % of on), three or
 * more whole cycles without a gap cover at least half the counted time, their lengths vary by at most half, and duty
 * lies between 0.02 and 0.98; otherwise no day energy follows, and the reason says why. (Without these guards cycles
 * were found on half of 62 real traces, with means up to 91 times off; with them exactly the thermostats were.)
 *
 * Method: running median of five where dt ≤ 10 s; Otsu's threshold; hysteresis.
 * @example findCycles(trace of a freezer over two days, from, to).accepted // true
 */
export function findCycles(trace: Trace, fromSeconds: number, toSeconds: number): CycleFinding {
  const { first, end } = indexRange(trace, fromSeconds, toSeconds);
  if (end - first < 3) return refused('There are too few readings to see a cycle.');
  const dt = medianStepSeconds(trace);
  const steps = countSteps(trace, first, end);
  const smooth = dt <= 10 ? runningMedian5(steps.watts) : steps.watts;
  const found = findOnOffRuns(smooth, steps.seconds, Math.max(30, 3 * dt));
  if (!found) return refused('The power never changes, so nothing switches on and off.');
  const { onWatts, offWatts, runs } = found;
  const step = trace.kind === 'counter' ? (trace.step * 3600) / dt : trace.step;
  if (onWatts - offWatts < Math.max(2, 4 * step, 0.2 * onWatts)) {
    return refused('On and off are too close together to tell apart.');
  }
  const cycles = wholeCycles(trace, first, steps, runs);
  if (cycles.length < LEAST_CYCLES) {
    return refused(
      `A day’s energy needs three whole cycles or more; this stretch holds ${cycles.length}. Measure longer.`,
    );
  }
  const lengths = cycles.map((cycle) => cycle.seconds);
  const covered = compensatedSum(lengths);
  if (covered < LEAST_SHARE * compensatedSum(steps.seconds)) {
    return refused('Whole cycles cover less than half of the stretch. Cut it to the part that cycles.');
  }
  if (standardDeviation(lengths) > LARGEST_VARIATION * mean(lengths)) {
    return refused('The cycles differ too much in length to be one thermostat’s.');
  }
  const dutyCycle = compensatedSum(cycles.map((cycle) => cycle.onSeconds)) / covered;
  if (dutyCycle < 0.02 || dutyCycle > 0.98) return refused('It is nearly always on, or nearly always off.');
  return accept(cycles, covered, dutyCycle);
}

/** From each switching-on to the next, where no gap lies between. The first and last parts of the stretch are no whole. */
function wholeCycles(trace: Trace, offset: number, steps: CountedSteps, runs: readonly Run[]): Cycle[] {
  const starts = runs.filter((run, i) => run.on && i > 0);
  const at = (i: number) => trace.timeSeconds[offset + i] as number;
  return starts.slice(0, -1).flatMap((start, i) => {
    const next = starts[i + 1] as Run;
    const fromSeconds = at(start.first);
    const toSeconds = at(next.first);
    if (steps.gaps.some((gap) => gap.toSeconds > fromSeconds && gap.fromSeconds < toSeconds)) return [];
    let seconds = 0;
    let joules = 0;
    let onSeconds = 0;
    let onJoules = 0;
    for (let k = start.first; k < next.first; k += 1) {
      seconds += steps.seconds[k] as number;
      joules += steps.joules[k] as number;
      if (k >= start.end) continue;
      onSeconds += steps.seconds[k] as number;
      onJoules += steps.joules[k] as number;
    }
    return [{ fromSeconds, toSeconds, seconds, onSeconds, wattHours: joules / 3600, onWattHours: onJoules / 3600 }];
  });
}

function accept(cycles: Cycle[], covered: number, dutyCycle: number): CycleFinding {
  const energies = cycles.map((cycle) => cycle.wattHours);
  const lengths = cycles.map((cycle) => cycle.seconds);
  const energy = compensatedSum(energies);
  const onEnergy = compensatedSum(cycles.map((cycle) => cycle.onWattHours));
  const onSeconds = dutyCycle * covered;
  const meanWatts = (energy * 3600) / covered;
  return {
    accepted: true,
    cycles,
    meanWatts,
    dayWattHours: meanWatts * 24,
    dutyCycle,
    cyclesPerDay: 86_400 / mean(lengths),
    wattHoursPerCycle: { mean: mean(energies), standardDeviation: standardDeviation(energies) },
    secondsPerCycle: { mean: mean(lengths), standardDeviation: standardDeviation(lengths) },
    running: { meanWatts: (onEnergy * 3600) / onSeconds, seconds: onSeconds },
    between: { meanWatts: ((energy - onEnergy) * 3600) / (covered - onSeconds), seconds: covered - onSeconds },
  };
}

function refused(reason: string): CycleFinding {
  return { accepted: false, reason };
}
