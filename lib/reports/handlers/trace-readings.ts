import 'server-only';
import { z } from 'zod';
import { category } from '@/lib/catalogue/schema';
import { proposePhases } from '@/lib/measurement/phases/propose';
import { traceWindow } from '@/lib/measurement/traces/levels';
import { defineRoute } from '@/lib/platform/http/route';
import { accuracyOfMine } from '../queries/instruments';
import { readSeries, visibleTrace } from '../queries/traces';
import { readBand } from '../rules/read-bands';
import { traceLevel } from '../schema';
import { bandReading, phaseProposal } from '../schema/band';

const params = z.object({ id: z.string() });
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

export const proposePhasesRoute = defineRoute({
  operationId: 'proposePhases',
  method: 'POST',
  path: '/api/v1/traces/{id}/proposals',
  summary: 'Phases that a trace suggests, by the duty type of its device; the member decides.',
  access: 'member',
  limit: { name: 'proposals', atOnce: 30, perMinute: 60 },
  params,
  body: z.object({ duty: category.shape.duty, band: band.nullable().default(null) }),
  success: { status: 200, description: 'In the order of time.', body: phaseProposal },
  handle: async ({ actor, params: { id }, body }) => {
    const trace = await readSeries(await visibleTrace(actor, id));
    return { body: proposePhases(trace, { duty: body.duty, span: body.band ?? undefined }) };
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

export const traceReadingRoutes = [getTraceWindowRoute, readBandsRoute, proposePhasesRoute, downloadTraceRoute];
