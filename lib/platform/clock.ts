import 'server-only';
import { env } from './env';

// A test may move the clock of its own process further, beyond what the environment says.
const moved = { seconds: 0 };

/** The time. Nothing else in the project asks the machine for it, and SQL gets it as a parameter. */
export function now(): Date {
  return new Date(Date.now() + (env().clockOffsetSeconds + moved.seconds) * 1000);
}

export function secondsFromNow(seconds: number): Date {
  return new Date(now().getTime() + seconds * 1000);
}

/** For tests: moves this process's clock by so many seconds, from where the environment put it. */
export function moveClock(seconds: number): void {
  moved.seconds = seconds;
}
