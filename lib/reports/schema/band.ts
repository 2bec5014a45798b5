import { z } from 'zod';

/** What a stretch of a trace yields while its edges are being moved. */
export const bandFigures = z.object({
  countedSeconds: z.number(),
  coverage: z.number(),
  energyWattHours: z.number(),
  meanWatts: z.number(),
  /** k = 1, of the instrument that was named; null where none was. */
  standardUncertainty: z.number().nullable(),
  minimumWatts: z.number(),
  maximumWatts: z.number(),
  /** Over what minimum and maximum average; 0 for instantaneous samples. */
  averagingSeconds: z.number(),
  p05Watts: z.number(),
  p50Watts: z.number(),
  p95Watts: z.number(),
  shareBelowOneWatt: z.number(),
  shareNegative: z.number(),
});

export const bandReading = z.object({
  /** Null where no time counts: fewer than two readings, or gaps alone. */
  figures: bandFigures.nullable(),
  cycles: z.object({ whole: z.int().nullable(), reason: z.string().nullable() }),
});

export type BandReading = z.infer<typeof bandReading>;
