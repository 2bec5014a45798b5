import { studentTCdf } from '../statistics/student-t';
import type { Interval } from './claimed-interval';

export interface Probabilities {
  below: number;
  within: number;
  above: number;
}

/**
 * The probabilities that what was measured lies below, within and above an interval.
 *
 * Source: JCGM 106:2012, clauses 7 and 8 (conformance probability), with Student's t for the uncertainty's own degrees
 * of freedom.
 * @param u the standard uncertainty, ≥ 0; at 0 the reading decides alone.
 * @throws {RangeError} where u is negative or not a number.
 * @example conformity(10, 1, Infinity, { lower: null, upper: 11.4 }).within // 0.9192…
 */
export function conformity(y: number, u: number, degreesOfFreedom: number, interval: Interval): Probabilities {
  if (!(u >= 0)) throw new RangeError('A standard uncertainty is 0 or more.');
  if (u === 0) {
    const below = interval.lower !== null && y < interval.lower ? 1 : 0;
    const above = interval.upper !== null && y > interval.upper ? 1 : 0;
    return { below, within: 1 - below - above, above };
  }
  const below = interval.lower === null ? 0 : studentTCdf((interval.lower - y) / u, degreesOfFreedom);
  const above = interval.upper === null ? 0 : studentTCdf((y - interval.upper) / u, degreesOfFreedom);
  return { below, within: Math.max(0, 1 - below - above), above };
}
