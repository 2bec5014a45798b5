import 'server-only';
import { unstable_cache } from 'next/cache';
import { cache } from 'react';
import {
  devicesOfCategoryWithFigures,
  figuresOfCategory,
  figuresOfDevice,
  recentlyChangedFigures,
  typicalDraws,
} from './queries/published-figures';
import type { ChangedFigure, DeviceWithFigure, Figure } from './schema';

/** A device's figures. Its stones are flagged against the category's median, so they go stale with that too. */
export const loadFiguresOfDevice = cache((deviceId: number, categoryId: number): Promise<Figure[]> => {
  const tags = [`device:${deviceId}`, `category:${categoryId}`];
  return unstable_cache(figuresOfDevice, ['figures-of-device', String(deviceId)], { tags, revalidate: false })(
    deviceId,
  );
});

export const loadFiguresOfCategory = cache((categoryId: number): Promise<Figure[]> => {
  const load = unstable_cache(figuresOfCategory, ['figures-of-category', String(categoryId)], {
    tags: [`category:${categoryId}`],
    revalidate: false,
  });
  return load(categoryId);
});

export const loadDevicesOfCategoryWithFigures = cache((categoryId: number): Promise<DeviceWithFigure[]> => {
  const load = unstable_cache(devicesOfCategoryWithFigures, ['devices-with-figures', String(categoryId)], {
    tags: [`category:${categoryId}`],
    revalidate: false,
  });
  return load(categoryId);
});

export const loadRecentlyChangedFigures = cache((most: number): Promise<ChangedFigure[]> => {
  const load = unstable_cache(recentlyChangedFigures, ['recently-changed-figures', String(most)], {
    tags: ['catalogue'],
    revalidate: false,
  });
  return load(most);
});

/** The headline figures of devices, for lists that mix categories. */
export const loadTypicalDraws = cache(async (deviceIds: readonly number[]): Promise<Map<number, Figure>> => {
  const read = async (ids: number[]) => [...(await typicalDraws(ids))];
  const ids = [...deviceIds].sort((a, b) => a - b);
  const load = unstable_cache(read, ['typical-draws', ids.join(',')], { tags: ['catalogue'], revalidate: false });
  return new Map(await load(ids));
});
