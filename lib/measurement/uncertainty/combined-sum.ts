import { compensatedSum } from '../statistics/compensated-sum';

/** A figure with what it shares with others. */
export interface UncertainValue {
  value: number;
  standardUncertainty: number;
  /** The part that its instrument shifts alike in all it reads (gain and offset); null where that is not known apart. */
  systematic: number | null;
  /** Lines resting on one figure share all of its uncertainty; null where it is nobody else's. */
  figureKey: string | null;
  /** Figures of one instrument share its systematic part; null where there is none, or it is not known. */
  instrumentKey: string | null;
}

/** A figure times a number that is taken as exact, hours say. */
export interface SumTerm {
  of: UncertainValue;
  factor: number;
}

/**
 * A sum of figures times exact factors, with its standard uncertainty. Terms on one figure add linearly. Of terms on one
 * instrument the systematic part adds linearly, or all of the uncertainty where the part is not known; the rest, and
 * terms on different instruments, add by squares.
 *
 * Source: JCGM 100:2008 (GUM), 5.1.2, and 5.2.2 note 1 for fully correlated inputs.
 * @param terms none are 0 ± 0; a factor may be negative.
 * @example sumOfTerms([10 ± 3 by one instrument, 20 ± 4 by another]) // { value: 30, standardUncertainty: 5 }
 */
export function sumOfTerms(terms: readonly SumTerm[]): { value: number; standardUncertainty: number } {
  const figures = new Map<string, { of: UncertainValue; factor: number }>();
  terms.forEach(({ of, factor }, i) => {
    const key = of.figureKey === null ? `alone ${i}` : `figure ${of.figureKey}`;
    figures.set(key, { of, factor: factor + (figures.get(key)?.factor ?? 0) });
  });
  const shared = new Map<string, number>();
  const own: number[] = [];
  for (const { of, factor } of figures.values()) {
    const systematic = of.instrumentKey === null ? 0 : Math.min(of.systematic ?? Infinity, of.standardUncertainty);
    own.push(factor * Math.sqrt(of.standardUncertainty ** 2 - systematic ** 2));
    if (of.instrumentKey !== null) {
      shared.set(of.instrumentKey, factor * systematic + (shared.get(of.instrumentKey) ?? 0));
    }
  }
  return {
    value: compensatedSum(terms.map(({ of, factor }) => of.value * factor)),
    standardUncertainty: Math.hypot(...own, ...shared.values()),
  };
}
