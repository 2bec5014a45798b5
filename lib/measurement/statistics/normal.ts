/**
 * The standard normal distribution Φ(z).
 *
 * Method: Marsaglia's (2004) series around 0, the tail's continued fraction beyond 3 standard deviations, where the
 * series would lose the digits of a small probability.
 * Source of the check: R's pnorm; the tables of JCGM 106:2012.
 * @throws {RangeError} where z is not a number.
 * @example normalCdf(0) // 0.5
 */
export function normalCdf(z: number): number {
  if (Number.isNaN(z)) throw new RangeError('z is not a number.');
  if (z > 3) return 1 - normalCdf(-z);
  if (z < -40) return 0;
  const density = Math.exp(-0.5 * z * z) / Math.sqrt(2 * Math.PI);
  if (z < -3) return density / tailFraction(-z);
  let sum = z;
  let term = z;
  for (let i = 3; sum !== sum + term; i += 2) {
    term *= (z * z) / i;
    sum += term;
  }
  return 0.5 + sum * density;
}

/** z + 1/(z + 2/(z + 3/…)), from z = 3: the hundredth level no longer changes the last digit there. */
function tailFraction(z: number): number {
  let fraction = z;
  for (let k = 100; k >= 1; k -= 1) fraction = z + k / fraction;
  return fraction;
}

/**
 * The z with Φ(z) = p, by bisection.
 *
 * @throws {RangeError} where p is not strictly between 0 and 1.
 * @example normalQuantile(0.975) // 1.95996…
 */
export function normalQuantile(p: number): number {
  return quantileByBisection(normalCdf, p);
}

/** The point at which a rising distribution, symmetric about 0, reaches a probability. */
export function quantileByBisection(cdf: (x: number) => number, p: number): number {
  if (!(p > 0 && p < 1)) throw new RangeError('A probability lies strictly between 0 and 1.');
  if (p === 0.5) return 0;
  if (p > 0.5) return -quantileByBisection(cdf, 1 - p);
  let low = -1;
  while (cdf(low) > p) low *= 2;
  let high = 0;
  for (let step = 0; step < 200 && high - low > 1e-15 * -low; step += 1) {
    const middle = (low + high) / 2;
    if (cdf(middle) < p) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
