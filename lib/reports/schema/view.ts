import { z } from 'zod';
import { checklistItem, keys, PHOTO_KINDS, publicId, REPORT_STATES, reportContent } from './content';
import { INSTRUMENT_KINDS } from './instrument';

const figureParts = z.object({
  gain: z.number(),
  offset: z.number(),
  resolution: z.number(),
  repeatability: z.number(),
  drift: z.number(),
  belowLimit: z.number(),
});

/** A coarse level of a trace for drawing: columns of one length. */
export const traceLevel = z.object({
  from: z.array(z.number()),
  minimum: z.array(z.number()),
  maximum: z.array(z.number()),
  mean: z.array(z.number()),
});

export const reportFigure = z.object({
  id: z.int(),
  modeCode: z.string().nullable(),
  modeName: z.string().nullable(),
  quantity: z.enum(['mean-power', 'minimum-power', 'maximum-power', 'day-energy', 'use-energy', 'start-extra-energy']),
  powerKind: z.enum(['real', 'apparent']),
  value: z.number(),
  standardUncertainty: z.number(),
  censoredAt: z.number().nullable(),
  averagingSeconds: z.number().nullable(),
  coverage: z.number().nullable(),
  countedSeconds: z.number(),
  parts: figureParts,
  setAside: z.string().nullable(),
});

export const traceSummary = z.object({
  publicId,
  fileName: z.string(),
  kind: z.enum(['samples', 'averages', 'changes', 'counter']),
  powerKind: z.enum(['real', 'apparent']),
  samples: z.int(),
  startsAt: z.string(),
  endsAt: z.string(),
  averagingSeconds: z.number().nullable(),
  levels: z.array(traceLevel),
});

export const reviewOnRecord = z.object({
  revision: z.int(),
  slot: z.enum(['first', 'second']),
  verdict: z.enum(['verified', 'changes-requested', 'declined']),
  checklist: z.array(z.object({ key: z.string(), result: z.string(), remark: z.string().optional() })).or(z.unknown()),
  reason: z.string(),
  reviewer: z.string(),
  at: z.string(),
  remarks: z.array(z.object({ pointer: z.string(), remark: z.string() })),
});

/** A report in full, as one revision of it stands. */
export const reportView = z.object({
  publicId,
  state: z.enum(REPORT_STATES),
  revision: z.int(),
  content: reportContent,
  hash: z.string(),
  previousHash: z.string().nullable(),
  licence: z.string(),
  sentAt: z.string(),
  member: z.object({ publicId: z.string(), name: z.string() }),
  device: z.object({
    id: z.int(),
    publicId: z.string(),
    name: z.string(),
    slug: z.string(),
    category: z.string(),
    categorySlug: z.string(),
    categoryId: z.int(),
  }),
  variant: z.string().nullable(),
  instrument: z.object({
    kind: z.enum(keys(INSTRUMENT_KINDS)),
    modelName: z.string(),
    percentOfReading: z.number(),
    percentOfRange: z.number(),
    counts: z.number(),
    resolutionWatts: z.number(),
    lowerLimitWatts: z.number().nullable(),
    readsTruePower: z.boolean(),
    calibratedOn: z.string().nullable(),
  }),
  method: z.object({
    code: z.string(),
    name: z.string(),
    minimumSeconds: z.number(),
    minimumCycles: z.int(),
    caution: z.string(),
    checklist: z.array(checklistItem),
  }),
  figures: z.array(reportFigure),
  traces: z.array(traceSummary),
  photos: z.array(
    z.object({
      publicId,
      kind: z.enum(keys(PHOTO_KINDS)),
      caption: z.string(),
      largeWidth: z.int(),
      largeHeight: z.int(),
      smallWidth: z.int(),
      smallHeight: z.int(),
      licence: z.string(),
    }),
  ),
  reviews: z.array(reviewOnRecord),
});

/** A line in a list of reports, with the figure on its category's basis. */
export const reportListItem = z.object({
  publicId,
  state: z.enum(REPORT_STATES),
  member: z.string(),
  memberPublicId: z.string(),
  device: z.string(),
  deviceSlug: z.string(),
  measuredOn: z.string().nullable(),
  instrumentKind: z.enum(keys(INSTRUMENT_KINDS)),
  percentOfReading: z.number(),
  durationSeconds: z.number(),
  value: z.number().nullable(),
  standardUncertainty: z.number().nullable(),
  censoredAt: z.number().nullable(),
  quantity: reportFigure.shape.quantity.nullable(),
  flagged: z.boolean(),
  setAside: z.boolean(),
});

export type ReportFigure = z.infer<typeof reportFigure>;
export type ReportListItem = z.infer<typeof reportListItem>;
export type ReportView = z.infer<typeof reportView>;
