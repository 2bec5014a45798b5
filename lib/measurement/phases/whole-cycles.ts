import { CompensatedSum } from '../statistics/compensated-sum';
import type { CountedSteps } from '../traces/steps';
import type { Run } from './absorb-short';

/** One whole cycle: from one switching-on to the next. */
export interface Cycle {
  fromSeconds: number;
  toSeconds: number;
  seconds: number;
  onSeconds: number;
  wattHours: number;
  onWattHours: number;
}

/**
 * The whole cycles among runs of on and off: from each switching-on to the next, where no gap lies between or
 * hides the switching. What comes before the first switching-on and after the last is no whole cycle, and what a
 * stretch begins with was switched on nobody knows when.
 *
 * @param runs alternating, seamless, of the entries of steps.
 */
export function wholeCycles(steps: CountedSteps, runs: readonly Run[]): Cycle[] {
  const starts = runs.filter((run, i) => run.on && i > 0);
  const cycles: Cycle[] = [];
  let gap = 0;
  for (let i = 0; i + 1 < starts.length; i += 1) {
    const start = starts[i] as Run;
    const next = starts[i + 1] as Run;
    const fromSeconds = steps.starts[start.first] as number;
    const toSeconds = steps.starts[next.first] as number;
    while (gap < steps.gaps.length && (steps.gaps[gap] as { toSeconds: number }).toSeconds < fromSeconds) gap += 1;
    const after = steps.gaps[gap];
    if (after && after.fromSeconds < toSeconds) continue;
    const on = sumOf(steps, start.first, start.end);
    const whole = sumOf(steps, start.first, next.first);
    cycles.push({
      fromSeconds,
      toSeconds,
      seconds: whole.seconds,
      onSeconds: on.seconds,
      wattHours: whole.joules / 3600,
      onWattHours: on.joules / 3600,
    });
  }
  return cycles;
}

function sumOf({ seconds, joules }: CountedSteps, first: number, end: number): { seconds: number; joules: number } {
  const [time, energy] = [new CompensatedSum(), new CompensatedSum()];
  for (let i = first; i < end; i += 1) {
    time.add(seconds[i] as number);
    energy.add(joules[i] as number);
  }
  return { seconds: time.value, joules: energy.value };
}
