import type { Trace } from '@/lib/measurement/traces/trace';
import type { StatedAccuracy } from '@/lib/measurement/uncertainty/types';
import type { ComputationInput } from './compute-figures';

/** The accuracy that the figures of these traces rest on. */
export type AccuracyOf = (tracePublicIds: readonly string[]) => StatedAccuracy;

/** A voltage that nobody measured is taken as right within ±10 %, rectangular: it shifts every watt alike. */
const ASSUMED_VOLTS_PERCENT = 10;

/**
 * How traces and accuracy are to be taken on a supply: current times voltage is real power on DC and apparent power on
 * AC, and a voltage that was only assumed widens what the instrument leaves open.
 */
export function forSupply(input: Pick<ComputationInput, 'supplyClass' | 'accuracy' | 'traceOf' | 'assumesVolts'>): {
  traceOf: (publicId: string) => Trace;
  accuracyOf: AccuracyOf;
} {
  const isDirect = input.supplyClass === 'dc';
  const accuracy = isDirect ? { ...input.accuracy, readsTruePower: true } : input.accuracy;
  const known = new Map<string, Trace>();
  return {
    traceOf: (publicId) => {
      const before = known.get(publicId);
      if (before) return before;
      const trace = input.traceOf(publicId);
      const taken: Trace = isDirect && trace.powerKind === 'apparent' ? { ...trace, powerKind: 'real' } : trace;
      known.set(publicId, taken);
      return taken;
    },
    accuracyOf: (tracePublicIds) =>
      tracePublicIds.some(input.assumesVolts)
        ? { ...accuracy, percentOfReading: Math.hypot(accuracy.percentOfReading, ASSUMED_VOLTS_PERCENT) }
        : accuracy,
  };
}
