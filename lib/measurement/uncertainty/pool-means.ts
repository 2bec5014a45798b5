import { compensatedSum } from '../statistics/compensated-sum';
import { combineParts } from './combine';
import { driftUncertainty } from './drift';
import type { MeasuredFigure, UncertaintyParts } from './types';

/**
 * One mean power from those of several stretches of one mode, by one instrument: summed energy over summed time. What
 * the instrument shifts is shared by all of them, so gain, offset, resolution and what lies below its limit add
 * weighted; repeatability is each stretch's own and adds by squares; drift is that of the whole time.
 *
 * Source: JCGM 100:2008 (GUM), 5.1.2 and 5.2.2, note 1 (fully correlated inputs).
 * @param figures mean powers of one power kind, one or more.
 * @example poolMeans([40 W over 1 h, 50 W over 3 h]).value // 47.5
 */
export function poolMeans(figures: readonly [MeasuredFigure, ...MeasuredFigure[]]): MeasuredFigure {
  const [first] = figures;
  if (figures.length === 1) return first;
  const seconds = compensatedSum(figures.map((figure) => figure.countedSeconds));
  const weighted = (of: (figure: MeasuredFigure) => number) =>
    compensatedSum(figures.map((figure) => (of(figure) * figure.countedSeconds) / seconds));
  const value = weighted((figure) => figure.value);
  const own = figures.map(({ parts, countedSeconds }) => (parts.repeatability * countedSeconds) / seconds);
  const parts: UncertaintyParts = {
    gain: weighted((figure) => figure.parts.gain),
    offset: weighted((figure) => figure.parts.offset),
    resolution: weighted((figure) => figure.parts.resolution),
    repeatability: Math.hypot(...own),
    drift: driftUncertainty(value, seconds),
    belowLimit: weighted((figure) => figure.parts.belowLimit),
  };
  const limits = figures.flatMap((figure) => figure.censoredAt ?? []);
  const coverages = figures.flatMap((figure) => figure.coverage ?? []);
  return {
    ...first,
    value,
    standardUncertainty: combineParts(parts),
    parts,
    // Only where no stretch rose above the limit is the whole below it.
    censoredAt: limits.length === figures.length ? Math.max(...limits) : null,
    averagingSeconds: seconds,
    coverage: coverages.length > 0 ? Math.min(...coverages) : null,
    countedSeconds: seconds,
  };
}
