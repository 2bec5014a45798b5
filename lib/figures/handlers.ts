import 'server-only';
import { z } from 'zod';
import { categoryByPublicId, deviceByPublicId } from '@/lib/catalogue/queries';
import { notFound } from '@/lib/platform/errors';
import { defineRoute, type Route } from '@/lib/platform/http/route';
import { figuresOfCategory, figuresOfDevice } from './queries/published-figures';
import { historyOf, receiptByHash } from './queries/receipts';
import './register';
import { figure, historyEntry, receipt } from './schema';

const params = z.object({ id: z.string() });
const figures = z.object({ figures: z.array(figure) });

export const getDeviceFiguresRoute = defineRoute({
  operationId: 'getDeviceFigures',
  method: 'GET',
  path: '/api/v1/figures/devices/{id}',
  summary: 'The published figures of a device, by mode and supply, each with the contributors behind it.',
  access: 'anyone',
  params,
  success: { status: 200, description: 'The headline first; empty where nobody has measured it.', body: figures },
  handle: async ({ params: { id } }) => {
    const device = await deviceByPublicId(id);
    if (!device) throw notFound('device');
    return { body: { figures: await figuresOfDevice(device.id) } };
  },
});

export const getCategoryFiguresRoute = defineRoute({
  operationId: 'getCategoryFigures',
  method: 'GET',
  path: '/api/v1/figures/categories/{id}',
  summary: 'The published figures of a category, by mode and supply, each with the devices behind it.',
  access: 'anyone',
  params,
  success: { status: 200, description: 'The headline first; empty where nothing was measured.', body: figures },
  handle: async ({ params: { id } }) => {
    const category = await categoryByPublicId(id);
    if (!category) throw notFound('category');
    return { body: { figures: await figuresOfCategory(category.id) } };
  },
});

export const getReceiptRoute = defineRoute({
  operationId: 'getFigureReceipt',
  method: 'GET',
  path: '/api/v1/figures/receipts/{hash}',
  summary: 'What a published figure rests on, what was left out and why, and how it moved.',
  access: 'anyone',
  params: z.object({ hash: z.string().regex(/^[0-9a-f]{64}$/, 'A receipt is named by 64 hexadecimal digits.') }),
  success: {
    status: 200,
    description: 'The receipt with the figure’s history.',
    body: receipt.extend({ history: z.array(historyEntry) }),
  },
  handle: async ({ params: { hash } }) => {
    const found = await receiptByHash(hash);
    if (!found) throw notFound('receipt of a figure that is published now');
    return { body: { ...found, history: await historyOf(hash) } };
  },
});

export const figureRoutes: Route[] = [getDeviceFiguresRoute, getCategoryFiguresRoute, getReceiptRoute];
