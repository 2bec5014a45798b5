import { median } from '../statistics/median';
import type { AcceptedCycles } from './cycles';

/** A part of a stretch that cycles and that is unlike the rest of it. */
export interface CycleException {
  fromSeconds: number;
  toSeconds: number;
  meanWatts: number;
  reason: string;
}

/** A cycle of more than so many usual lengths is named. */
const LONG = 2;
/** A level so much of (on − off) above on is not the usual running. */
const ABOVE = 0.25;

/**
 * What is unlike the rest in a stretch that cycles: whole cycles more than twice as long as the usual one, and levels
 * above the running one by more than a quarter of (on − off), a defrost heater say. They stay part of the day's energy;
 * the member decides whether one is a mode of its own.
 *
 * @param levels the steady levels inside the stretch, in order.
 */
export function cycleExceptions(
  finding: AcceptedCycles,
  levels: readonly { fromSeconds: number; toSeconds: number; meanWatts: number }[],
): CycleException[] {
  const usual = median(finding.cycles.map((cycle) => cycle.seconds));
  const long = finding.cycles
    .filter((cycle) => cycle.seconds > LONG * usual)
    .map(({ fromSeconds, toSeconds, wattHours, seconds }) => ({
      fromSeconds,
      toSeconds,
      meanWatts: (wattHours * 3600) / seconds,
      reason: 'This cycle is more than twice as long as the usual one.',
    }));
  const limit = finding.onWatts + ABOVE * (finding.onWatts - finding.offWatts);
  const high = levels
    .filter((level) => level.meanWatts > limit)
    .map(({ fromSeconds, toSeconds, meanWatts }) => ({
      fromSeconds,
      toSeconds,
      meanWatts,
      reason: 'It draws more here than when it usually runs.',
    }));
  return [...long, ...high].sort((a, b) => a.fromSeconds - b.fromSeconds);
}
