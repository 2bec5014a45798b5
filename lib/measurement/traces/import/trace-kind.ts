import { quantileType7 } from '../../statistics/quantile-type-7';
import type { TraceKind } from '../trace';
import type { ColumnRole } from './types';

export interface KindFinding {
  kind: TraceKind;
  reason: string;
  averagingSeconds: number | null;
  /** The readings are energies of their intervals, not a counter: each over its interval is a mean power. */
  energyOfInterval: boolean;
}

/**
 * Tells the kinds of trace apart, with the reason: a counter by its unit and because it hardly ever falls, averages by
 * the file's own words or by an even and slow interval, changes because a value never repeats while the steps differ,
 * samples otherwise.
 *
 * @param words header and what stands above it.
 */
export function findKind(seconds: Float64Array, values: Float64Array, role: ColumnRole, words: string): KindFinding {
  const n = values.length;
  const steps = new Float64Array(n - 1);
  let falls = 0;
  let repeats = 0;
  for (let i = 1; i < n; i += 1) {
    steps[i - 1] = (seconds[i] as number) - (seconds[i - 1] as number);
    if ((values[i] as number) < (values[i - 1] as number)) falls += 1;
    if (values[i] === values[i - 1]) repeats += 1;
  }
  steps.sort();
  const dt = quantileType7(steps, 0.5);
  const even = quantileType7(steps, 0.9) - quantileType7(steps, 0.1) <= 0.1 * dt;
  if (role === 'energy') {
    if (falls <= 0.01 * n) return found('counter', 'its unit is an energy, and it hardly ever falls', null);
    return {
      ...found('averages', 'its unit is an energy, and it rises and falls: each is the energy of its interval', dt),
      energyOfInterval: true,
    };
  }
  if (/averag|mean|interval/i.test(words))
    return found('averages', 'the file itself calls the values means of an interval', dt);
  if (/on change|changes|event/i.test(words))
    return found('changes', 'the file itself says that it notes changes', null);
  if (even && dt >= 30) return found('averages', `the steps are even and ${dt} s long, which loggers average over`, dt);
  if (!even && repeats === 0 && n >= 20 && quantileType7(steps, 0.9) > 5 * quantileType7(steps, 0.1)) {
    return found('changes', 'no value repeats while the steps differ widely, as of a logger that notes changes', null);
  }
  return found('samples', 'the values stand alone at their times', null);
}

function found(kind: TraceKind, reason: string, averagingSeconds: number | null): KindFinding {
  return { kind, reason, averagingSeconds, energyOfInterval: false };
}
