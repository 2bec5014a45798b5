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

const stretch = { fromSeconds: z.number(), toSeconds: z.number() };

/** Phases that a trace suggests; the member decides. */
export const phaseProposal = z.object({
  phases: z.array(
    z.object({
      ...stretch,
      kind: z.enum(['steady', 'start-up', 'cycling']),
      meanWatts: z.number(),
      countedSeconds: z.number(),
      /** Of a stretch that cycles: what in it is unlike the rest. */
      exceptions: z.array(z.object({ ...stretch, meanWatts: z.number(), reason: z.string() })),
    }),
  ),
  /** Share of the variance that steady phases explain; null where nothing had to be simplified. */
  explained: z.number().nullable(),
  /** What the member is asked to do where the proposal is not worth much. */
  advice: z.string().nullable(),
});

export type BandReading = z.infer<typeof bandReading>;
