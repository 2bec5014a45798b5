import { compensatedSum } from './compensated-sum';

/**
 * The arithmetic mean, in two passes: the second adds the mean of what the first left over.
 *
 * Source of the check: NIST StRD, univariate summary statistics (NumAcc1 to NumAcc4, Michelso).
 * @param values n ≥ 1; a NaN among them makes the mean NaN.
 * @throws {RangeError} on an empty list.
 * @example mean([10000001, 10000003, 10000002]) // 10000002
 */
export function mean(values: ArrayLike<number>): number {
  if (values.length === 0) throw new RangeError('The mean of no values is not defined.');
  const first = compensatedSum(values) / values.length;
  let rest = 0;
  for (let i = 0; i < values.length; i += 1) rest += (values[i] as number) - first;
  return first + rest / values.length;
}
