import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type Placed, type Stack, highest, stackStones } from '@/components/charts/pile';

const WIDTH = 20;
const ROUNDING = 1e-6;

/** Values on a coarse grid as well as anywhere, so that ties and exact distances of one width happen. */
const stones = fc
  .array(
    fc.oneof(
      fc.integer({ min: 0, max: 40 }).map((at) => at * 10),
      fc.double({ min: 0, max: 400, noNaN: true }),
    ),
    {
      maxLength: 60,
    },
  )
  .map((values) => values.map((at, index) => ({ id: `s${index}`, at })));

const places = (stacks: Stack<Placed>[]) =>
  stacks.map(({ centre, stones: piled }) => ({ centre, ids: piled.map((stone) => stone.id) }));

describe('stackStones', () => {
  test('no stones make no stacks', () => {
    expect(stackStones([], WIDTH)).toEqual([]);
    expect(highest([])).toBe(0);
  });

  test('one stone stands at its value', () => {
    expect(stackStones([{ id: 'a', at: 7 }], WIDTH)).toEqual([{ centre: 7, stones: [{ id: 'a', at: 7 }] }]);
  });

  test('equal values stand on one another', () => {
    const equal = ['c', 'a', 'b'].map((id) => ({ id, at: 5 }));
    expect(places(stackStones(equal, WIDTH))).toEqual([{ centre: 5, ids: ['a', 'b', 'c'] }]);
  });

  test('a stack takes what lies within one width of its first and stands in the middle of it', () => {
    const swept = stackStones(
      [
        { id: 'a', at: 0 },
        { id: 'b', at: 20 },
        { id: 'c', at: 100 },
      ],
      WIDTH,
    );
    expect(places(swept)).toEqual([
      { centre: 10, ids: ['a', 'b'] },
      { centre: 100, ids: ['c'] },
    ]);
  });

  test('two stacks that would overlap part evenly where they hold as many stones', () => {
    const swept = stackStones(
      [
        { id: 'a', at: 0 },
        { id: 'b', at: 14 },
        { id: 'c', at: 22 },
        { id: 'd', at: 24 },
      ],
      WIDTH,
    );
    // Middles 7 and 23 are 16 apart; 4 more are needed, 2 from each.
    expect(swept.map((stack) => stack.centre)).toEqual([5, 25]);
  });

  test('a heavy stack pushes a light one no farther than its stones reach', () => {
    const light = [0, 20].map((at, index) => ({ id: `l${index}`, at }));
    const heavy = Array.from({ length: 50 }, (_, index) => ({ id: `h${index}`, at: 20.5 }));
    // The stone at 20 may stand at 10 at the lowest, so the heavy stack gives way, to 30.
    expect(stackStones([...light, ...heavy], WIDTH).map((stack) => stack.centre)).toEqual([10, 30]);
  });

  test('stones never overlap: stacks stand at least one width apart', () => {
    fc.assert(
      fc.property(stones, (any) => {
        const centres = stackStones(any, WIDTH).map((stack) => stack.centre);
        centres.slice(1).forEach((centre, index) => {
          expect(centre - (centres[index] ?? 0)).toBeGreaterThanOrEqual(WIDTH - ROUNDING);
        });
      }),
    );
  });

  test('no stone leaves its value by more than half its width', () => {
    fc.assert(
      fc.property(stones, (any) => {
        for (const { centre, stones: piled } of stackStones(any, WIDTH)) {
          for (const { at } of piled) expect(Math.abs(centre - at)).toBeLessThanOrEqual(WIDTH / 2 + ROUNDING);
        }
      }),
    );
  });

  test('every stone is piled once, whatever order they come in', () => {
    const shuffled = stones.chain((any) =>
      fc.tuple(fc.constant(any), fc.shuffledSubarray(any, { minLength: any.length, maxLength: any.length })),
    );
    fc.assert(
      fc.property(shuffled, ([one, other]) => {
        const piled = places(stackStones(one, WIDTH));
        expect(piled).toEqual(places(stackStones(other, WIDTH)));
        expect(piled.flatMap((stack) => stack.ids).sort()).toEqual(one.map((stone) => stone.id).sort());
      }),
    );
  });
});
