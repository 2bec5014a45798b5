import { scaleLinear, scaleLog } from 'd3-scale';
import { plainNumber } from './axis';

/** A stretch of values that several bars share, so that a list of them is a chart. */
export interface RangeScale {
  kind: 'linear' | 'log';
  domain: [low: number, high: number];
}

/** Where the largest is this many times the smallest, a linear axis would press most bars into its left edge. */
const WIDE = 40;

/**
 * One scale for all the ranges of a list. Logarithmic where they are far apart, and then never from zero: what lies below
 * the scale is drawn at its edge.
 */
export function shareScale(ranges: readonly { low: number; high: number }[]): RangeScale {
  const ends = ranges.flatMap(({ low, high }) => [low, high]);
  const positive = ends.filter((end) => end > 0);
  const high = Math.max(0, ...ends);
  if (positive.length === 0) return { kind: 'linear', domain: [Math.min(0, ...ends), high || 1] };
  const least = Math.min(...positive);
  if (Math.min(...ends) >= 0 && high / least > WIDE) {
    return { kind: 'log', domain: [10 ** Math.floor(Math.log10(least)), 10 ** Math.ceil(Math.log10(high))] };
  }
  const [from = 0, to = 1] = scaleLinear()
    .domain([Math.min(0, ...ends), high])
    .nice(5)
    .domain();
  return { kind: 'linear', domain: [from, to] };
}

const scaleOf = ({ kind, domain }: RangeScale) =>
  (kind === 'log' ? scaleLog() : scaleLinear()).domain(domain).range([0, 100]);

/** Percent of the bar's width at which a value is drawn, kept inside it. */
export function placeOnScale(scale: RangeScale, value: number): number {
  const floor = scale.kind === 'log' ? Math.max(value, scale.domain[0]) : value;
  return Math.min(100, Math.max(0, scaleOf(scale)(floor)));
}

/** Round steps: powers of ten on a logarithmic scale. */
export function rangeTicks(scale: RangeScale): { at: number; label: string }[] {
  const place = scaleOf(scale);
  const ticks =
    scale.kind === 'log' ? place.ticks().filter((tick) => Number.isInteger(Math.log10(tick))) : place.ticks(4);
  return ticks.map((tick) => ({ at: place(tick), label: asRound(tick) }));
}

/** A round number with the places that it has. */
function asRound(value: number): string {
  const text = String(Number(value.toPrecision(6)));
  return plainNumber(value, text.split('.')[1]?.length ?? 0);
}
