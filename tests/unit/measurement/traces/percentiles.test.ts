import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { weightedPercentiles } from '@/lib/measurement/traces/weighted-percentiles';
import { noiseFrom } from './build-trace';

/** The definition, by sorting everything. */
function bySorting(values: readonly number[], weights: readonly number[], share: number): number {
  const rows = values.map((value, i) => [value, weights[i] as number] as const).filter(([, weight]) => weight > 0);
  rows.sort((a, b) => a[0] - b[0]);
  const total = rows.reduce((sum, [, weight]) => sum + weight, 0);
  let reached = 0;
  for (const [value, weight] of rows) {
    reached += weight;
    if (reached >= share * total - 1e-9 * total) return value;
  }
  throw new Error('unreachable');
}

const of = (values: readonly number[], weights: readonly number[], shares: readonly number[]) =>
  weightedPercentiles(Float64Array.from(values), Float64Array.from(weights), shares);

describe('time-weighted percentiles', () => {
  it('has the example of its docstring', () => {
    expect(of([1, 2, 3], [1, 1, 2], [0.5])).toEqual([2]);
  });

  it('takes the smallest value that reaches the share', () => {
    expect(of([5, 1, 9], [1, 98, 1], [0.05, 0.5, 0.95, 1])).toEqual([1, 1, 1, 9]);
  });

  it('leaves out what no time stands for', () => {
    expect(of([1, 2, 3], [0, 1, 0], [0, 0.5, 1])).toEqual([2, 2, 2]);
  });

  it('refuses where no time counts', () => {
    expect(() => of([1, 2], [0, 0], [0.5])).toThrow(RangeError);
  });

  it('equals sorting everything on short columns', () => {
    const rows = fc.array(fc.tuple(fc.integer({ min: -50, max: 50 }), fc.integer({ min: 0, max: 9 })), {
      minLength: 1,
    });
    fc.assert(
      fc.property(rows, fc.double({ min: 0, max: 1, noNaN: true }), (pairs, share) => {
        const values = pairs.map(([value]) => value);
        const weights = pairs.map(([, weight]) => weight);
        fc.pre(weights.some((weight) => weight > 0));
        expect(of(values, weights, [share])[0]).toBe(bySorting(values, weights, share));
      }),
    );
  });

  it.each([
    ['even noise', (noise: number) => noise],
    ['one far outlier', (noise: number, i: number) => (i === 7 ? 1e9 : noise)],
    ['two levels of one value each', (noise: number) => (noise > 0 ? 85 : 2)],
    ['one value', () => 43.2],
    ['steps of a logger', (noise: number) => Math.round(noise * 30)],
  ])('equals sorting everything on a long column: %s', (_, shape) => {
    const noise = noiseFrom(7);
    const values = Array.from({ length: 20_000 }, (__, i) => shape(noise(), i));
    const weights = values.map(() => 1 + Math.floor((noise() + 1) * 3));
    for (const share of [0, 0.05, 0.5, 0.95, 1]) {
      expect(of(values, weights, [share])[0]).toBe(bySorting(values, weights, share));
    }
  });
});
