import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type PlotStone, layDotPlot, widestStone } from '@/components/charts/dot-plot-layout';

const stones = (values: readonly number[]): PlotStone[] => values.map((value, index) => ({ id: `m${index}`, value }));
const spread = (count: number) => stones(Array.from({ length: count }, (_, index) => 40 + (index % 37)));
const request = { unit: 'W', width: 284, pileHeight: 130 };

describe('the size of stones', () => {
  test.each([1, 6, 10, 14])('%i stones are 18 to 22 pixels wide', (count) => {
    expect(widestStone(count, false)).toBeGreaterThanOrEqual(18);
    expect(widestStone(count, false)).toBeLessThanOrEqual(22);
  });

  test('more than 40 are smaller than 40', () => {
    expect(widestStone(41, false)).toBeLessThan(widestStone(40, false));
  });

  test('14 stones at one value stay 18 pixels wide and make the picture higher', () => {
    const layout = layDotPlot({ ...request, stones: stones(Array<number>(14).fill(5)) });
    expect(layout.stoneWidth).toBeGreaterThanOrEqual(18);
    expect(Math.min(...layout.stones.map(({ y }) => y))).toBeGreaterThan(0);
  });
});

test('200 stones are stones, 201 are the outline of their pile', () => {
  const last = layDotPlot({ ...request, stones: spread(200) });
  expect([last.stones.length, last.outline]).toEqual([200, null]);
  const first = layDotPlot({ ...request, stones: spread(201) });
  expect(first.stones).toEqual([]);
  expect(first.outline).toMatch(/^M.*Z$/);
});

test('the outline reaches as high as its highest stack, and no higher than the pile may', () => {
  const layout = layDotPlot({ ...request, stones: spread(900) });
  const tops = [...(layout.outline ?? '').matchAll(/V([\d.]+)/g)].map(([, top]) => Number(top));
  expect(layout.ground - Math.min(...tops)).toBeLessThanOrEqual(request.pileHeight);
  expect(layout.ground - Math.min(...tops)).toBeGreaterThan(20);
});

test('everything stays inside the picture, whatever the values', () => {
  const value = fc.double({ min: 0, max: 3000, noNaN: true });
  fc.assert(
    fc.property(fc.array(value, { minLength: 1, maxLength: 50 }), fc.constantFrom(284, 350, 640), (values, width) => {
      const layout = layDotPlot({ ...request, width, stones: stones(values) });
      for (const { shape, x, y } of layout.stones) {
        for (const [dx, dy] of shape.outline) {
          expect(x + dx).toBeGreaterThanOrEqual(-1e-6);
          expect(x + dx).toBeLessThanOrEqual(width + 1e-6);
          expect(y + dy).toBeGreaterThanOrEqual(0);
          expect(y + dy).toBeLessThanOrEqual(layout.ground + 1e-6);
        }
      }
    }),
    { numRuns: 60 },
  );
});

test('labels of the axis never touch, and the unit has room after the last', () => {
  const any = fc.record({
    from: fc.double({ min: 0, max: 5000, noNaN: true }),
    length: fc.double({ min: 0.001, max: 5000, noNaN: true }),
    unit: fc.constantFrom('W', 'kWh/d', 'Wh/use'),
  });
  fc.assert(
    fc.property(any, ({ from, length, unit }) => {
      const { axis, width } = layDotPlot({ ...request, unit, stones: stones([from, from + length]) });
      const boxes = axis.ticks.map(({ at, label }) => [at - label.length * 3.6, at + label.length * 3.6] as const);
      boxes.slice(1).forEach(([left], index) => expect(left).toBeGreaterThan((boxes[index]?.[1] ?? 0) + 4));
      const [first, last] = [boxes[0], boxes.at(-1)];
      expect(first?.[0]).toBeGreaterThanOrEqual(-1);
      expect((last?.[1] ?? 0) + unit.length * 7.2).toBeLessThanOrEqual(width + 1);
    }),
  );
});

test('the small form has neither axis labels nor a claim, and fits in 120 by 28', () => {
  const claim = { lower: 1, upper: 2, label: 'maker 1–2 W' };
  const layout = layDotPlot({ stones: spread(9), claim, unit: 'W', width: 120, pileHeight: 20, bare: true });
  expect([layout.width, layout.height, layout.bracket, layout.axis.ticks]).toEqual([120, 28, null, []]);
});
