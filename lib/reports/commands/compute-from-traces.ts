import 'server-only';
import type { TraceCorrections, TraceDescription } from '@/lib/measurement/traces/import/types';
import type { Trace } from '@/lib/measurement/traces/trace';
import type { StatedAccuracy } from '@/lib/measurement/uncertainty/types';
import type { Trace as TraceRow } from '@/models/trace';
import { readSeries } from '../queries/traces';
import { computeFigures, type Computation, type ComputationInput } from '../rules/compute-figures';

interface FromTraces extends Pick<ComputationInput, 'duty' | 'phases' | 'supplyClass'> {
  voltsMeasured: boolean;
  instrument: StatedAccuracy;
  /** By public id; every trace that a phase names is among them. */
  traces: ReadonlyMap<string, TraceRow>;
}

/** Reads the series that the phases lie in, and computes what follows from them. */
export async function computeFromTraces({
  traces,
  instrument,
  voltsMeasured,
  ...given
}: FromTraces): Promise<Computation> {
  const series = new Map<string, Trace>();
  for (const phase of given.phases) {
    if (phase.source !== 'trace' || series.has(phase.tracePublicId)) continue;
    series.set(phase.tracePublicId, await readSeries(traces.get(phase.tracePublicId) as TraceRow));
  }
  return computeFigures({
    ...given,
    accuracy: statedAccuracy(instrument),
    traceOf: (publicId) => series.get(publicId) as Trace,
    assumesVolts: (publicId) => !voltsMeasured && isFromAmperes(traces.get(publicId) as TraceRow),
  });
}

function isFromAmperes({ description, corrections }: TraceRow): boolean {
  return ((corrections as TraceCorrections).unit ?? (description as TraceDescription).value.unit) === 'A';
}

/** What the computation needs to know of an instrument's revision. */
function statedAccuracy(revision: StatedAccuracy): StatedAccuracy {
  return {
    percentOfReading: revision.percentOfReading,
    percentOfRange: revision.percentOfRange,
    rangeWatts: revision.rangeWatts,
    counts: revision.counts,
    resolutionWatts: revision.resolutionWatts,
    resolutionWattHours: revision.resolutionWattHours,
    lowerLimitWatts: revision.lowerLimitWatts,
    readsTruePower: revision.readsTruePower,
  };
}
