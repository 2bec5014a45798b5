import { cache } from 'react';
import { loadCategoryById, loadDeviceBySlug } from '@/lib/catalogue/loaders';
import type { Category, Device } from '@/lib/catalogue/schema';
import { loadClaimsOfDevice } from '@/lib/claims/loaders';
import { compareClaims, type ClaimBeside } from '@/lib/claims/rules';
import { loadFiguresOfDevice } from '@/lib/figures/loaders';
import type { Figure } from '@/lib/figures/schema';
import { loadAmbientOfDevice, loadReportsOfDevice } from '@/lib/reports/loaders';
import type { ReportListItem } from '@/lib/reports/schema';

export type DeviceSheet =
  | { kind: 'missing' }
  | { kind: 'moved'; slug: string }
  | {
      kind: 'found';
      device: Device;
      category: Category;
      figures: Figure[];
      besides: ClaimBeside<Figure>[];
      reports: ReportListItem[];
    };

/** Everything that a device's sheet shows, read once for its head and its body. */
export const loadDeviceSheet = cache(async (slug: string): Promise<DeviceSheet> => {
  const found = await loadDeviceBySlug(slug);
  if (found.kind !== 'found') return found;
  const device = found.value;
  const [category, figures, claims, ambientCelsius, reports] = await Promise.all([
    loadCategoryById(device.category.id),
    loadFiguresOfDevice(device.id, device.category.id),
    loadClaimsOfDevice(device.id),
    loadAmbientOfDevice(device.id),
    loadReportsOfDevice(device.id),
  ]);
  if (!category) return { kind: 'missing' };
  const besides = compareClaims(claims, figures, { duty: category.duty, ambientCelsius });
  return { kind: 'found', device, category, figures, besides, reports };
});
