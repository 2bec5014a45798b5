import type { Axis, Claim } from './axis';

/** Atkinson Hyperlegible Next, semibold at 12 px, a generous mean: laid out before any font is there to measure. */
const CHARACTER = 7;
export const LINE = 15;
const LEG = 9;
const ARROW = 5;

export interface Bracket {
  lines: string[];
  /** Where the words stand, by their middle; they never leave the picture. */
  textAt: number;
  textWidth: number;
  /** One path: legs where an end is stated, arrows where it is open or outside the scale. */
  path: string;
  /** Height of words and bracket together. */
  height: number;
}

/** Breaks words into lines that fit; a word that is too long for a line keeps its own. */
export function wrapWords(text: string, width: number): string[] {
  const most = Math.max(8, Math.floor(width / CHARACTER));
  const lines: string[] = [];
  for (const word of text.split(' ')) {
    const line = lines.at(-1);
    if (line !== undefined && line.length + 1 + word.length <= most) lines[lines.length - 1] = `${line} ${word}`;
    else lines.push(word);
  }
  return lines;
}

type End = { at: number; shape: 'leg' | 'arrow' };

/** An end of the claim: a leg where it is stated and on the scale, an arrow where the claim goes on beyond. */
function endOf(value: number | null, side: 'lower' | 'upper', axis: Axis, other: number | null): End {
  const [low, high] = axis.domain;
  const [left, right] = axis.range;
  if (value !== null && value >= low && value <= high) return { at: axis.place(value), shape: 'leg' };
  if (value !== null) return { at: value < low ? left : right, shape: 'arrow' };
  // Open: the arrow is long enough to be seen as one, and no longer, since it has no end to point at.
  const from = other === null ? (left + right) / 2 : axis.place(other);
  return { at: side === 'lower' ? Math.max(left, from - 34) : Math.min(right, from + 34), shape: 'arrow' };
}

/** The maker's claim above the pile, in the upper `height` pixels of the picture. */
export function layBracket(claim: Claim, axis: Axis, width: number): Bracket {
  const lower = endOf(claim.lower, 'lower', axis, claim.upper);
  const upper = endOf(claim.upper, 'upper', axis, claim.lower);
  const outside = lower.shape === 'arrow' && upper.shape === 'arrow' && Math.abs(upper.at - lower.at) < 1;
  const [left, right] = axis.range;
  const toLeft = outside && lower.at <= (left + right) / 2;
  const from = outside && !toLeft ? right - 26 : lower.at;
  const to = outside && toLeft ? left + 26 : upper.at;
  const lines = wrapWords(claim.label, width);
  const textWidth = Math.max(...lines.map((line) => line.length)) * CHARACTER;
  const bar = lines.length * LINE + 4;
  const parts: string[] = [];
  const point = claim.lower !== null && claim.lower === claim.upper && lower.shape === 'leg';
  if (point) parts.push(`M${from - 6} ${bar}H${from + 6}M${from} ${bar}V${bar + LEG}`);
  else {
    parts.push(`M${from} ${bar}H${to}`);
    if (lower.shape === 'leg') parts.push(`M${from} ${bar - 1}V${bar + LEG}`);
    if (upper.shape === 'leg') parts.push(`M${to} ${bar - 1}V${bar + LEG}`);
    if (lower.shape === 'arrow' && (!outside || toLeft)) parts.push(arrow(from, bar, 1));
    if (upper.shape === 'arrow' && (!outside || !toLeft)) parts.push(arrow(to, bar, -1));
  }
  const half = textWidth / 2;
  const textAt = Math.min(Math.max((from + to) / 2, half), Math.max(half, width - half));
  return { lines, textAt, textWidth, path: parts.join(''), height: bar + LEG };
}

/** Two strokes that meet at the tip; `back` is the direction they come from. */
function arrow(tip: number, bar: number, back: 1 | -1): string {
  return `M${tip + back * ARROW} ${bar - ARROW}L${tip} ${bar}L${tip + back * ARROW} ${bar + ARROW}`;
}
