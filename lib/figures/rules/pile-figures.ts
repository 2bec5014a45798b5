import { poolKey, poolsOf, type Pool } from '@/lib/measurement/aggregation/pooling';
import { publishCategoryFigure, type DeviceFigure } from '@/lib/measurement/aggregation/publish-category';
import { publishDeviceFigure } from '@/lib/measurement/aggregation/publish-device';
import type { PublishedFigure, VerifiedFigure } from '@/lib/measurement/aggregation/types';
import { median } from '@/lib/measurement/statistics/median';
import type { SupplyClass } from '@/lib/measurement/units/quantity';

/** What a category says of pooling, and how far two units of one device usually differ. */
export interface PoolingSettings {
  poolsVariants: boolean;
  poolsSupplies: boolean;
  unitSpread: number;
}

/** A figure of a verified report with what decides where it is pooled. */
export interface PoolableFigure extends VerifiedFigure, Omit<Pool, 'supplyStratum'> {
  supplyClass: SupplyClass;
  averagingSeconds: number | null;
  methodCounts: boolean;
}

/** A figure and the pool it is the figure of. */
export interface PooledFigure {
  pool: Pool;
  figure: PublishedFigure;
}

/** What one device brings to its category in one pool: its figure, and who and what stands behind it. */
export interface DeviceContribution extends Omit<DeviceFigure, 'deviceId'> {
  deviceId: string;
  pool: Pool;
  contributors: readonly string[];
  instruments: readonly string[];
  reports: readonly string[];
}

/**
 * Every figure that one device's verified reports yield.
 *
 * No figure is measured against the category's median here: a device's rows would then move whenever another device of
 * its category does, and one verification would touch them all. A device far from its category is flagged in the
 * category's own figure, and its stones when they are read.
 */
export function figuresOfReports(figures: readonly PoolableFigure[], settings: PoolingSettings): PooledFigure[] {
  return pile(figures, (figure) => poolsOf(figure, settings)).flatMap(({ pool, members }) => {
    const figure = publishDeviceFigure(members, { unitSpread: settings.unitSpread, categoryMedian: null });
    return figure ? [{ pool, figure }] : [];
  });
}

/** Every figure that a category's devices yield: one device, one voice. */
export function figuresOfDevices(contributions: readonly DeviceContribution[]): PooledFigure[] {
  const withoutVariant = ({ pool }: DeviceContribution): Pool[] => [{ ...pool, variantId: null }];
  return pile(contributions, withoutVariant).flatMap(({ pool, members }) => {
    const devices = voicesOfDevices(members);
    const figure = publishCategoryFigure(devices, {
      devices: devices.length,
      contributors: countDistinct(members.map((member) => member.contributors)),
      instruments: countDistinct(members.map((member) => member.instruments)),
      reports: countDistinct(members.map((member) => member.reports)),
    });
    return figure ? [{ pool, figure }] : [];
  });
}

/** Where variants are published apart, a device speaks in its category with the median of their medians. */
function voicesOfDevices(members: readonly DeviceContribution[]): DeviceFigure[] {
  return groupBy(members, (member) => member.deviceId).map((variants) => ({
    deviceId: (variants[0] as DeviceContribution).deviceId,
    median: median(variants.map((variant) => variant.median)),
    medianLow: median(variants.map((variant) => variant.medianLow)),
    setAside: variants.reduce((total, variant) => total + variant.setAside, 0),
  }));
}

function pile<T>(items: readonly T[], poolsOfItem: (item: T) => Pool[]): { pool: Pool; members: T[] }[] {
  const piles = new Map<string, { pool: Pool; members: T[] }>();
  for (const item of items) {
    for (const pool of poolsOfItem(item)) {
      const key = poolKey(pool);
      const known = piles.get(key);
      if (known) known.members.push(item);
      else piles.set(key, { pool, members: [item] });
    }
  }
  return [...piles.values()];
}

function groupBy<T>(items: readonly T[], keyOf: (item: T) => string): T[][] {
  const groups = new Map<string, T[]>();
  for (const item of items) groups.set(keyOf(item), [...(groups.get(keyOf(item)) ?? []), item]);
  return [...groups.values()];
}

const countDistinct = (lists: readonly (readonly string[])[]) => new Set(lists.flat()).size;
