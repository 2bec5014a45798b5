const SMALLEST = 1e-300;
const CLOSE_ENOUGH = 4 * Number.EPSILON;
/** The fraction takes some √max(a, b) terms; this is enough up to a = 10⁷. */
const MOST_TERMS = 20_000;

/** Lanczos's coefficients for g = 7 with nine terms (Godfrey): some 15 digits. */
const LANCZOS = [
  0.99999999999980993, 676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059,
  12.507343278686905, -0.13857109526572012, 9.9843695780195716e-6, 1.5056327351493116e-7,
] as const;

/** ln Γ(x) for x > 0, by Lanczos's approximation. */
export function logGamma(x: number): number {
  if (x < 0.5) return Math.log(Math.PI / Math.sin(Math.PI * x)) - logGamma(1 - x);
  const shifted = x - 1;
  let sum: number = LANCZOS[0];
  for (let i = 1; i < LANCZOS.length; i += 1) sum += (LANCZOS[i] as number) / (shifted + i);
  const t = shifted + 7.5;
  return 0.5 * Math.log(2 * Math.PI) + (shifted + 0.5) * Math.log(t) - t + Math.log(sum);
}

/** From here on three terms of Stirling's series are exact to the last digit. */
const STIRLING_FROM = 100;

/**
 * ln B(a, b) = ln Γ(a) + ln Γ(b) − ln Γ(a + b). Where one of them is large, Γ(a + b)/Γ(a) is taken from Stirling's
 * series: the difference of two large logarithms would lose the digits that matter.
 *
 * @example logBeta(1, 1) // 0
 */
export function logBeta(a: number, b: number): number {
  const small = Math.min(a, b);
  const large = Math.max(a, b);
  if (large < STIRLING_FROM) return logGamma(a) + logGamma(b) - logGamma(a + b);
  const sum = large + small;
  const grown =
    (large - 0.5) * Math.log1p(small / large) + small * (Math.log(sum) - 1) + stirlingRest(sum) - stirlingRest(large);
  return logGamma(small) - grown;
}

function stirlingRest(x: number): number {
  return (1 / 12 - (1 / 360 - 1 / 1260 / x ** 2) / x ** 2) / x;
}

/**
 * The regularised incomplete beta function I_x(a, b), by its continued fraction.
 *
 * Method: modified Lentz; Abramowitz and Stegun 26.5.8.
 * @param x between 0 and 1; a and b above 0.
 * @param complement 1 − x, for a caller that knows it better than a subtraction from 1 does.
 * @throws {RangeError} outside those.
 * @example incompleteBeta(0.5, 2, 2) // 0.5
 */
export function incompleteBeta(x: number, a: number, b: number, complement = 1 - x): number {
  if (!(x >= 0 && x <= 1) || !(a > 0) || !(b > 0)) throw new RangeError('I_x(a, b) needs 0 ≤ x ≤ 1, a > 0, b > 0.');
  if (x === 0 || x === 1) return x;
  const logX = x < 0.5 ? Math.log(x) : Math.log1p(-complement);
  const logComplement = x < 0.5 ? Math.log1p(-x) : Math.log(complement);
  const front = Math.exp(a * logX + b * logComplement - logBeta(a, b));
  // The fraction converges fast on this side of the mean; the other side is its mirror.
  if (x < (a + 1) / (a + b + 2)) return (front * continuedFraction(x, a, b)) / a;
  return 1 - (front * continuedFraction(complement, b, a)) / b;
}

function continuedFraction(x: number, a: number, b: number): number {
  const kept = (value: number) => (Math.abs(value) < SMALLEST ? SMALLEST : value);
  let c = 1;
  let d = 1 / kept(1 - ((a + b) * x) / (a + 1));
  let h = d;
  for (let m = 1; m <= MOST_TERMS; m += 1) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / kept(1 + even * d);
    c = kept(1 + even / c);
    h *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / kept(1 + odd * d);
    c = kept(1 + odd / c);
    h *= d * c;
    if (Math.abs(d * c - 1) < CLOSE_ENOUGH) break;
  }
  return h;
}
