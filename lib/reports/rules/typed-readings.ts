import { measureTypedMean } from '@/lib/measurement/uncertainty/measure-typed';
import type { MeasuredFigure, StatedAccuracy } from '@/lib/measurement/uncertainty/types';
import type { Phase } from '../schema';

export type TypedPhase = Extract<Phase, { source: 'typed' }>;

/** The mean power of what was read off a display, over all its stretches; null where there is none. */
export function meanOfTyped(phases: readonly TypedPhase[], accuracy: StatedAccuracy): MeasuredFigure | null {
  return phases.length === 0 ? null : measureTypedMean(sumOf(phases), accuracy);
}

/** Energy over time, where every phase has one; otherwise the mean weighted by time. */
function sumOf(phases: readonly TypedPhase[]) {
  const durationSeconds = phases.reduce((sum, phase) => sum + phase.durationSeconds, 0);
  const allHaveEnergy = phases.every((phase) => phase.energyWattHours !== null);
  const energy = phases.reduce((sum, phase) => sum + (phase.energyWattHours ?? 0), 0);
  const weighted = phases.reduce(
    (sum, { meanWatts, energyWattHours, durationSeconds: seconds }) =>
      sum + (meanWatts === null ? (energyWattHours ?? 0) * 3600 : meanWatts * seconds),
    0,
  );
  const lowest = phases.flatMap((phase) => phase.minimumWatts ?? []);
  const highest = phases.flatMap((phase) => phase.maximumWatts ?? []);
  return {
    durationSeconds,
    energyWattHours: allHaveEnergy ? energy : null,
    meanWatts: allHaveEnergy ? null : weighted / durationSeconds,
    minimumWatts: lowest.length > 0 ? Math.min(...lowest) : null,
    maximumWatts: highest.length > 0 ? Math.max(...highest) : null,
    uses: null,
  };
}
