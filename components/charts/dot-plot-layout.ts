import { type Axis, type Claim, chooseDomain, layAxis } from './axis';
import { type Bracket, layBracket } from './bracket';
import { type Placed, type Stack, highest, stackStones } from './pile';
import { type Stone, above, shapeStone, touching } from './stone';

export interface PlotStone {
  /** The contributor's or device's id: decides the stone's look, so that it always looks the same. */
  id: string;
  value: number;
  /** Far from the others: a rust ring. Counts like any other. */
  flagged?: boolean;
  /** Left out of the figure by a moderator, with a reason: hollow. */
  setAside?: boolean;
  /** Below what the instrument can read: the true value is at most this. */
  atMost?: boolean;
  /** Who or what it is: "Ina Tolvers". */
  label?: string;
}

export interface PlacedStone {
  stone: PlotStone;
  shape: Stone;
  x: number;
  y: number;
}

export interface DotPlotLayout {
  width: number;
  height: number;
  /** The y of the ground. */
  ground: number;
  axis: Axis;
  bracket: Bracket | null;
  stoneWidth: number;
  stones: PlacedStone[];
  /** Instead of stones where there are too many to tell apart: the pile's outline. */
  outline: string | null;
}

export interface LayoutRequest {
  stones: readonly PlotStone[];
  claim?: Claim;
  scale?: readonly [number, number];
  unit: string;
  width: number;
  /** The pile gets smaller stones before it gets higher than this. */
  pileHeight: number;
  /** Without axis and claim: the form of a table cell. */
  bare?: boolean;
}

/** The height of a stone, in widths. */
const RATIO = 0.66;
const MOST_STONES = 200;
/** Stacks this close, in pixels, have no visible ground between them. */
const TOUCHING = 0.75;
const BELOW_GROUND = 32;
const BARE_BELOW_GROUND = 8;

/** The largest stone for a number of them; few stones are large enough to be told from dots. */
export function widestStone(count: number, bare: boolean): number {
  if (bare) return count <= 12 ? 10 : count <= 40 ? 7 : 4;
  if (count < 15) return 22 - Math.max(0, count - 6) * 0.5;
  if (count <= 40) return 17 - ((count - 15) * 4) / 25;
  return count <= MOST_STONES ? 9 - ((count - 41) * 4) / 159 : 4;
}

/** Where everything stands. Pure: the same stones give the same picture in any order. */
export function layDotPlot(request: LayoutRequest): DotPlotLayout {
  const { stones, claim, scale, unit, width, bare = false } = request;
  const values = stones.map((stone) => stone.value);
  const own = chooseDomain(values, bare ? undefined : claim);
  const domain: [number, number] = scale ? [Math.min(scale[0], ...values), Math.max(scale[1], ...values)] : own;
  const widest = widestStone(stones.length, bare);
  const axis = bare
    ? bareAxis(domain, width, widest)
    : layAxis({ domain, fixed: scale !== undefined, unit, width, stone: widest });
  // A few stones stay large and may pile higher; they are the ones that must not look like dots.
  const few = !bare && stones.length < 15;
  const { stacks, stoneWidth } = pileInto(stones, axis, widest, request.pileHeight, few ? 18 : 3);
  const bracket = claim && !bare ? layBracket(claim, axis, width) : null;
  const tooHigh = !few && highest(stacks) * stoneWidth * RATIO > request.pileHeight + 1;
  const many = stones.length > MOST_STONES || tooHigh;
  const shaped = many ? [] : stacks.map((stack) => shapeStack(stack, stoneWidth));
  const step = Math.min(stoneWidth * RATIO, request.pileHeight / Math.max(1, highest(stacks)));
  const pile = many ? highest(stacks) * step : Math.max(0, ...shaped.flat().map(({ top }) => top));
  const ground = bare ? request.pileHeight : Math.ceil((bracket ? bracket.height + 8 : 4) + Math.max(pile, 26));
  return {
    width,
    height: ground + (bare ? BARE_BELOW_GROUND : BELOW_GROUND),
    ground,
    axis,
    bracket,
    stoneWidth,
    stones: shaped.flat().map(({ stone, shape, x, height }) => ({ stone, shape, x, y: ground - height })),
    outline: many ? outlineOf(stacks, stoneWidth, step, ground) : null,
  };
}

function bareAxis(domain: [number, number], width: number, stone: number): Axis {
  const axis = layAxis({ domain, fixed: true, unit: '', width, stone });
  const range: [number, number] = [stone, width - stone];
  const share = (value: number) => (value - domain[0]) / (domain[1] - domain[0] || 1);
  const place = (value: number) => range[0] + Math.min(1, Math.max(0, share(value))) * (range[1] - range[0]);
  return { ...axis, range, place, ticks: [] };
}

type OnAxis = Placed & { stone: PlotStone };

/** Piles with the widest stone, and with smaller ones until the highest stack fits. */
function pileInto(stones: readonly PlotStone[], axis: Axis, widest: number, height: number, smallest: number) {
  const placed: OnAxis[] = stones.map((stone) => ({ id: stone.id, at: axis.place(stone.value), stone }));
  let stoneWidth = widest;
  let stacks = stackStones(placed, stoneWidth);
  while (highest(stacks) * stoneWidth * RATIO > height && stoneWidth - 1 >= smallest) {
    stoneWidth -= 1;
    stacks = stackStones(placed, stoneWidth);
  }
  return { stacks, stoneWidth };
}

/** Each stone of a stack set down until it touches the one below; heights are above the ground. */
function shapeStack(stack: Stack<OnAxis>, stoneWidth: number) {
  let below: Stone | null = null;
  let height = 0;
  return stack.stones.map(({ stone }) => {
    const shape = shapeStone(stone.id, stoneWidth);
    height = below ? height + touching(below, shape) : above(shape);
    below = shape;
    return { stone, shape, x: stack.centre, height, top: height + stoneWidth * RATIO * 0.6 };
  });
}

/** Up and down the stacks like stairs, down to the ground only where two stacks don't touch. */
function outlineOf(stacks: readonly Stack<Placed>[], stoneWidth: number, step: number, ground: number): string {
  const half = stoneWidth / 2;
  const parts: string[] = [];
  let end: number | null = null;
  for (const { centre, stones } of stacks) {
    const top = (ground - stones.length * step).toFixed(1);
    const touches = end !== null && centre - half - end < TOUCHING;
    if (!touches) parts.push(`${end === null ? '' : `V${ground}Z`}M${(centre - half).toFixed(1)} ${ground}`);
    parts.push(`V${top}H${(centre + half).toFixed(1)}`);
    end = centre + half;
  }
  return `${parts.join('')}V${ground}Z`;
}
