import 'server-only';
import { z } from 'zod';
import { AppError } from '@/lib/platform/errors';
import { fieldProblems } from '@/lib/platform/http/problem';
import { defineRoute } from '@/lib/platform/http/route';
import { dropFile } from '@/lib/platform/storage/files';
import { receiveUpload } from '@/lib/platform/storage/receive-upload';
import { acceptTrace, readAgain } from '../commands/traces';
import { maySeeFileName } from '../policy';
import { summariseTrace, visibleTrace } from '../queries/traces';
import { traceSummary } from '../schema';
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

export const traceRoutes = [uploadTraceRoute, readTraceAgainRoute, getTraceRoute];
