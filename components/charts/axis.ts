import { scaleLinear } from 'd3-scale';

/** How wide a character of the axis is drawn: Spline Sans Mono at 12 px. */
export const AXIS_CHARACTER = 7.2;

export interface Claim {
  /** Null where the claim is open: "at most 75 W" has no lower end. Both ends equal: one stated value. */
  lower: number | null;
  upper: number | null;
  /** With its values: "maker 60–75 W". */
  label: string;
}

export interface Axis {
  domain: [number, number];
  /** Pixels between which the domain lies. */
  range: [number, number];
  ticks: { at: number; label: string }[];
  /** Where a value is drawn, kept inside the picture. */
  place: (value: number) => number;
}

/** A number as people read it: a true minus sign, no more places than asked for. */
export function plainNumber(value: number, places: number): string {
  const text = Math.abs(value).toFixed(places);
  return value < 0 && Number(text) !== 0 ? `−${text}` : text;
}

const UNSEEN = 1e-9;

/** Three significant digits: what a figure that comes without its uncertainty is shown with. */
export function threeDigits(value: number): string {
  // What no meter resolves is zero, and would otherwise be a row of noughts.
  if (Math.abs(value) < UNSEEN) return '0';
  const places = 2 - Math.floor(Math.log10(Math.abs(value)));
  return plainNumber(places < 0 ? Number(value.toPrecision(3)) : value, Math.max(0, places));
}

/**
 * The stretch of values that a plot shows. A claim's end belongs to it only where it isn't far off: otherwise it would
 * press the stones into a corner, and the bracket says at the edge where it lies.
 */
export function chooseDomain(values: readonly number[], claim?: Claim): [number, number] {
  const low = Math.min(...values);
  const high = Math.max(...values);
  const extent = Math.max(high - low, 0.35 * Math.max(Math.abs(low), Math.abs(high)));
  const spread = extent < UNSEEN ? 1 : extent;
  const near = [claim?.lower, claim?.upper].filter(
    (end): end is number => typeof end === 'number' && end >= low - 1.2 * spread && end <= high + 1.2 * spread,
  );
  const from = Math.min(low, ...near);
  const to = Math.max(high, ...near);
  const pad = Math.max(0.12 * (to - from), (spread - (to - from)) / 2);
  // Close to zero the axis begins there, and never below it for what can't be negative.
  const start = low >= 0 && from - pad < 0.2 * to ? 0 : from - pad;
  return [start, to + pad];
}

interface AxisRequest {
  domain: [number, number];
  /** Given by the page, for several plots on one scale: kept as it is. */
  fixed: boolean;
  unit: string;
  width: number;
  /** Room at both ends, so that the outermost stone is whole. */
  stone: number;
}

/** Round steps, as many as fit without touching, and room for half a label at the left, half and the unit at the right. */
export function layAxis({ domain, fixed, unit, width, stone }: AxisRequest): Axis {
  const longest = Math.max(...domain.map((end) => threeDigits(end).length)) + 1;
  const label = longest * AXIS_CHARACTER;
  const left = Math.max(stone * 0.75, label / 2);
  const right = width - Math.max(stone * 0.75, label / 2 + (unit.length + 1) * AXIS_CHARACTER);
  const count = Math.max(2, Math.min(7, Math.floor((right - left) / (label + 18))));
  const scale = scaleLinear().domain(domain).range([left, right]);
  if (!fixed) scale.nice(count);
  const ticks = scale.ticks(count);
  const step = Math.abs((ticks[1] ?? 1) - (ticks[0] ?? 0)) || 1;
  // The step is 1, 2 or 5 times a power of ten, so its exponent is the number of places.
  const places = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  return {
    domain: scale.domain() as [number, number],
    range: [left, right],
    ticks: ticks.map((value) => ({ at: scale(value), label: plainNumber(value, places) })),
    place: (value) => Math.min(right, Math.max(left, scale(value))),
  };
}
