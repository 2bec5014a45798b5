import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { changePoints, segmentCost } from '@/lib/measurement/phases/change-points';
import fromR from '@/tests/reference/change-points.json';
import { check, fridge } from '../reference';

/** The penalised squares of a division, by their definition. */
function costOf(values: readonly number[], starts: readonly number[], penalty: number): number {
  const edges = [0, ...starts, values.length];
  const squares = edges.slice(0, -1).map((first, i) => {
    const part = values.slice(first, edges[i + 1]);
    const mean = part.reduce((sum, value) => sum + value, 0) / part.length;
    return part.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  });
  return squares.reduce((sum, value) => sum + value, 0) + penalty * starts.length;
}

/** The least cost over every division, tried one by one. */
function bruteForce(values: readonly number[], penalty: number, least: number): number {
  const from = (first: number): number[][] => {
    const whole = values.length - first >= least ? [[]] : [];
    const cuts: number[][] = [];
    for (let cut = first + least; values.length - cut >= least; cut += 1) {
      for (const rest of from(cut)) cuts.push([cut, ...rest]);
    }
    return [...whole, ...cuts];
  };
  return Math.min(...from(0).map((starts) => costOf(values, starts, penalty)));
}

describe('search for changes', () => {
  it('has the example of its docstring', () => {
    expect(changePoints([0, 0, 0, 9, 9, 9], 1, 2)).toEqual([3]);
    expect(segmentCost([1, 3])(0, 2)).toBeCloseTo(2, 12);
  });

  it.each([10, 12.305465, 50, 500, 5000])(
    'finds 60, 70, 190, 280, 290, 410 in the refrigerator at a penalty of %d (R changepoint, strucchange, DNAcopy)',
    (penalty) => {
      const { expected } = check('cp.fridge') as { expected: { change_points_last_index_of_segment_1based: number[] } };
      expect(changePoints(fridge, penalty, 3)).toEqual(expected.change_points_last_index_of_segment_1based);
    },
  );

  it('finds one change in the Nile’s flow, after 1898, with the squares that R finds', () => {
    const { values, before, rss0, rss1 } = fromR.nile;
    const variance = rss0 / values.length;
    expect(changePoints(values, 3 * variance * Math.log(values.length), 3)).toEqual([before]);
    expect(1871 + before - 1).toBe(1898);
    const cost = segmentCost(values);
    expect(cost(0, 100)).toBeCloseTo(rss0, 6);
    expect(cost(0, before) + cost(before, 100)).toBeCloseTo(rss1, 6);
    const published = check('cp.nile') as { expected: { RSS0: number; RSS1: number; break_index: number } };
    expect(published.expected.break_index).toBe(before);
    expect(published.expected.RSS0).toBeCloseTo(rss0, 6);
    expect(published.expected.RSS1).toBeCloseTo(rss1, 6);
  });

  it.each(fromR.series.map((entry, i) => [i, entry] as const))(
    'costs no more than the best of all divisions by R, series %i (change-points.R)',
    (_, { values, penalty, least, cost }) => {
      const starts = changePoints(values, penalty, least);
      expect(costOf(values, starts, penalty)).toBeCloseTo(cost, 8);
      expect([...starts, values.length].every((edge, i) => edge - (starts[i - 1] ?? 0) >= least)).toBe(true);
    },
  );

  it('equals every division tried one by one, on short series', () => {
    const values = fc.array(fc.integer({ min: 0, max: 9 }), { minLength: 1, maxLength: 14 });
    fc.assert(
      fc.property(
        values,
        fc.double({ min: 0, max: 40, noNaN: true }),
        fc.integer({ min: 1, max: 4 }),
        (x, penalty, m) => {
          const starts = changePoints(x, penalty, m);
          if (x.length < m) expect(starts).toEqual([]);
          else expect(costOf(x, starts, penalty)).toBeCloseTo(bruteForce(x, penalty, m), 7);
        },
      ),
    );
  });

  it('keeps a start that is beaten until a whole segment fits behind what beats it', () => {
    const values = [3, 5, 7, 2, 1, 6, 3, 2, 7, 4, 5, 3, 0, 7, 3, 5, 1, 4, 9];
    expect(costOf(values, changePoints(values, 0.1, 4), 0.1)).toBeCloseTo(bruteForce(values, 0.1, 4), 9);
  });

  it('never gains by moving: a shift of the whole series changes nothing', () => {
    expect(
      changePoints(
        fridge.map((watts) => watts + 1e6),
        500,
        3,
      ),
    ).toEqual([60, 70, 190, 280, 290, 410]);
  });
});
