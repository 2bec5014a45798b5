import type { MeasuredFigure } from './types';

/**
 * The difference of two figures read by one instrument: its offset cancels, but of a gain error of a % the part
 * a · |y₁ − y₂| remains. Resolution, repeatability, drift and what lay below the limit are each figure's own.
 *
 * Source: JCGM 100:2008 (GUM), 5.2.2 (correlated inputs).
 * @returns y₁ − y₂ in the figures' unit, and what the gain leaves of it apart.
 * @example differenceByOneInstrument(50 W with 1 % of gain, 40 W likewise) // value 10, gain 0.1
 */
export function differenceByOneInstrument(
  first: Pick<MeasuredFigure, 'value' | 'parts'>,
  second: Pick<MeasuredFigure, 'value' | 'parts'>,
): { value: number; standardUncertainty: number; gain: number } {
  const value = first.value - second.value;
  const gain = Math.max(gainShare(first), gainShare(second)) * Math.abs(value);
  const own = [first, second].flatMap(({ parts }) => [
    parts.resolution,
    parts.repeatability,
    parts.drift,
    parts.belowLimit,
  ]);
  return { value, gain, standardUncertainty: Math.hypot(gain, ...own) };
}

/** The gain part as a share of its reading; a reading of zero tells nothing of it. */
function gainShare({ value, parts }: Pick<MeasuredFigure, 'value' | 'parts'>): number {
  return value === 0 ? 0 : Math.abs(parts.gain / value);
}
