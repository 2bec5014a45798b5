import 'server-only';
import { z } from 'zod';
import { findCycles } from '@/lib/measurement/phases/cycles';
import { stretchFigures } from '@/lib/measurement/traces/figures';
import { traceWindow } from '@/lib/measurement/traces/levels';
import { AppError } from '@/lib/platform/errors';
import { fieldProblems } from '@/lib/platform/http/problem';
import { defineRoute } from '@/lib/platform/http/route';
import { dropFile } from '@/lib/platform/storage/files';
import { receiveUpload } from '@/lib/platform/storage/receive-upload';
import { acceptTrace, readAgain } from '../commands/traces';
import { readSeries, summariseTrace, visibleTrace } from '../queries/traces';
import { traceLevel, traceSummary } from '../schema';
import { traceCorrections, traceReading, zoneName } from '../schema/trace';

const MOST_BYTES = 64_000_000;
const params = z.object({ id: z.string() });

/** The fields beside the file; corrections come as JSON, since a multipart field is a text. */
const uploadFields = z.object({
  zone: zoneName.default('UTC'),
  corrections: z
    .string()
    .default('{}')
    .transform((text, context) => {
      try {
        return JSON.parse(text) as unknown;
      } catch {
        context.addIssue({ code: 'custom', message: 'The corrections are no JSON.' });
        return z.NEVER;
      }
    })
    .pipe(traceCorrections),
});

export const uploadTraceRoute = defineRoute({
  operationId: 'uploadTrace',
  method: 'POST',
  path: '/api/v1/traces',
  summary: 'Sends a logger’s file and reads it. Where something is open, the answer asks.',
  access: 'member',
  limit: { name: 'trace uploads', atOnce: 20, perMinute: 10 },
  upload: {
    description:
      'The file in “file” (CSV, at most 64 MB), the IANA zone in “zone”, corrections as JSON in “corrections”.',
  },
  success: { status: 200, description: 'The trace, or what must be answered first.', body: traceReading },
  handle: async ({ actor, request }) => {
    const upload = await receiveUpload(request, MOST_BYTES);
    const zone = zoneName.safeParse(upload.fields.zone ?? 'UTC');
    if (!zone.success)
      throw new AppError('bad-input', 'The time zone is none that is known. Choose one from the list.');
    const corrections = traceCorrections.parse(JSON.parse(upload.fields.corrections ?? '{}'));
    return { body: await acceptTrace(actor.memberId, upload, { zone: zone.data, corrections }) };
  },
});

export const readTraceAgainRoute = defineRoute({
  operationId: 'readTraceAgain',
  method: 'POST',
  path: '/api/v1/trace-uploads/{id}/readings',
  summary: 'Reads a file that was sent again, with what the member set right.',
  access: 'member',
  limit: { name: 'trace readings', atOnce: 60, perMinute: 60 },
  params,
  body: z.object({ zone: zoneName, corrections: traceCorrections }),
  success: { status: 200, description: 'The trace, or what must be answered first.', body: traceReading },
  handle: async ({ actor, params: { id }, body }) => ({ body: await readAgain(actor.memberId, id, body) }),
});

export const getTraceRoute = defineRoute({
  operationId: 'getTrace',
  method: 'GET',
  path: '/api/v1/traces/{id}',
  summary: 'A trace with its coarse levels.',
  access: 'anyone',
  params,
  success: { status: 200, description: 'The trace.', body: traceSummary },
  handle: async ({ actor, params: { id } }) => {
    const row = await visibleTrace(actor, id);
    return { body: { fileName: row.fileName, ...summariseTrace(row) } };
  },
});

const seconds = z
  .string()
  .regex(/^-?\d+(\.\d+)?$/, 'Give seconds as a number.')
  .transform(Number);

export const getTraceWindowRoute = defineRoute({
  operationId: 'getTraceWindow',
  method: 'GET',
  path: '/api/v1/traces/{id}/window',
  summary: 'A window of a trace: minimum, maximum and mean of at most so many blocks, and the window’s figures.',
  access: 'anyone',
  params,
  query: z.object({ from: seconds, to: seconds, blocks: seconds.optional() }),
  success: {
    status: 200,
    description: 'The blocks, and the figures of the window.',
    body: z.object({
      level: traceLevel,
      figures: z
        .object({
          countedSeconds: z.number(),
          coverage: z.number(),
          energyWattHours: z.number(),
          meanWatts: z.number(),
          minimumWatts: z.number(),
          maximumWatts: z.number(),
          averagingSeconds: z.number(),
        })
        .nullable(),
      cycles: z.object({ whole: z.int().nullable(), reason: z.string().nullable() }),
    }),
  },
  handle: async ({ actor, params: { id }, query }) => {
    const trace = await readSeries(await visibleTrace(actor, id));
    const blocks = Math.min(4000, Math.max(10, query.blocks ?? 1000));
    const cycles = findCycles(trace, query.from, query.to);
    return {
      body: {
        level: traceWindow(trace, query.from, query.to, blocks),
        figures: stretchFigures(trace, query.from, query.to),
        cycles: cycles.accepted
          ? { whole: cycles.cycles.length, reason: null }
          : { whole: null, reason: cycles.reason },
      },
    };
  },
});

export const downloadTraceRoute = defineRoute({
  operationId: 'downloadTrace',
  method: 'GET',
  path: '/api/v1/traces/{id}/series',
  summary: 'The normalised series of a trace as CSV.',
  access: 'anyone',
  params,
  success: { status: 200, description: 'Time (UTC) and value.', body: null, contentType: 'text/csv' },
  handle: async ({ actor, params: { id } }) => {
    const trace = await readSeries(await visibleTrace(actor, id));
    const unit = trace.kind === 'counter' ? 'energy_Wh' : trace.powerKind === 'real' ? 'power_W' : 'power_VA';
    const encoder = new TextEncoder();
    let at = 0;
    const stream = new ReadableStream<Uint8Array>({
      start: (controller) => controller.enqueue(encoder.encode(`time_utc,${unit}\r\n`)),
      pull: (controller) => {
        const rows: string[] = [];
        for (let end = Math.min(trace.values.length, at + 5000); at < end; at += 1) {
          rows.push(`${new Date((trace.timeSeconds[at] as number) * 1000).toISOString()},${trace.values[at]}`);
        }
        if (rows.length > 0) controller.enqueue(encoder.encode(`${rows.join('\r\n')}\r\n`));
        if (at >= trace.values.length) controller.close();
      },
    });
    return new Response(stream, {
      headers: {
        'content-type': 'text/csv; charset=utf-8; header=present',
        'content-disposition': `attachment; filename="trace-${id}.csv"`,
      },
    });
  },
});

export const traceRoutes = [
  uploadTraceRoute,
  readTraceAgainRoute,
  getTraceRoute,
  getTraceWindowRoute,
  downloadTraceRoute,
];
