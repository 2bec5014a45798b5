import { CompensatedSum } from '../statistics/compensated-sum';
import { countStretch } from '../traces/steps';
import type { TraceStretch } from './trace-stretch';
import type { MeasuredFigure } from './types';

/**
 * The share f of the time that stretches lie below an instrument's lower limit, where it does not read.
 *
 * @param limitWatts L; 0 where none is stated.
 * @returns 0 to 1.
 * @example shareBelowLimit([half of it at 0 W, half at 50 W], 1) // 0.5
 */
export function shareBelowLimit(stretches: readonly TraceStretch[], limitWatts: number): number {
  if (limitWatts === 0) return 0;
  const [below, total] = [new CompensatedSum(), new CompensatedSum()];
  for (const { trace, fromSeconds, toSeconds } of stretches) {
    const steps = countStretch(trace, fromSeconds, toSeconds);
    steps?.weights.forEach((weight, i) => {
      total.add(weight);
      if (Math.abs(steps.watts[i] as number) < limitWatts) below.add(weight);
    });
  }
  return total.value > 0 ? below.value / total.value : 0;
}

/**
 * What a share f of the time below the limit L leaves open of a mean: somewhere between 0 and L for that time, so f L/√3
 * as a standard uncertainty.
 *
 * Source: JCGM 100:2008 (GUM), 4.3.7 (half-width over √3), with all of f L as the half-width: what is read as nothing
 * lies above it, never below.
 * @example belowLimitUncertainty(0.5, 1) // 0.2886…
 */
export function belowLimitUncertainty(share: number, limitWatts: number): number {
  return (share * limitWatts) / Math.sqrt(3);
}

/**
 * Between what a figure lies that was below the limit for a share of its time: y and y + f L.
 *
 * @returns null where it never was below.
 * @example betweenLimits({ value: 20, parts: { belowLimit: 0.5 / Math.sqrt(3), … }, … }) // { low: 20, high: 20.5 }
 */
export function betweenLimits({ value, parts }: Pick<MeasuredFigure, 'value' | 'parts'>) {
  return parts.belowLimit > 0 ? { low: value, high: value + parts.belowLimit * Math.sqrt(3) } : null;
}
