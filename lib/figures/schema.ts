import { z } from 'zod';
import { QUANTITIES } from '@/lib/measurement/units/quantity';

/** What one stone of the pile stands for: a contributor of a device, a device of a category. */
export const stone = z.object({
  /** Decides the stone's look: the contributor's or the device's public id. */
  id: z.string(),
  value: z.number(),
  atMost: z.boolean(),
  flagged: z.boolean(),
  setAside: z.boolean(),
  label: z.string(),
});

export const counts = z.object({
  devices: z.int(),
  contributors: z.int(),
  instruments: z.int(),
  reports: z.int(),
});

/** A published figure without its pile. */
export const figureSummary = z.object({
  mode: z.object({ code: z.string(), name: z.string() }).nullable(),
  quantity: z.enum(QUANTITIES),
  powerKind: z.enum(['real', 'apparent']),
  supplyStratum: z.enum(['ac-any', 'ac-230', 'ac-120', 'dc']),
  variant: z.object({ id: z.int(), label: z.string() }).nullable(),
  /** W, VA, Wh/d, Wh/use or Wh. */
  unit: z.string(),
  /** On the category's basis, and the first to be shown of those. */
  isHeadline: z.boolean(),
  /** The first to be shown among the supplies of one mode and quantity. */
  isMain: z.boolean(),
  n: z.int(),
  median: z.number(),
  /** The median is at most this: readings below what an instrument can read leave it open. */
  atMost: z.boolean(),
  minimum: z.number(),
  maximum: z.number(),
  lowerQuartile: z.number().nullable(),
  upperQuartile: z.number().nullable(),
  tenthPercentile: z.number().nullable(),
  ninetiethPercentile: z.number().nullable(),
  /** Of the median, with the exact probability that it encloses it. */
  interval: z.object({ low: z.number(), high: z.number(), coverage: z.number() }).nullable(),
  standardUncertainty: z.number().nullable(),
  degreesOfFreedom: z.number().nullable(),
  flagged: z.int(),
  setAside: z.int(),
  counts,
  ruleVersion: z.string(),
  /** Names this figure's receipt. */
  receiptHash: z.string(),
  changedAt: z.string(),
});

export const figure = figureSummary.extend({ stones: z.array(stone) });

/** A device in its category's table: what it draws on the category's basis, or nothing yet. */
export const deviceWithFigure = z.object({
  deviceId: z.int(),
  publicId: z.string(),
  slug: z.string(),
  name: z.string(),
  figure: figureSummary.nullable(),
});

export const changedFigure = z.object({
  device: z.object({ publicId: z.string(), name: z.string(), slug: z.string(), category: z.string() }),
  figure,
  /** The median before, or null where this is the first. */
  medianBefore: z.number().nullable(),
});

export const historyEntry = z.object({
  at: z.string(),
  n: z.int(),
  median: z.number().nullable(),
  minimum: z.number().nullable(),
  maximum: z.number().nullable(),
  atMost: z.boolean(),
  /** What caused it, and the report concerned where there is one. */
  cause: z.string().nullable(),
  reportPublicId: z.string().nullable(),
  receiptHash: z.string(),
});

/** What a published figure rests on, and what was left out and why. */
export const receipt = z.object({
  scope: z.object({ kind: z.enum(['device', 'category']), publicId: z.string(), name: z.string() }),
  figure: figureSummary,
  inputs: z.array(
    z.object({
      reportPublicId: z.string().nullable(),
      revision: z.int().nullable(),
      devicePublicId: z.string().nullable(),
      voice: z.string(),
      value: z.number(),
      standardUncertainty: z.number().nullable(),
      counted: z.boolean(),
      flagged: z.boolean(),
      reason: z.string().nullable(),
    }),
  ),
});

export type ChangedFigure = z.infer<typeof changedFigure>;
export type DeviceWithFigure = z.infer<typeof deviceWithFigure>;
export type Figure = z.infer<typeof figure>;
export type FigureStone = z.infer<typeof stone>;
export type FigureSummary = z.infer<typeof figureSummary>;
export type HistoryEntry = z.infer<typeof historyEntry>;
export type Receipt = z.infer<typeof receipt>;
