import { z } from 'zod';
import type { TraceCorrections, TraceDescription } from '@/lib/measurement/traces/import/types';

/** An IANA zone that this machine knows, by any of its names. */
export const zoneName = z
  .string()
  .max(60)
  .refine(isZone, 'This is no time zone that is known. Choose one from the list.');

function isZone(name: string): boolean {
  try {
    return new Intl.DateTimeFormat('en', { timeZone: name }).resolvedOptions().timeZone !== '';
  } catch {
    return false;
  }
}

const TIME_FORMATS = [
  'iso',
  'year-first',
  'day-first',
  'month-first',
  'epoch-seconds',
  'epoch-milliseconds',
  'serial-day',
  'clock',
  'elapsed-seconds',
  'none',
] as const;

/** What a member may set right in the reading of a file. */
export const traceCorrections: z.ZodType<TraceCorrections> = z.strictObject({
  delimiter: z.enum([',', ';', '\t', '|']).optional(),
  decimalMark: z.enum(['.', ',']).optional(),
  timeFormat: z.enum(TIME_FORMATS).optional(),
  timeColumn: z.int().min(0).max(500).optional(),
  dateColumn: z.int().min(0).max(500).nullable().optional(),
  valueColumn: z.int().min(0).max(500).optional(),
  unit: z.enum(['mW', 'W', 'kW', 'VA', 'kVA', 'Wh', 'kWh', 'A']).optional(),
  kind: z.enum(['samples', 'averages', 'changes', 'counter']).optional(),
  stamp: z.enum(['start', 'end']).optional(),
  averagingSeconds: z.number().positive().max(86_400).optional(),
  volts: z.number().positive().max(1000).optional(),
  stepSeconds: z.number().positive().max(86_400).optional(),
  startsAt: z.iso.datetime({ offset: true, message: 'Give a date and a time.' }).optional(),
  turnSign: z.boolean().optional(),
  leaveOutMissing: z.boolean().optional(),
  segment: z.int().min(0).max(1000).optional(),
});

/** The description is the importer's own and goes out as it is: nothing in it is a secret of the server. */
const description = z.custom<TraceDescription>((value) => typeof value === 'object' && value !== null);

export const traceReading = z.discriminatedUnion('status', [
  z.object({ status: z.literal('read'), uploadPublicId: z.string(), tracePublicId: z.string(), description }),
  z.object({ status: z.literal('needs-answers'), uploadPublicId: z.string(), description }),
]);

export type TraceReadingAnswer = z.infer<typeof traceReading>;
