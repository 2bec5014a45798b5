import { mean } from '../statistics/mean';
import { standardDeviation } from '../statistics/standard-deviation';
import { studentTQuantile } from '../statistics/student-t';

/** A difference of two means with its 95 % interval. */
export interface WelchDifference {
  difference: number;
  standardError: number;
  degreesOfFreedom: number;
  interval: { low: number; high: number };
}

/**
 * The difference of the means of two sets whose spreads may differ, first minus second.
 *
 * Method: Welch's t interval with the Welch–Satterthwaite degrees of freedom. Source: Welch (1947); JCGM 100:2008, G.4.
 * @param first, second two values or more each.
 * @param step the logger's step q: each mean carries q/√12 that no averaging takes away. 0 for none.
 * @throws {RangeError} below two values in a set.
 * @example welchDifference([10, 11, 12], [7, 8, 9], 0).difference // 3, df 4
 */
export function welchDifference(first: readonly number[], second: readonly number[], step: number): WelchDifference {
  const difference = mean(first) - mean(second);
  const a = standardDeviation(first) ** 2 / first.length;
  const b = standardDeviation(second) ** 2 / second.length;
  const pooled = first.length + second.length - 2;
  // Means that don't vary at all leave nothing to weigh the degrees of freedom by.
  const degreesOfFreedom =
    a + b > 0 ? (a + b) ** 2 / (a ** 2 / (first.length - 1) + b ** 2 / (second.length - 1)) : pooled;
  const least = (step / Math.sqrt(12)) * Math.sqrt(1 / first.length + 1 / second.length);
  const standardError = Math.max(Math.sqrt(a + b), least);
  const half = studentTQuantile(0.975, degreesOfFreedom) * standardError;
  return {
    difference,
    standardError,
    degreesOfFreedom,
    interval: { low: difference - half, high: difference + half },
  };
}
