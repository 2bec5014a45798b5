import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type Stone, above, shapeStone, stonePath, touching } from '@/components/charts/stone';

const WIDTH = 20;
const id = fc.string({ minLength: 1, maxLength: 16 });

const span = (stone: Stone, axis: 0 | 1) => {
  const values = stone.outline.map((point) => point[axis]);
  return Math.max(...values) - Math.min(...values);
};

describe('a stone', () => {
  test('always looks the same for one id, and different for another', () => {
    expect(stonePath(shapeStone('ina', WIDTH), 0, 0)).toBe(stonePath(shapeStone('ina', WIDTH), 0, 0));
    expect(stonePath(shapeStone('ina', WIDTH), 0, 0)).not.toBe(stonePath(shapeStone('orla', WIDTH), 0, 0));
  });

  test('is never wider than its place, and about two thirds as high as wide', () => {
    fc.assert(
      fc.property(id, (any) => {
        const stone = shapeStone(any, WIDTH);
        expect(span(stone, 0)).toBeLessThanOrEqual(WIDTH + 1e-9);
        expect(span(stone, 0)).toBeGreaterThanOrEqual(0.85 * WIDTH);
        expect(span(stone, 1) / span(stone, 0)).toBeGreaterThan(0.55);
        expect(span(stone, 1) / span(stone, 0)).toBeLessThan(0.75);
      }),
    );
  });

  test('has all three tones among a hundred ids', () => {
    const tones = new Set(Array.from({ length: 100 }, (_, index) => shapeStone(`m${index}`, WIDTH).tone));
    expect([...tones].sort()).toEqual([0, 1, 2]);
  });

  test('stands on the ground: nothing of it lies below', () => {
    const stone = shapeStone('ina', WIDTH);
    expect(Math.max(...stone.outline.map(([, y]) => y - above(stone)))).toBeCloseTo(0, 9);
  });

  test('set on another it touches it and does not sink in by more than a quarter of a pixel', () => {
    fc.assert(
      fc.property(id, id, (one, other) => {
        const lower = shapeStone(one, WIDTH);
        const upper = shapeStone(other, WIDTH);
        const rise = touching(lower, upper);
        // An independent look, on a finer grid of places than the one that set it down.
        let closest = Infinity;
        for (let x = -WIDTH / 2; x <= WIDTH / 2; x += 0.05) {
          const roof = crossing(lower, x, Math.min);
          const floor = crossing(upper, x, Math.max);
          if (roof !== null && floor !== null) closest = Math.min(closest, rise + roof - floor);
        }
        expect(closest).toBeGreaterThan(-0.25);
        expect(closest).toBeLessThan(0.25);
      }),
      { numRuns: 40 },
    );
  });
});

function crossing(stone: Stone, x: number, pick: (...values: number[]) => number): number | null {
  const found = stone.outline.flatMap((from, index) => {
    const to = stone.outline[(index + 1) % stone.outline.length];
    if (!to || (from[0] - x) * (to[0] - x) > 0 || from[0] === to[0]) return [];
    return [from[1] + ((x - from[0]) / (to[0] - from[0])) * (to[1] - from[1])];
  });
  return found.length > 0 ? pick(...found) : null;
}
