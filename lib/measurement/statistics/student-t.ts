import { incompleteBeta } from './incomplete-beta';
import { normalCdf, quantileByBisection } from './normal';

/** Beyond this many degrees of freedom t and the normal distribution agree to 1e-7 everywhere. */
const NORMAL_FROM = 1e7;

/**
 * The probability that Student's t with so many degrees of freedom lies at or below a value.
 *
 * Source: Abramowitz and Stegun 26.7; checked against R's pt.
 * @param t any number, also ±Infinity.
 * @param degreesOfFreedom above 0; Infinity is the normal distribution.
 * @throws {RangeError} where the degrees of freedom are not above 0, or t is not a number.
 * @example studentTCdf(0, 5) // 0.5
 */
export function studentTCdf(t: number, degreesOfFreedom: number): number {
  if (!(degreesOfFreedom > 0)) throw new RangeError('Degrees of freedom lie above 0.');
  if (Number.isNaN(t)) throw new RangeError('t is not a number.');
  if (degreesOfFreedom > NORMAL_FROM || !Number.isFinite(t)) return normalCdf(t);
  const half = degreesOfFreedom / 2;
  const square = t * t;
  const inside = square / (degreesOfFreedom + square);
  const outside = degreesOfFreedom / (degreesOfFreedom + square);
  if (square < 1) {
    const middle = incompleteBeta(inside, 0.5, half, outside) / 2;
    return t > 0 ? 0.5 + middle : 0.5 - middle;
  }
  const tail = incompleteBeta(outside, half, 0.5, inside) / 2;
  return t > 0 ? 1 - tail : tail;
}

/**
 * The value that Student's t stays at or below with this probability.
 *
 * @param p strictly between 0 and 1.
 * @throws {RangeError} outside that, or where the degrees of freedom are not above 0.
 * @example studentTQuantile(0.975, 1) // 12.7062…
 */
export function studentTQuantile(p: number, degreesOfFreedom: number): number {
  return quantileByBisection((t) => studentTCdf(t, degreesOfFreedom), p);
}
