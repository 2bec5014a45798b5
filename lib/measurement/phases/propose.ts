import { stretchFigures } from '../traces/figures';
import type { Trace } from '../traces/trace';
import type { Duty } from '../units/quantity';
import { readingAfter, readingBefore } from './beside';
import { cycleExceptions, type CycleException } from './cycle-exceptions';
import { cyclingStretches, type CyclingStretch } from './cycling-stretches';
import type { Segment } from './join-close';
import { startUps } from './start-up';
import { levelsOf, spansOf, squaresOf, steadyPart, type Span, type SteadyPart } from './steady-levels';

/** A stretch that the member may take for a phase. Nothing is decided by it. */
export interface ProposedPhase extends Span {
  kind: 'steady' | 'start-up' | 'cycling';
  meanWatts: number;
  countedSeconds: number;
  /** Of a stretch that cycles: what in it is unlike the rest. */
  exceptions: CycleException[];
}

export interface PhaseProposal {
  phases: ProposedPhase[];
  /** Share of the variance that steady phases explain, 0 to 1; null where nothing had to be simplified. */
  explained: number | null;
  /** What the member is asked to do, where the proposal is not worth much; otherwise null. */
  advice: string | null;
}

const MOST_PHASES = 12;
const LEAST_EXPLAINED = 0.9;
const CUT =
  'This trace changes too often for twelve phases to describe it: they explain less than 90 % of how its power varies. Cut the stretch, and look at the parts one by one.';
const EMPTY = 'There is no counted time in this stretch, so no phases can be found.';

/**
 * Proposes the phases of a trace: steady levels, the start-up before a run, and, for a thermostat, the stretches that
 * cycle as one phase each.
 *
 * Method: least sum of squares with a penalty of 3 σ² ln n on at most 4,096 blocks (PELT: Killick, Fearnhead and Eckley
 * 2012); neighbours that are too close are joined; while more than twelve phases remain, the penalty is doubled; edges
 * are moved to the exact reading.
 * @param options.duty of the device's category: only a cyclic one is searched for cycles.
 * @param options.span the stretch; the whole trace where it is left out.
 * @example proposePhases(ten minutes off, then an hour at 40 W, { duty: 'continuous' }).phases.length // 2
 */
export function proposePhases(trace: Trace, options: { duty: Duty; span?: Span }): PhaseProposal {
  const whole = steadyPart(trace, options.span ?? { fromSeconds: -Infinity, toSeconds: Infinity });
  if (!whole) return { phases: [], explained: null, advice: EMPTY };
  const fine = options.duty === 'cyclic' ? spansOf(whole, levelsOf(whole, 1)) : [];
  const cycling = fine.length > 0 ? cyclingStretches(trace, whole.steps, fine) : [];
  const parts =
    cycling.length > 0
      ? spansBeside(trace, whole.steps, cycling).flatMap((span) => steadyPart(trace, span) ?? [])
      : [whole];
  const { levels, factor } = fewLevels(parts, MOST_PHASES - cycling.length);
  const steady = parts.flatMap((part, i) => spansOf(part, levels[i] as Segment[]));
  const explained = factor > 1 ? explainedShare(parts, levels) : null;
  return {
    phases: markStartUps(
      [
        ...steady.flatMap((span) => phaseOf(trace, span, 'steady', [])),
        ...cycling.flatMap((stretch) =>
          phaseOf(trace, stretch, 'cycling', cycleExceptions(stretch.finding, within(stretch, fine))),
        ),
      ].sort((a, b) => a.fromSeconds - b.fromSeconds),
      whole.step,
    ),
    explained,
    advice: explained !== null && explained < LEAST_EXPLAINED ? CUT : null,
  };
}

/** Doubles the penalty until all parts together have few enough levels. */
function fewLevels(parts: readonly SteadyPart[], most: number): { levels: Segment[][]; factor: number } {
  for (let factor = 1; ; factor *= 2) {
    const levels = parts.map((part) => levelsOf(part, factor));
    const count = levels.reduce((sum, segments) => sum + segments.length, 0);
    // A part without changes has one level: there are no fewer.
    if (count <= Math.max(most, parts.length)) return { levels, factor };
  }
}

/** What lies before, between and after the stretches that cycle, up to the last reading before a switching. */
function spansBeside(trace: Trace, whole: Span, cycling: readonly CyclingStretch[]): Span[] {
  const starts = [whole.fromSeconds, ...cycling.map((stretch) => readingAfter(trace, stretch.toSeconds))];
  const ends = [...cycling.map((stretch) => readingBefore(trace, stretch.fromSeconds)), whole.toSeconds];
  return starts
    .map((fromSeconds, i) => ({ fromSeconds, toSeconds: ends[i] as number }))
    .filter((span) => span.toSeconds > span.fromSeconds);
}

function explainedShare(parts: readonly SteadyPart[], levels: readonly Segment[][]): number {
  const squares = parts.map((part, i) => squaresOf(part, levels[i] as Segment[]));
  const total = squares.reduce((sum, part) => sum + part.total, 0);
  return total > 0 ? 1 - squares.reduce((sum, part) => sum + part.left, 0) / total : 1;
}

function within<T extends Span>(span: Span, levels: readonly T[]): T[] {
  return levels.filter((level) => level.fromSeconds >= span.fromSeconds && level.toSeconds <= span.toSeconds);
}

function phaseOf(trace: Trace, span: Span, kind: ProposedPhase['kind'], exceptions: CycleException[]): ProposedPhase[] {
  const { fromSeconds, toSeconds } = span;
  const figures = stretchFigures(trace, fromSeconds, toSeconds);
  if (!figures) return [];
  const { meanWatts, countedSeconds } = figures;
  return [{ fromSeconds, toSeconds, kind, meanWatts, countedSeconds, exceptions }];
}

function markStartUps(phases: ProposedPhase[], step: number): ProposedPhase[] {
  const marks = startUps(
    phases.map(({ meanWatts, countedSeconds, kind }) => ({
      meanWatts,
      seconds: countedSeconds,
      isCycling: kind === 'cycling',
    })),
    step,
  );
  return phases.map((phase, i) => (marks[i] === true ? { ...phase, kind: 'start-up' as const } : phase));
}
