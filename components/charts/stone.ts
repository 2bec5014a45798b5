/** A worn stone: its outline as points around its middle, in pixels with y downwards, and which of the tones it has. */
export interface Stone {
  outline: Point[];
  /** Corners of the curve that `outline` samples. */
  corners: Point[];
  tone: 0 | 1 | 2;
  /** A pale vein across it, where it has one. */
  vein: [Point, Point, Point] | null;
}

export type Point = readonly [x: number, y: number];

const CORNERS = 9;
const SAMPLES = 4;

/** Numbers from 0 to 1 that depend on the text alone: FNV-1a into a mulberry32 sequence. */
function numbersFrom(text: string): () => number {
  let state = 0x811c9dc5;
  for (let index = 0; index < text.length; index += 1) {
    state = Math.imul(state ^ text.charCodeAt(index), 0x01000193);
  }
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

/**
 * The stone of a contributor or device: about 1 wide to 0.66 high, a little different for each id and always the same
 * for one. Never wider than `width`.
 */
export function shapeStone(id: string, width: number): Stone {
  const next = numbersFrom(id);
  const between = (low: number, high: number) => low + next() * (high - low);
  const wide = between(0.88, 1) * width;
  const high = wide * between(0.58, 0.72);
  const turn = between(-0.13, 0.13);
  const start = between(0, 1);
  const rough = Array.from({ length: CORNERS }, (_, index): Point => {
    const angle = (2 * Math.PI * (index + start + between(-0.16, 0.16))) / CORNERS;
    const reach = between(0.9, 1.06);
    // A superellipse: water wears stones flatter on their long sides than an ellipse is.
    const x = Math.sign(Math.cos(angle)) * Math.abs(Math.cos(angle)) ** 0.82 * reach;
    const y = Math.sign(Math.sin(angle)) * Math.abs(Math.sin(angle)) ** 0.82 * reach;
    return [x * Math.cos(turn) - y * 0.66 * Math.sin(turn), x * Math.sin(turn) + y * 0.66 * Math.cos(turn)];
  });
  const corners = fit(rough, wide, high);
  const tone = Math.floor(next() * 3) as 0 | 1 | 2;
  const veined = next() < 0.4;
  const vein: Stone['vein'] = veined
    ? [
        [wide * -0.36, high * between(-0.05, 0.22)],
        [wide * between(-0.1, 0.1), high * between(-0.24, 0.05)],
        [wide * 0.36, high * between(-0.2, 0.12)],
      ]
    : null;
  return { outline: sample(corners), corners, tone, vein };
}

/** Moves and stretches the corners until their curve has exactly this width and height around the middle. */
function fit(corners: readonly Point[], width: number, height: number): Point[] {
  const curve = sample(corners);
  const [left, right] = extent(curve.map(([x]) => x));
  const [top, bottom] = extent(curve.map(([, y]) => y));
  return corners.map(([x, y]) => [
    ((x - (left + right) / 2) / (right - left)) * width,
    ((y - (top + bottom) / 2) / (bottom - top)) * height,
  ]);
}

/** Points on the closed quadratic B-spline of the corners. */
function sample(corners: readonly Point[]): Point[] {
  return corners.flatMap((corner, index) => {
    const before = corners.at(index - 1) ?? corner;
    const after = corners[(index + 1) % corners.length] ?? corner;
    const from = middle(before, corner);
    const to = middle(corner, after);
    return Array.from({ length: SAMPLES }, (_, step): Point => {
      const t = step / SAMPLES;
      const bend = (axis: 0 | 1) => (1 - t) ** 2 * from[axis] + 2 * t * (1 - t) * corner[axis] + t ** 2 * to[axis];
      return [bend(0), bend(1)];
    });
  });
}

function middle(one: Point, other: Point): Point {
  return [(one[0] + other[0]) / 2, (one[1] + other[1]) / 2];
}

function extent(values: readonly number[]): [number, number] {
  return [Math.min(...values), Math.max(...values)];
}

/** How far a stone's middle lies above the ground that it stands on. */
export function above(stone: Stone): number {
  return extent(stone.outline.map(([, y]) => y))[1];
}

/** How far the upper stone's middle lies above the lower one's when they just touch. */
export function touching(lower: Stone, upper: Stone): number {
  const [left, right] = extent(lower.outline.map(([x]) => x));
  let distance = 0;
  for (let step = 0; step <= 24; step += 1) {
    const x = left + ((right - left) * step) / 24;
    const roof = profile(lower.outline, x, 'top');
    const floor = profile(upper.outline, x, 'bottom');
    if (roof !== null && floor !== null) distance = Math.max(distance, floor - roof);
  }
  return distance;
}

/** The outline's highest or lowest y at a place, or null beside the stone. */
function profile(outline: readonly Point[], x: number, side: 'top' | 'bottom'): number | null {
  let found: number | null = null;
  outline.forEach((from, index) => {
    const to = outline[(index + 1) % outline.length] ?? from;
    if (Math.min(from[0], to[0]) > x || Math.max(from[0], to[0]) < x) return;
    const share = to[0] === from[0] ? 0 : (x - from[0]) / (to[0] - from[0]);
    const y = from[1] + share * (to[1] - from[1]);
    if (found === null || (side === 'top' ? y < found : y > found)) found = y;
  });
  return found;
}

const short = (value: number) => String(Math.round(value * 10) / 10);

/** The outline as SVG path data with the stone's middle at x, y. */
export function stonePath(stone: Stone, x: number, y: number): string {
  const place = ([dx, dy]: Point) => `${short(x + dx)} ${short(y + dy)}`;
  const [first, ...others] = stone.corners.map((corner, index): [Point, Point] => [
    corner,
    middle(corner, stone.corners[(index + 1) % stone.corners.length] ?? corner),
  ]);
  if (!first) return '';
  const start = middle(stone.corners.at(-1) ?? first[0], first[0]);
  // Each corner is the mirror image of the one before at the curve's joint, which is what T draws.
  return `M${place(start)}Q${place(first[0])} ${place(first[1])}${others.map(([, to]) => `T${place(to)}`).join('')}Z`;
}

export function veinPath(vein: readonly [Point, Point, Point], x: number, y: number): string {
  const [from, bend, to] = vein.map(([dx, dy]) => `${short(x + dx)} ${short(y + dy)}`);
  return `M${from}Q${bend} ${to}`;
}
