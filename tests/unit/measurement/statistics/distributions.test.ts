import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { incompleteBeta, logBeta, logGamma } from '@/lib/measurement/statistics/incomplete-beta';
import { normalCdf, normalQuantile, quantileByBisection } from '@/lib/measurement/statistics/normal';
import { studentTCdf, studentTQuantile } from '@/lib/measurement/statistics/student-t';
import { check, expected, fromR, relativeError, row } from './reference';

describe('the normal distribution', () => {
  it('agrees with R’s pnorm to 12 digits, out to 37 standard deviations', () => {
    for (const [z = 0, p = 0] of fromR.normalCdf.map(row)) {
      expect(relativeError(normalCdf(z), p)).toBeLessThan(2e-12);
    }
  });

  it('has R’s quantiles', () => {
    for (const [p = 0, z = 0] of fromR.normalQuantile.map(row)) {
      expect(Math.abs(normalQuantile(p) - z)).toBeLessThan(1e-12);
    }
  });

  it.each(['0.8', '0.9', '0.95', '0.99', '0.999'])('reaches %s where JCGM 106:2012 table 1 says (from memory)', (p) => {
    const { tolerance } = check(`jcgm106.z.${p}`);
    expect(Math.abs(normalQuantile(Number(p)) - expected(`jcgm106.z.${p}`))).toBeLessThan(Number(tolerance));
  });

  it('gives the conformance probabilities of JCGM 106:2012 7.4: 0.92 and 0.989 (from memory)', () => {
    expect(Math.abs(normalCdf(1.4) - expected('jcgm106.zener'))).toBeLessThan(0.005);
    expect(Math.abs(normalCdf(2.2906976744186034) - expected('jcgm106.burst'))).toBeLessThan(0.0005);
  });

  it('sets the speed limit of JCGM 106:2012 8.3.3 at 107 km/h (from memory)', () => {
    expect(Math.abs(100 / (1 - normalQuantile(0.999) * 0.02) - expected('jcgm106.speed'))).toBeLessThan(0.5);
  });

  it('leaves 0.97725 under a limit two standard uncertainties away (any normal table)', () => {
    expect(Math.abs(normalCdf(2) - expected('guard.2u'))).toBeLessThan(5e-6);
  });

  it('is 0.5 in the middle, 0 and 1 at the ends, and throws on NaN', () => {
    expect(normalCdf(0)).toBe(0.5);
    expect(normalCdf(-Infinity)).toBe(0);
    expect(normalCdf(-41)).toBe(0);
    expect(normalCdf(Infinity)).toBe(1);
    expect(() => normalCdf(Number.NaN)).toThrow(new RangeError('z is not a number.'));
  });

  it('has no seam where its two methods meet', () => {
    expect(relativeError(normalCdf(-3 - 1e-12), normalCdf(-3))).toBeLessThan(1e-11);
    expect(normalQuantile(0.975)).toBeCloseTo(1.959963984540054, 13);
  });
});

describe('a quantile by bisection', () => {
  it('undoes the distribution', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-9, max: 1 - 1e-9, noNaN: true }), (p) => {
        expect(normalCdf(normalQuantile(p))).toBeCloseTo(p, 12);
      }),
    );
  });

  it('is 0 in the middle and symmetric about it', () => {
    expect(quantileByBisection(normalCdf, 0.5)).toBe(0);
    expect(normalQuantile(0.25)).toBe(-normalQuantile(0.75));
  });

  it.each([0, 1, -1, 2, Number.NaN])('throws at a probability of %s', (p) => {
    expect(() => normalQuantile(p)).toThrow(new RangeError('A probability lies strictly between 0 and 1.'));
  });
});

describe('Student’s t', () => {
  it('agrees with R’s pt from 0.5 to 1,000,000 degrees of freedom', () => {
    for (const [df = 0, t = 0, p = 0] of fromR.studentTCdf.map(row)) {
      expect(relativeError(studentTCdf(t, df), p)).toBeLessThan(df > 1000 ? 5e-11 : 2e-13);
    }
  });

  it('has R’s quantiles', () => {
    for (const [df = 0, p = 0, t = 0] of fromR.studentTQuantile.map(row)) {
      expect(relativeError(studentTQuantile(p, df), t)).toBeLessThan(2e-12);
    }
  });

  it.each([
    [2, 12.7],
    [3, 4.3],
    [5, 2.8],
  ])('of %i readings covers 95 %% within %f standard errors', (n, factor) => {
    expect(studentTQuantile(0.975, n - 1)).toBeCloseTo(factor, 1);
  });

  it('with one degree of freedom is Cauchy’s distribution', () => {
    for (const t of [-30, -1, -1e-9, 0.2, 5]) {
      expect(studentTCdf(t, 1)).toBeCloseTo(0.5 + Math.atan(t) / Math.PI, 14);
    }
    expect(studentTQuantile(0.975, 1)).toBeCloseTo(12.706204736174707, 10);
  });

  it('keeps the digits of a t near 0', () => {
    expect(studentTCdf(1e-9, 1) - 0.5).toBeCloseTo(1e-9 / Math.PI, 16);
    expect(studentTCdf(1e-200, 5)).toBe(0.5);
  });

  it('is the normal distribution at infinitely many degrees of freedom, and all but from ten million', () => {
    expect(studentTCdf(1.3, Infinity)).toBe(normalCdf(1.3));
    expect(studentTCdf(-2, 1e8)).toBe(normalCdf(-2));
    expect(studentTCdf(-2, 9e6)).toBeCloseTo(normalCdf(-2), 6);
    expect(studentTCdf(-2, 1e7)).not.toBe(normalCdf(-2));
  });

  it('is 0.5 at 0, 0 and 1 at the ends, and has no seam at 1', () => {
    expect(studentTCdf(0, 5)).toBe(0.5);
    expect(studentTCdf(-Infinity, 4)).toBe(0);
    expect(studentTCdf(Infinity, 4)).toBe(1);
    expect(studentTCdf(1e200, 4)).toBe(1);
    expect(studentTCdf(1, 4)).toBeCloseTo(studentTCdf(1 - 1e-14, 4), 13);
    expect(studentTCdf(-1, 4)).toBeCloseTo(1 - studentTCdf(1, 4), 14);
  });

  it('throws on NaN and on degrees of freedom that are not above 0', () => {
    expect(() => studentTCdf(Number.NaN, 4)).toThrow(new RangeError('t is not a number.'));
    for (const df of [0, -1, Number.NaN]) {
      expect(() => studentTCdf(1, df)).toThrow(new RangeError('Degrees of freedom lie above 0.'));
    }
    expect(() => studentTQuantile(0, 4)).toThrow(RangeError);
  });
});

describe('the incomplete beta function', () => {
  it('agrees with R’s pbeta', () => {
    for (const [x = 0, a = 0, b = 0, p = 0] of fromR.incompleteBeta.map(row)) {
      expect(Math.abs(incompleteBeta(x, a, b) - p)).toBeLessThan(1e-13);
      if (p > 1e-200) expect(relativeError(incompleteBeta(x, a, b), p)).toBeLessThan(1e-11);
    }
  });

  it('is the worked example’s, and its own mirror', () => {
    expect(incompleteBeta(0.5, 2, 2)).toBeCloseTo(0.5, 15);
    expect(incompleteBeta(0.2, 3, 7)).toBeCloseTo(1 - incompleteBeta(0.8, 7, 3), 14);
  });

  it('uses a complement that is known better than 1 − x', () => {
    // I_x(a, 1) = x^a; the rounding of x itself costs a · 10⁻¹⁶ of it.
    const complement = 1e-6;
    const wanted = Math.exp(1e6 * Math.log1p(-complement));
    expect(relativeError(incompleteBeta(1 - complement, 1e6, 1, complement), wanted)).toBeLessThan(1e-12);
    expect(relativeError(incompleteBeta(1 - complement, 1e6, 1), wanted)).toBeGreaterThan(1e-12);
  });

  it('throws outside its range', () => {
    const message = 'I_x(a, b) needs 0 ≤ x ≤ 1, a > 0, b > 0.';
    for (const [x, a, b] of [
      [-0.1, 1, 1],
      [1.1, 1, 1],
      [0.5, 0, 1],
      [0.5, 1, 0],
      [Number.NaN, 1, 1],
    ] as const) {
      expect(() => incompleteBeta(x, a, b)).toThrow(new RangeError(message));
    }
  });
});

describe('the logarithms of Γ and of B', () => {
  it('are those of factorials', () => {
    expect(logGamma(1)).toBeCloseTo(0, 14);
    expect(logGamma(11)).toBeCloseTo(Math.log(3_628_800), 12);
    expect(logGamma(0.5)).toBeCloseTo(Math.log(Math.sqrt(Math.PI)), 14);
    expect(logGamma(0.25)).toBeCloseTo(1.2880225246980774, 13);
  });

  it('agree with whole-number combinations on both sides of where the method changes', () => {
    expect(logBeta(1, 1)).toBeCloseTo(0, 14);
    for (const large of [98, 99, 100, 101, 5000]) {
      // B(m, 2) = 1/(m (m + 1)).
      expect(logBeta(large, 2)).toBeCloseTo(-Math.log(large * (large + 1)), 11);
      expect(logBeta(2, large)).toBe(logBeta(large, 2));
    }
    expect(logBeta(1e6, 2)).toBeCloseTo(-Math.log(1e6 * (1e6 + 1)), 12);
  });
});
