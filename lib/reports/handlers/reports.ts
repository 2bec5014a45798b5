import 'server-only';
import { z } from 'zod';
import { categoryByPublicId } from '@/lib/catalogue/queries';
import { inTransaction } from '@/lib/platform/database/transaction';
import { notFound } from '@/lib/platform/errors';
import { defineRoute } from '@/lib/platform/http/route';
import { previewFigures } from '../commands/preview-figures';
import { sendReport } from '../commands/send-report';
import { withdrawReport } from '../commands/withdraw-report';
import { methodsInUse } from '../queries/methods';
import { reportsOfMember } from '../queries/report-lists';
import { reportByPublicId } from '../queries/reports';
import { reportFigure, reportListItem, reportView, submission } from '../schema';
import { phase, supply, text } from '../schema/content';

const params = z.object({ id: z.string() });

export const sendReportRoute = defineRoute({
  operationId: 'sendReport',
  method: 'POST',
  path: '/api/v1/reports',
  summary: 'Sends a report for review. The same client key again is the same report.',
  access: 'member',
  limit: { name: 'reports', atOnce: 20, perMinute: 5 },
  body: z.object({
    clientKey: z.string().min(8).max(128),
    draftPublicId: z.string().nullable(),
    amendsPublicId: z.string().nullable(),
    submission,
  }),
  success: { status: 201, description: 'The report.', body: z.object({ publicId: z.string() }) },
  handle: async ({ actor, body }) => ({
    body: { publicId: await sendReport({ memberId: actor.memberId, ...body }) },
  }),
});

export const listMyReportsRoute = defineRoute({
  operationId: 'listMyReports',
  method: 'GET',
  path: '/api/v1/reports',
  summary: 'My reports in every state.',
  access: 'member',
  success: { status: 200, description: 'The latest first.', body: z.object({ reports: z.array(reportListItem) }) },
  handle: async ({ actor }) => ({ body: { reports: await reportsOfMember(actor.memberId) } }),
});

export const getReportRoute = defineRoute({
  operationId: 'getReport',
  method: 'GET',
  path: '/api/v1/reports/{id}',
  summary: 'A report: published for everybody, the newest revision for its member and for moderators.',
  access: 'anyone',
  params,
  query: z.object({ revision: z.enum(['published', 'newest']).optional() }),
  success: { status: 200, description: 'The report in full.', body: reportView },
  handle: async ({ actor, params: { id }, query }) => ({
    body: await reportByPublicId(actor, id, query.revision ?? 'published'),
  }),
});

export const withdrawReportRoute = defineRoute({
  operationId: 'withdrawReport',
  method: 'POST',
  path: '/api/v1/reports/{id}/withdrawal',
  summary: 'Withdraws one’s own report: it counts nowhere any more.',
  access: 'member',
  params,
  body: z.object({ reason: text(500).nullable().default(null) }),
  success: { status: 204, description: 'It is withdrawn.', body: null },
  handle: async ({ actor, params: { id }, body }) => {
    await withdrawReport(actor, id, body.reason === '' ? null : body.reason);
    return {};
  },
});

export const listMethodsRoute = defineRoute({
  operationId: 'listMethods',
  method: 'GET',
  path: '/api/v1/methods',
  summary: 'The methods of measurement with their minimum and their caution.',
  access: 'anyone',
  success: {
    status: 200,
    description: 'Those that count.',
    body: z.object({
      methods: z.array(
        z.object({
          code: z.string(),
          name: z.string(),
          summary: z.string(),
          minimumSeconds: z.number(),
          minimumCycles: z.int(),
          caution: z.string(),
          needsConfirmation: z.boolean(),
        }),
      ),
    }),
  },
  handle: async () => ({ body: { methods: await methodsInUse() } }),
});

export const previewFiguresRoute = defineRoute({
  operationId: 'previewFigures',
  method: 'POST',
  path: '/api/v1/figure-previews',
  summary: 'The figures that phases would yield, with their uncertainty, before anything is sent.',
  access: 'member',
  limit: { name: 'previews', atOnce: 60, perMinute: 120 },
  body: z.object({
    categoryPublicId: z.string(),
    instrumentPublicId: z.string(),
    methodCode: z.string().nullable().default(null),
    supplyClass: supply.supplyClass.default('ac-230'),
    supplyVolts: supply.supplyVolts.default(null),
    phases: z.array(phase).min(1).max(200),
  }),
  success: {
    status: 200,
    description: 'Figures, what could not be computed and why, and what the method asks for besides.',
    body: z.object({
      figures: z.array(reportFigure.omit({ id: true, setAside: true, modeName: true })),
      refusals: z.array(z.object({ modeCode: z.string().nullable(), reason: z.string() })),
      missing: z.array(z.string()),
    }),
  },
  handle: async ({ actor, body }) => {
    const category = await categoryByPublicId(body.categoryPublicId);
    if (!category) throw notFound('category');
    return {
      body: await inTransaction((work) => previewFigures(work, actor.memberId, category, body)),
    };
  },
});

export const reportRoutes = [
  sendReportRoute,
  listMyReportsRoute,
  getReportRoute,
  withdrawReportRoute,
  listMethodsRoute,
  previewFiguresRoute,
];
