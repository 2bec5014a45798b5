import { findCycles } from '@/lib/measurement/phases/cycles';
import { stretchFigures } from '@/lib/measurement/traces/figures';
import type { Trace } from '@/lib/measurement/traces/trace';
import { measureMeanPower } from '@/lib/measurement/uncertainty/measure-mean';
import type { StatedAccuracy } from '@/lib/measurement/uncertainty/types';
import type { BandReading } from '../schema/band';

export interface Band {
  fromSeconds: number;
  toSeconds: number;
}

/** The figures of a stretch of a trace, with the uncertainty that an instrument leaves, and whether it cycles. */
export function readBand(trace: Trace, band: Band, accuracy: StatedAccuracy | null): BandReading {
  const { fromSeconds, toSeconds } = band;
  const figures = stretchFigures(trace, fromSeconds, toSeconds);
  const measured = accuracy && measureMeanPower([{ trace, ...band }], accuracy);
  const cycles = findCycles(trace, fromSeconds, toSeconds);
  return {
    figures: figures && { ...figures, standardUncertainty: measured?.standardUncertainty ?? null },
    cycles: cycles.accepted ? { whole: cycles.cycles.length, reason: null } : { whole: null, reason: cycles.reason },
  };
}
