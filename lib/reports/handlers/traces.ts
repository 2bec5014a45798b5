import 'server-only';
import { z } from 'zod';
import { traceWindow } from '@/lib/measurement/traces/levels';
import { AppError } from '@/lib/platform/errors';
import { fieldProblems } from '@/lib/platform/http/problem';
import { defineRoute } from '@/lib/platform/http/route';
import { dropFile } from '@/lib/platform/storage/files';
import { receiveUpload } from '@/lib/platform/storage/receive-upload';
import { acceptTrace, readAgain } from '../commands/traces';
import { maySeeFileName } from '../policy';
import { accuracyOfMine } from '../queries/instruments';
import { readSeries, summariseTrace, visibleTrace } from '../queries/traces';
import { readBand } from '../rules/read-bands';
import { traceLevel, traceSummary } from '../schema';
import { bandReading } from '../schema/band';
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
    const options = uploadFields.safeParse(upload.fields);
    if (!options.success) {
      await dropFile(upload.path);
      throw new AppError('bad-input', 'Something beside the file can’t be used as it is; each field says why.', {
        fields: fieldProblems(options.error),
      });
    }
    return { body: await acceptTrace(actor.memberId, upload, options.data) };
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
    return { body: summariseTrace(row, maySeeFileName(actor, row)) };
  },
});

const seconds = z
  .string()
  .regex(/^-?\d{1,12}(\.\d{1,9})?$/, 'Give seconds as a number.')
  .transform(Number);
const blocks = z
  .string()
  .regex(/^\d{1,4}$/, 'Give a whole number up to 4,000.')
  .transform((text) => Math.min(4000, Math.max(10, Number(text))));

export const getTraceWindowRoute = defineRoute({
  operationId: 'getTraceWindow',
  method: 'GET',
  path: '/api/v1/traces/{id}/window',
  summary: 'A window of a trace for drawing: minimum, maximum and mean of at most so many blocks.',
  access: 'anyone',
  params,
  query: z.object({ from: seconds, to: seconds, blocks: blocks.optional() }),
  success: { status: 200, description: 'The blocks.', body: z.object({ level: traceLevel }) },
  handle: async ({ actor, params: { id }, query }) => {
    const trace = await readSeries(await visibleTrace(actor, id));
    return { body: { level: traceWindow(trace, query.from, query.to, query.blocks ?? 1000) } };
  },
});

const band = z
  .object({ fromSeconds: z.number(), toSeconds: z.number() })
  .refine((given) => given.toSeconds > given.fromSeconds, {
    path: ['toSeconds'],
    message: 'The end lies before the start. Move one of the edges.',
  });

export const readBandsRoute = defineRoute({
  operationId: 'readBands',
  method: 'POST',
  path: '/api/v1/traces/{id}/figures',
  summary: 'The figures of stretches of a trace, with the uncertainty that one of my instruments leaves.',
  access: 'anyone',
  limit: { name: 'band figures', atOnce: 60, perMinute: 120 },
  params,
  body: z.object({ bands: z.array(band).min(1).max(50), instrumentPublicId: z.string().nullable().default(null) }),
  success: {
    status: 200,
    description: 'In the order of the stretches.',
    body: z.object({ bands: z.array(bandReading) }),
  },
  handle: async ({ actor, params: { id }, body }) => {
    const trace = await readSeries(await visibleTrace(actor, id));
    const accuracy =
      body.instrumentPublicId && actor ? await accuracyOfMine(actor.memberId, body.instrumentPublicId) : null;
    return { body: { bands: body.bands.map((one) => readBand(trace, one, accuracy)) } };
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
        'content-security-policy': "default-src 'none'; sandbox",
        'cross-origin-resource-policy': 'same-origin',
        'x-content-type-options': 'nosniff',
      },
    });
  },
});

export const traceRoutes = [
  uploadTraceRoute,
  readTraceAgainRoute,
  getTraceRoute,
  getTraceWindowRoute,
  readBandsRoute,
  downloadTraceRoute,
];
