import { CompensatedSum } from './compensated-sum';
import { mean } from './mean';

/**
 * The sample standard deviation (n − 1), by the corrected two-pass algorithm: a sum of squares minus a squared sum can
 * turn negative where the values are large and close together.
 *
 * Method: Chan, Golub and LeVeque (1983), corrected two-pass. Source of the check: NIST StRD.
 * @param values n ≥ 2; a NaN among them makes the result NaN.
 * @throws {RangeError} below two values.
 * @example standardDeviation([10000001, 10000003, 10000002]) // 1
 */
export function standardDeviation(values: ArrayLike<number>): number {
  if (values.length < 2) throw new RangeError('A standard deviation needs two values or more.');
  const centre = mean(values);
  const squares = new CompensatedSum();
  let rest = 0;
  for (let i = 0; i < values.length; i += 1) {
    const distance = (values[i] as number) - centre;
    squares.add(distance * distance);
    rest += distance;
  }
  return Math.sqrt(Math.max(0, squares.value - (rest * rest) / values.length) / (values.length - 1));
}
