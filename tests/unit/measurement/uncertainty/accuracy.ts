import type { StatedAccuracy } from '@/lib/measurement/uncertainty/types';

/** An instrument that states nothing, but for what a test needs. */
export function accuracyOf(more: Partial<StatedAccuracy> = {}): StatedAccuracy {
  return {
    percentOfReading: 0,
    percentOfRange: 0,
    rangeWatts: null,
    counts: 0,
    resolutionWatts: 0,
    resolutionWattHours: null,
    lowerLimitWatts: null,
    readsTruePower: true,
    ...more,
  };
}
