import { describe, expect, test } from 'vitest';
import { summarise } from '@/components/charts/trace-summary';

/** Blocks of 10, 10, 30 and 10 seconds from 100. */
const level = { from: [100, 110, 120, 150], minimum: [1, 2, 3, 4], maximum: [10, 20, 30, 40], mean: [5, 6, 7, 8] };

describe('a trace in rows', () => {
  test('weights the mean by time and keeps the extremes', () => {
    expect(summarise(level, { from: 100, to: 160 }, 1, 160)).toEqual([
      { from: 100, to: 160, minimum: 1, maximum: 40, mean: (5 * 10 + 6 * 10 + 7 * 30 + 8 * 10) / 60 },
    ]);
  });

  test('counts of a block only the part inside the window', () => {
    expect(summarise(level, { from: 105, to: 115 }, 1, 160)[0]).toMatchObject({ mean: 5.5, minimum: 1, maximum: 20 });
  });

  test('leaves out stretches without readings', () => {
    const rows = summarise({ from: [100], minimum: [1], maximum: [2], mean: [1.5] }, { from: 100, to: 200 }, 4, 125);
    expect(rows.map((row) => [row.from, row.to])).toEqual([[100, 125]]);
  });

  test('counts a last block that has no length', () => {
    const single = { from: [100, 160], minimum: [1, 50], maximum: [1, 50], mean: [1, 50] };
    expect(summarise(single, { from: 100, to: 160 }, 1, 160)[0]?.maximum).toBe(50);
  });

  test('of an empty level has no rows', () => {
    expect(summarise({ from: [], minimum: [], maximum: [], mean: [] }, { from: 0, to: 1 }, 3, 1)).toEqual([]);
  });
});
