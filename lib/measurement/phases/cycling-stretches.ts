import type { Trace } from '../traces/trace';
import { readingAfter, readingBefore } from './beside';
import { findCycles, type AcceptedCycles } from './cycles';
import type { Span } from './steady-levels';

export interface CyclingStretch extends Span {
  finding: AcceptedCycles;
}

/** So often a stretch is cut in two to find the parts that cycle. */
const CUTS = 2;
/** A steady level shorter than this share of the stretch is part of its cycles, not what stands beside them. */
const LEAST_STEADY_SHARE = 0.1;

/**
 * The stretches of a trace that cycle: all of it, or what is left and right of its longest steady level, such as a
 * freezer's first night of cooling down. What comes before the first and after the last whole cycle belongs to the
 * stretch where it is no longer than the longest cycle: it is a cycle that the recording cut off.
 *
 * @param steady spans of steady levels, in order.
 */
export function cyclingStretches(trace: Trace, span: Span, steady: readonly Span[], cuts = CUTS): CyclingStretch[] {
  const finding = findCycles(trace, span.fromSeconds, span.toSeconds);
  if (finding.accepted) return [{ ...reachOf(finding, span), finding }];
  const within = steady.filter((level) => level.fromSeconds >= span.fromSeconds && level.toSeconds <= span.toSeconds);
  const lengthOf = (level: Span) => level.toSeconds - level.fromSeconds;
  const [longest] = [...within].sort((a, b) => lengthOf(b) - lengthOf(a));
  if (cuts === 0 || !longest || lengthOf(longest) < LEAST_STEADY_SHARE * lengthOf(span)) return [];
  return [
    ...cyclingStretches(trace, { ...span, toSeconds: readingBefore(trace, longest.fromSeconds) }, within, cuts - 1),
    ...cyclingStretches(trace, { ...span, fromSeconds: readingAfter(trace, longest.toSeconds) }, within, cuts - 1),
  ];
}

function reachOf({ cycles }: AcceptedCycles, span: Span): Span {
  const longest = Math.max(...cycles.map((cycle) => cycle.toSeconds - cycle.fromSeconds));
  const first = Math.min(...cycles.map((cycle) => cycle.fromSeconds));
  const last = Math.max(...cycles.map((cycle) => cycle.toSeconds));
  return {
    fromSeconds: first - span.fromSeconds <= longest ? span.fromSeconds : first,
    toSeconds: span.toSeconds - last <= longest ? span.toSeconds : last,
  };
}
