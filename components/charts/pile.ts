/** What is to be piled: an id and the place of its value along the picture, both in pixels and in any order. */
export interface Placed {
  id: string;
  at: number;
}

/** Stones that stand on one another, from the ground up, with the middle of the stack. */
export interface Stack<T extends Placed> {
  centre: number;
  stones: T[];
}

/**
 * Wilkinson's sweep (L. Wilkinson, "Dot plots", The American Statistician 53, 1999): from the left, a stack takes every
 * value within one stone's width of its first, and stands at the middle of what it took.
 *
 * Two neighbouring middles can then lie closer than a stone is wide. Stacks are moved apart as little as possible (least
 * squares, weighted by stones), but never so far that a stone leaves its value by more than half its width. That is
 * always possible, since the first values of two stacks are more than a width apart.
 *
 * @param width of a stone, in the unit of `at`; greater than 0
 * @example stackStones([{ id: 'a', at: 0 }, { id: 'b', at: 6 }, { id: 'c', at: 30 }], 10)
 *   // → [{ centre: 3, stones: [a, b] }, { centre: 30, stones: [c] }]
 */
export function stackStones<T extends Placed>(stones: readonly T[], width: number): Stack<T>[] {
  const stacks = sweep(stones, width);
  // Measured from its place in a row of touching stacks, each may lie anywhere that is not left of the one before.
  const wanted = stacks.map((stack, index) => stack.centre - index * width);
  const apart = nonDecreasing(
    wanted,
    stacks.map((stack) => stack.stones.length),
  );
  let floor = -Infinity;
  return stacks.map(({ stones: piled }, index) => {
    const shift = index * width;
    const first = piled[0]?.at ?? 0;
    const last = piled.at(-1)?.at ?? first;
    floor = Math.max(floor, last - width / 2 - shift);
    const ceiling = first + width / 2 - shift;
    const place = Math.min(Math.max(apart[index] ?? floor, floor), ceiling);
    return { centre: place + shift, stones: piled };
  });
}

function sweep<T extends Placed>(stones: readonly T[], width: number): Stack<T>[] {
  const ordered = [...stones].sort((one, other) => one.at - other.at || (one.id < other.id ? -1 : 1));
  const stacks: Stack<T>[] = [];
  for (const stone of ordered) {
    const stack = stacks.at(-1);
    const first = stack?.stones[0];
    if (stack && first && stone.at - first.at <= width) {
      stack.stones.push(stone);
      stack.centre = (first.at + stone.at) / 2;
    } else {
      stacks.push({ centre: stone.at, stones: [stone] });
    }
  }
  return stacks;
}

/** The non-decreasing sequence closest to `values` in weighted least squares, by pooling adjacent violators. */
function nonDecreasing(values: readonly number[], weights: readonly number[]): number[] {
  const pools: { mean: number; weight: number; length: number }[] = [];
  values.forEach((value, index) => {
    let pool = { mean: value, weight: weights[index] ?? 1, length: 1 };
    for (let before = pools.at(-1); before && before.mean > pool.mean; before = pools.at(-1)) {
      pools.pop();
      const weight = before.weight + pool.weight;
      pool = {
        mean: (before.mean * before.weight + pool.mean * pool.weight) / weight,
        weight,
        length: before.length + pool.length,
      };
    }
    pools.push(pool);
  });
  return pools.flatMap((pool) => Array<number>(pool.length).fill(pool.mean));
}

/** How many stones stand on one another in the highest stack. */
export function highest(stacks: readonly Stack<Placed>[]): number {
  return stacks.reduce((most, stack) => Math.max(most, stack.stones.length), 0);
}
