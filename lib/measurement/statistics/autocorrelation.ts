import { CompensatedSum } from './compensated-sum';
import { mean } from './mean';

/**
 * The autocorrelation at a lag: Σ (y_i − ȳ)(y_{i−lag} − ȳ) / Σ (y_i − ȳ)².
 *
 * Source: NIST StRD, univariate summary statistics, lag-1 autocorrelation.
 * @param values n ≥ 2, in order; a NaN among them makes the result NaN.
 * @returns 0 where all values are equal: nothing varies, so nothing follows from the one before.
 * @throws {RangeError} below two values, or where the lag is not between 1 and n − 1.
 * @example autocorrelation([10000001, 10000003, 10000002], 1) // -0.5
 */
export function autocorrelation(values: ArrayLike<number>, lag: number): number {
  if (values.length < 2) throw new RangeError('An autocorrelation needs two values or more.');
  if (!Number.isInteger(lag) || lag < 1 || lag >= values.length) {
    throw new RangeError('The lag is a whole number from 1 to one less than the number of values.');
  }
  const centre = mean(values);
  const products = new CompensatedSum();
  const squares = new CompensatedSum();
  for (let i = 0; i < values.length; i += 1) {
    const distance = (values[i] as number) - centre;
    squares.add(distance * distance);
    if (i >= lag) products.add(distance * ((values[i - lag] as number) - centre));
  }
  return squares.value === 0 ? 0 : products.value / squares.value;
}
