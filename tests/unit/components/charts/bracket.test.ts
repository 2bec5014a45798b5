import { describe, expect, test } from 'vitest';
import { type Claim, layAxis } from '@/components/charts/axis';
import { layBracket, wrapWords } from '@/components/charts/bracket';

const WIDTH = 284;
const axis = layAxis({ domain: [50, 110], fixed: true, unit: 'W', width: WIDTH, stone: 20 });
const lay = (lower: number | null, upper: number | null, label = 'maker 60–75 W') =>
  layBracket({ lower, upper, label } satisfies Claim, axis, WIDTH);

/** Strokes down from the bar, and the tips of arrows, read from the path. */
const legs = (path: string) => [...path.matchAll(/M([\d.]+) [\d.]+V/g)].map(([, x]) => Number(x));
const tips = (path: string) => [...path.matchAll(/L([\d.]+) [\d.]+L/g)].map(([, x]) => Number(x));

describe('the claim’s bracket', () => {
  test('stands on two legs at the claim’s ends', () => {
    const { path } = lay(60, 75);
    expect(legs(path)).toEqual([axis.place(60), axis.place(75)]);
    expect(tips(path)).toEqual([]);
  });

  test('of "at most" has one leg at its value and an arrow to lower values', () => {
    const { path } = lay(null, 75);
    expect(legs(path)).toEqual([axis.place(75)]);
    expect(tips(path)).toHaveLength(1);
    expect(tips(path)[0]).toBeLessThan(axis.place(75));
  });

  test('of "at least" has one leg at its value and an arrow to higher values', () => {
    const { path } = lay(60, null);
    expect(legs(path)).toEqual([axis.place(60)]);
    expect(tips(path)[0]).toBeGreaterThan(axis.place(60));
  });

  test('with one end outside the scale has an arrow at that edge', () => {
    const { path } = lay(90, 400);
    expect(legs(path)).toEqual([axis.place(90)]);
    expect(tips(path)).toEqual([axis.range[1]]);
  });

  test.each([
    ['right', 400, 450, 1],
    ['left', 10, 20, 0],
  ] as const)('wholly outside sits at the %s edge with an arrow outwards and no leg', (_, lower, upper, edge) => {
    const { path, lines } = lay(lower, upper, `maker ${lower}–${upper} W`);
    expect(legs(path)).toEqual([]);
    expect(tips(path)).toEqual([axis.range[edge]]);
    expect(lines.join(' ')).toContain(`${lower}–${upper} W`);
  });

  test('of one stated value is one leg under a short bar', () => {
    const { path } = lay(70, 70);
    expect(legs(path)).toEqual([axis.place(70)]);
    expect(tips(path)).toEqual([]);
  });

  test.each([50, 80, 110])('keeps its words inside the picture at %i W', (value) => {
    const { textAt, textWidth } = lay(value, value, 'annual consumption read as a mean of 70 W');
    expect(textAt - textWidth / 2).toBeGreaterThanOrEqual(0);
    expect(textAt + textWidth / 2).toBeLessThanOrEqual(WIDTH);
  });
});

test('words wrap into lines that fit and lose nothing', () => {
  const text = 'maker “annual consumption, at least 241 kWh a year at 25 °C”, 0.66 kWh/d or more';
  const lines = wrapWords(text, 200);
  expect(lines.join(' ')).toBe(text);
  expect(Math.max(...lines.map((line) => line.length))).toBeLessThanOrEqual(200 / 7);
});
