import { CompensatedSum } from '../statistics/compensated-sum';
import type { CountedSteps } from './steps';

/**
 * The means of all windows of one length that a reading begins or ends: between two of them the mean of a sliding
 * window only moves steadily, so the highest and the lowest are among them. No window reaches across a gap.
 *
 * @param windowSeconds above 0.
 * @param visit is given each window's mean in W.
 */
export function visitWindows(steps: CountedSteps, windowSeconds: number, visit: (meanWatts: number) => void): void {
  const { seconds, joules, breaks } = steps;
  const n = seconds.length;
  const time = cumulate(seconds);
  const energy = cumulate(joules);
  const edges = [...breaks, n];
  let start = 0;
  for (const end of edges) {
    if (end > start) visitSeamless(time, energy, start, end, windowSeconds, visit);
    start = end;
  }
}

/** Windows within entries start to end (half open); each entry lasts from its own edge to the next. */
function visitSeamless(
  time: Float64Array,
  energy: Float64Array,
  start: number,
  end: number,
  windowSeconds: number,
  visit: (meanWatts: number) => void,
): void {
  const [from, to] = [time[start] as number, time[end] as number];
  if (to - from < windowSeconds) return;
  // Energy up to a time between two edges: power is taken as even between them.
  const energyAt = (t: number, edge: number) => {
    const [left, right] = [time[edge] as number, time[edge + 1] as number];
    const share = right > left ? (t - left) / (right - left) : 0;
    return (energy[edge] as number) + share * ((energy[edge + 1] as number) - (energy[edge] as number));
  };
  let [behind, ahead] = [start, start];
  for (let k = start; k <= end; k += 1) {
    const at = time[k] as number;
    if (at - windowSeconds >= from) {
      while (behind + 1 < k && (time[behind + 1] as number) <= at - windowSeconds) behind += 1;
      visit(((energy[k] as number) - energyAt(at - windowSeconds, behind)) / windowSeconds);
    }
    if (at + windowSeconds <= to) {
      while (ahead + 1 < end && (time[ahead + 1] as number) <= at + windowSeconds) ahead += 1;
      visit((energyAt(at + windowSeconds, ahead) - (energy[k] as number)) / windowSeconds);
    }
  }
}

function cumulate(terms: Float64Array): Float64Array {
  const sums = new Float64Array(terms.length + 1);
  const sum = new CompensatedSum();
  for (let i = 0; i < terms.length; i += 1) {
    sum.add(terms[i] as number);
    sums[i + 1] = sum.value;
  }
  return sums;
}
