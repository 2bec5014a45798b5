import { database } from '@/lib/platform/database/connection';
import { now } from '@/lib/platform/clock';
import { publicId } from '@/lib/platform/ids';
import type { Duty } from '@/lib/measurement/units/quantity';

let count = 0;

export interface MadeCategory {
  id: number;
  publicId: string;
  revisionId: number;
  /** The operating modes by their code. */
  modes: Record<string, number>;
}

/** A category with its revision in force, its address and its modes; compared by mean power when idle. */
export async function aCategory({
  name = 'Router',
  duty = 'continuous' as Duty,
  basisQuantity = 'mean-power' as 'mean-power' | 'day-energy' | 'use-energy',
  basisMode = 'idle',
  modes = ['idle', 'busy'],
  poolsVariants = true,
  poolsSupplies = true,
} = {}): Promise<MadeCategory> {
  const { models } = database();
  const modeIds = Object.fromEntries(await Promise.all(modes.map(async (code) => [code, await aMode(code)] as const)));
  const category = await models.Category.create({
    publicId: publicId(),
    name: `${name} ${(count += 1)}`,
    createdAt: now(),
  });
  const revision = await models.CategoryRevision.create({
    categoryId: category.id,
    n: 1,
    summary: `What a ${name.toLowerCase()} does.`,
    duty,
    basisQuantity,
    basisModeId: basisQuantity === 'mean-power' ? (modeIds[basisMode] ?? null) : null,
    poolsVariants,
    poolsSupplies,
    unitSpread: 0.05,
    mayBeSwitchedOff: true,
    usePattern: { hoursByMode: { idle: 24 }, usesPerDay: null },
    conditions: [],
    cautions: [],
    createdAt: now(),
  });
  await models.CategoryMode.bulkCreate(
    Object.values(modeIds).map((modeId, i) => ({
      categoryRevisionId: revision.id,
      modeId,
      position: i + 1,
      note: '',
    })),
  );
  await category.update({ currentRevisionId: revision.id });
  await aSlug('category', category.id, `category-${category.id}`);
  return { id: category.id, publicId: category.publicId, revisionId: revision.id, modes: modeIds };
}

async function aMode(code: string): Promise<number> {
  const { OperatingMode } = database().models;
  const name = code.replaceAll('-', ' ');
  const defaults = { code, name: name.charAt(0).toUpperCase() + name.slice(1), definition: `It is ${name}.` };
  const [mode] = await OperatingMode.findOrCreate({ where: { code }, defaults });
  return mode.id;
}

export interface MadeDevice {
  id: number;
  publicId: string;
  slug: string;
  category: MadeCategory;
}

/** A confirmed device with its maker and its address. */
export async function aDevice(category: MadeCategory, model?: string): Promise<MadeDevice> {
  const { Maker, Device } = database().models;
  const n = (count += 1);
  const maker = await Maker.create({ publicId: publicId(), name: `Tarnholm ${n}`, createdAt: now() });
  const device = await Device.create({
    publicId: publicId(),
    categoryId: category.id,
    makerId: maker.id,
    model: model ?? `T-${n}`,
    state: 'confirmed',
    createdAt: now(),
  });
  const slug = `device-${device.id}`;
  await aSlug('device', device.id, slug);
  return { id: device.id, publicId: device.publicId, slug, category };
}

export async function aVariant(device: MadeDevice, generation: string): Promise<number> {
  const variant = await database().models.Variant.create({ deviceId: device.id, generation, createdAt: now() });
  return variant.id;
}

async function aSlug(targetKind: 'category' | 'device', targetId: number, slug: string) {
  await database().models.Slug.create({ slug, targetKind, targetId, current: true, createdAt: now() });
}
