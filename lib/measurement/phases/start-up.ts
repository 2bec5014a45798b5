import { closeness } from './join-close';

/** A phase as the rule for start-ups sees it. */
interface Level {
  meanWatts: number;
  seconds: number;
  isCycling: boolean;
}

const LONGEST_SECONDS = 15 * 60;
const LARGEST_SHARE = 0.1;
/** A level is off where it is so small a share of the level after it. */
const OFF_SHARE = 0.2;

/**
 * Which phases are a start-up: what follows on a switch-on from the off level, or stands at the trace's start when that
 * is already above it; together at most 15 minutes, and at most a tenth of the run that follows. A run lasts until the
 * next off level. Several levels in a row, a boot's steps, are one start-up while they keep within both limits.
 *
 * The off level is the lowest of the trace, where it is at most a fifth of what it switches to.
 * @param levels in order.
 * @param step q in W.
 * @returns for each level whether it belongs to a start-up.
 * @example startUps([2 W 60 s, 120 W 10 s, 85 W 120 s], 0) // false, true, false
 */
export function startUps(levels: readonly Level[], step: number): boolean[] {
  const lowest = levels.reduce((least, level) => (level.meanWatts < least.meanWatts ? level : least), {
    meanWatts: Infinity,
  });
  const isLow = (level: Level) => !level.isCycling && (level === lowest || closeness(level, lowest, step) < 1);
  const isOff = levels.map((level, i) => {
    const next = levels[i + 1] ?? levels[i - 1];
    return next !== undefined && isLow(level) && level.meanWatts <= OFF_SHARE * next.meanWatts;
  });
  const marks = levels.map(() => false);
  levels.forEach((_, start) => {
    const isSwitchOn = !isOff[start] && (start === 0 || isOff[start - 1] === true);
    if (!isSwitchOn) return;
    const stop = isOff.indexOf(true, start);
    markRun(levels, marks, start, stop < 0 ? levels.length : stop);
  });
  return marks;
}

function markRun(levels: readonly Level[], marks: boolean[], start: number, end: number): void {
  const secondsOf = (from: number, to: number) => levels.slice(from, to).reduce((sum, { seconds }) => sum + seconds, 0);
  for (let next = start + 1; next < end; next += 1) {
    const startUp = secondsOf(start, next);
    const isShort = startUp <= LONGEST_SECONDS && startUp <= LARGEST_SHARE * secondsOf(next, end);
    if (levels[next - 1]?.isCycling || !isShort) return;
    marks[next - 1] = true;
  }
}
