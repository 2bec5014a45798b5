import 'server-only';
import { unstable_cache } from 'next/cache';
import { cache } from 'react';
import { rank, type SearchEntry } from '@/lib/platform/search/rank';
import { categoryById, deviceById, devicesOfCategory, listCategories, listDevices, resolveSlug } from './queries';
import type { Category, Device } from './schema';

/** What a page's address leads to: the thing, an old address that moved, or nothing. */
export type Found<T> = { kind: 'found'; value: T } | { kind: 'moved'; slug: string } | { kind: 'missing' };

export const loadCategories = cache(
  unstable_cache(listCategories, ['categories'], { tags: ['catalogue'], revalidate: false }),
);

export const loadDevices = cache(unstable_cache(listDevices, ['devices'], { tags: ['catalogue'], revalidate: false }));

export const loadCategoryBySlug = cache((slug: string) => bySlug<Category>('category', slug, categoryById));

export const loadDeviceBySlug = cache((slug: string) => bySlug<Device>('device', slug, deviceById));

/**
 * The address itself is looked up afresh at each rendering, so that one that led nowhere can lead somewhere. The thing
 * is read even where the address moved: that ties the redirect's page to the thing's cache tag.
 */
async function bySlug<T>(
  kind: 'category' | 'device',
  slug: string,
  read: (id: number) => Promise<T | null>,
): Promise<Found<T>> {
  const target = await resolveSlug(kind, slug);
  if (!target) return { kind: 'missing' };
  const tags = [`${kind}:${target.targetId}`];
  const value = await unstable_cache(read, [kind, String(target.targetId)], { tags, revalidate: false })(
    target.targetId,
  );
  if (!value) return { kind: 'missing' };
  return target.currentSlug === slug ? { kind: 'found', value } : { kind: 'moved', slug: target.currentSlug };
}

export const loadDevicesOfCategory = cache((categoryId: number): Promise<Device[]> => {
  const load = unstable_cache(devicesOfCategory, ['devices-of-category', String(categoryId)], {
    tags: [`category:${categoryId}`],
    revalidate: false,
  });
  return load(categoryId);
});

/** A category by its id, which a device's page knows. */
export const loadCategoryById = cache((categoryId: number): Promise<Category | null> => {
  const load = unstable_cache(categoryById, ['category', String(categoryId)], {
    tags: [`category:${categoryId}`],
    revalidate: false,
  });
  return load(categoryId);
});

let searched: { devices: readonly Device[]; entries: SearchEntry[] } | null = null;

/** The devices that a query most likely means, the best first; those of one category stay in that order too. */
export async function findDevices(query: string, most: number): Promise<Device[]> {
  const devices = await loadDevices();
  // The index is made anew only when the catalogue has changed: the cached list is read afresh at each request.
  if (searched === null || !sameDevices(searched.devices, devices)) {
    const entries = devices.map(({ publicId, name, aliases, category }) => ({
      id: publicId,
      name,
      words: [...aliases, category.name],
    }));
    searched = { devices, entries };
  }
  const byId = new Map(devices.map((device) => [device.publicId, device]));
  return rank(searched.entries, query, most).flatMap(({ id }) => byId.get(id) ?? []);
}

function sameDevices(a: readonly Device[], b: readonly Device[]): boolean {
  const said = ({ publicId, name, aliases, category }: Device) =>
    `${publicId} ${name} ${aliases.join()} ${category.name}`;
  return a.length === b.length && a.every((device, i) => b[i] !== undefined && said(device) === said(b[i]));
}
