import 'server-only';
import { z } from 'zod';
import { notFound } from '@/lib/platform/errors';
import { defineRoute, type Route } from '@/lib/platform/http/route';
import { presentDevice } from './presenter';
import { deviceByPublicId, listCategories, listDevices } from './queries';
import { category, publicDevice } from './schema';

export const listCategoriesRoute = defineRoute({
  operationId: 'listCategories',
  method: 'GET',
  path: '/api/v1/categories',
  summary: 'The categories with their duty, basis, operating modes and conditions to record.',
  access: 'anyone',
  success: {
    status: 200,
    description: 'Every category, by name.',
    body: z.object({ categories: z.array(category.omit({ id: true, revisionId: true })) }),
  },
  handle: async () => ({ body: { categories: await listCategories() } }),
});

export const listDevicesRoute = defineRoute({
  operationId: 'listDevices',
  method: 'GET',
  path: '/api/v1/devices',
  summary: 'The devices of the catalogue.',
  access: 'anyone',
  success: {
    status: 200,
    description: 'Every device that is neither merged nor refused, by maker and model.',
    body: z.object({ devices: z.array(publicDevice) }),
  },
  handle: async () => ({ body: { devices: (await listDevices()).map(presentDevice) } }),
});

export const getDeviceRoute = defineRoute({
  operationId: 'getDevice',
  method: 'GET',
  path: '/api/v1/devices/{id}',
  summary: 'One device by its public id.',
  access: 'anyone',
  params: z.object({ id: z.string() }),
  success: { status: 200, description: 'The device.', body: publicDevice },
  handle: async ({ params }) => {
    const device = await deviceByPublicId(params.id);
    if (!device) throw notFound('device');
    return { body: presentDevice(device) };
  },
});

export const catalogueRoutes: Route[] = [listCategoriesRoute, listDevicesRoute, getDeviceRoute];
