import { firstAbove, firstAtLeast } from '../traces/search-sorted';
import type { Trace } from '../traces/trace';

/**
 * Where what comes before a time ends. A sample stands at its time, so what precedes ends with the sample before; what
 * averages and held values stand for ends at the time itself.
 *
 * @example readingBefore(samples at 0, 10 and 20 s, 20) // 10
 */
export function readingBefore({ kind, timeSeconds }: Trace, seconds: number): number {
  return kind === 'samples' ? (timeSeconds[firstAtLeast(timeSeconds, seconds) - 1] ?? -Infinity) : seconds;
}

/**
 * Where what comes after a time begins.
 *
 * @example readingAfter(samples at 0, 10 and 20 s, 10) // 20
 */
export function readingAfter({ kind, timeSeconds }: Trace, seconds: number): number {
  return kind === 'samples' ? (timeSeconds[firstAbove(timeSeconds, seconds)] ?? Infinity) : seconds;
}
