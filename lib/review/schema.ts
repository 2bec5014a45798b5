import { z } from 'zod';
import { reportListItem, reportView } from '@/lib/reports/schema';

export const CHECK_RESULTS = { passed: 'Passed', failed: 'Failed', 'not-applicable': 'Not applicable' } as const;

export const VERDICTS = {
  verified: 'verified',
  'changes-requested': 'changes requested',
  declined: 'declined',
} as const;

const keys = <T extends string>(of: Record<T, string>) => Object.keys(of) as [T, ...T[]];
const text = (most: number) => z.string().trim().max(most, `Shorten this to ${most} characters.`);

export const checkedItem = z.object({
  key: z.string(),
  result: z.enum(keys(CHECK_RESULTS), 'Say whether this passed, failed or does not apply.'),
  remark: text(2000),
});

/** A remark pinned to a field of the report, by its JSON pointer (RFC 6901) into the content. */
export const pinnedRemark = z.object({
  pointer: z.string().regex(/^(\/[^/]*)+$/, 'Choose the field that the remark is about.'),
  remark: text(2000).min(1, 'Say what to change here, or remove the remark.'),
});

/** What a moderator decides about one revision of a report. */
export const verdictInput = z
  .object({
    /** The number of the revision that was looked at. */
    revision: z.int().min(1),
    verdict: z.enum(keys(VERDICTS), 'Choose what becomes of the report.'),
    checklist: z.array(checkedItem).max(50),
    reason: text(4000),
    remarks: z.array(pinnedRemark).max(100),
  })
  .refine(({ verdict, reason }) => verdict === 'verified' || reason !== '', {
    path: ['reason'],
    message: 'Give the reason: the member reads it.',
  });

export const verdictResult = z.object({
  publicId: z.string(),
  revision: z.int(),
  verdict: z.enum(keys(VERDICTS)),
  devicePublicId: z.string(),
  decidedAt: z.string(),
});

export const queueItem = z.object({
  publicId: z.string(),
  revision: z.int(),
  submittedAt: z.string(),
  device: z.object({ name: z.string(), isNew: z.boolean() }),
  category: z.object({ name: z.string(), slug: z.string() }),
  member: z.object({ publicId: z.string(), name: z.string() }),
  instrument: z.string(),
  /** Nobody's report of this device counts yet. */
  isFirstOfDevice: z.boolean(),
  /** Nothing of this member was verified yet. */
  isFirstOfMember: z.boolean(),
  /** It was sent again after changes were requested, or amends a report that counts. */
  isResubmitted: z.boolean(),
  /** The moderator's own: somebody else decides it. */
  isOwn: z.boolean(),
});

export const queue = z.object({
  /** How many wait in all, whatever is asked for. */
  count: z.int(),
  oldestSubmittedAt: z.string().nullable(),
  categories: z.array(z.object({ name: z.string(), slug: z.string(), count: z.int() })),
  items: z.array(queueItem),
});

/** Something that a moderator should look at before deciding; it decides nothing. */
export const warning = z.object({
  kind: z.enum([
    'outside-spread',
    'unit-slip',
    'below-limit',
    'wide-uncertainty',
    'apparent-only',
    'energy-and-power',
    'too-short',
    'same-file',
  ]),
  /** The item of the checklist that it bears on. */
  check: z.string(),
  message: z.string(),
  /** The field of the report that it is about, where there is one. */
  pointer: z.string().nullable(),
});

export const desk = z.object({
  report: reportView,
  isOwn: z.boolean(),
  /** Whether it waits for a verdict at this moment. */
  isWaiting: z.boolean(),
  warnings: z.array(warning),
  /** What else the member has sent, the latest first. */
  otherReports: z.array(reportListItem),
});

export type CheckedItem = z.infer<typeof checkedItem>;
export type Desk = z.infer<typeof desk>;
export type Queue = z.infer<typeof queue>;
export type QueueItem = z.infer<typeof queueItem>;
export type Verdict = keyof typeof VERDICTS;
export type VerdictInput = z.infer<typeof verdictInput>;
export type VerdictResult = z.infer<typeof verdictResult>;
export type Warning = z.infer<typeof warning>;
