import { findOrAddMaker, giveSlug } from '@/lib/catalogue/commands';
import { recordClaim } from '@/lib/claims/commands';
import { now } from '@/lib/platform/clock';
import type { Work } from '@/lib/platform/database/transaction';
import { publicId } from '@/lib/platform/ids';
import { CATEGORIES, CATEGORY_GROUPS, type CategorySeed } from './catalogue/categories';
import { DEVICES, type ClaimSeed, type DeviceSeed } from './catalogue/devices';
import { CHECKLIST, METHODS } from './catalogue/methods';
import { OPERATING_MODES } from './catalogue/modes';

/** Where a seeded device is found again. */
export interface SeededDevice {
  id: number;
  publicId: string;
  variantIds: number[];
}

export async function seedCatalogue(work: Work): Promise<Map<string, SeededDevice>> {
  const modes = await seedModes(work);
  const categories = await seedCategories(work, modes);
  await seedMethods(work);
  const devices = new Map<string, SeededDevice>();
  for (const device of DEVICES) devices.set(device.key, await seedDevice(work, device, categories, modes));
  return devices;
}

async function seedModes(work: Work): Promise<Map<string, number>> {
  const rows = await work.models.OperatingMode.bulkCreate(
    OPERATING_MODES.map(([code, name, definition]) => ({ code, name, definition })),
    { transaction: work.transaction, returning: true },
  );
  return new Map(rows.map((row) => [row.code, row.id]));
}

async function seedCategories(work: Work, modes: ReadonlyMap<string, number>): Promise<Map<string, number>> {
  const { transaction } = work;
  const ids = new Map<string, number>();
  const add = async (name: string, parentId: number | null) => {
    const row = await work.models.Category.create(
      { publicId: publicId(), name, parentId, createdAt: now() },
      { transaction },
    );
    await giveSlug(work, 'category', row.id, name);
    ids.set(name, row.id);
    return row;
  };
  for (const group of CATEGORY_GROUPS) await add(group, null);
  for (const seed of CATEGORIES) {
    const row = await add(seed.name, seed.parent === null ? null : (ids.get(seed.parent) ?? null));
    await row.update({ currentRevisionId: await addCategoryRevision(work, row.id, seed, modes) }, { transaction });
  }
  return ids;
}

async function addCategoryRevision(
  work: Work,
  categoryId: number,
  seed: CategorySeed,
  modes: ReadonlyMap<string, number>,
): Promise<number> {
  const { transaction } = work;
  const revision = await work.models.CategoryRevision.create(
    {
      categoryId,
      n: 1,
      summary: seed.summary,
      duty: seed.duty,
      basisQuantity: seed.basis.quantity,
      basisModeId: seed.basis.mode === null ? null : (modes.get(seed.basis.mode) ?? null),
      poolsVariants: true,
      poolsSupplies: false,
      unitSpread: seed.unitSpread,
      mayBeSwitchedOff: seed.mayBeSwitchedOff,
      usePattern: seed.usePattern,
      conditions: seed.conditions,
      cautions: seed.cautions,
      createdAt: now(),
    },
    { transaction },
  );
  await work.models.CategoryMode.bulkCreate(
    seed.modes.map(([code, note], i) => ({
      categoryRevisionId: revision.id,
      modeId: modes.get(code) as number,
      position: i + 1,
      note,
    })),
    { transaction },
  );
  return revision.id;
}

async function seedMethods(work: Work): Promise<void> {
  const { transaction } = work;
  for (const { code, ...content } of METHODS) {
    const method = await work.models.Method.create({ code }, { transaction });
    const revision = await work.models.MethodRevision.create(
      { ...content, methodId: method.id, n: 1, counts: true, checklist: [...CHECKLIST], createdAt: now() },
      { transaction },
    );
    await method.update({ currentRevisionId: revision.id }, { transaction });
  }
}

async function seedDevice(
  work: Work,
  seed: DeviceSeed,
  categories: ReadonlyMap<string, number>,
  modes: ReadonlyMap<string, number>,
): Promise<SeededDevice> {
  const { transaction } = work;
  const row = await work.models.Device.create(
    {
      publicId: publicId(),
      categoryId: categories.get(seed.category) as number,
      makerId: await findOrAddMaker(work, seed.maker),
      model: seed.model,
      state: 'confirmed',
      createdAt: now(),
    },
    { transaction },
  );
  await giveSlug(work, 'device', row.id, `${seed.maker} ${seed.model}`);
  await work.models.DeviceAlias.bulkCreate(
    seed.aliases.map((name) => ({ deviceId: row.id, name, createdAt: now() })),
    { transaction },
  );
  const variants = await work.models.Variant.bulkCreate(
    seed.variants.map((variant) => ({ ...variant, deviceId: row.id, ratedSupply: '230 V, 50 Hz', createdAt: now() })),
    { transaction, returning: true },
  );
  for (const claim of seed.claims) await seedClaim(work, seed, row.id, claim, modes);
  return { id: row.id, publicId: row.publicId, variantIds: variants.map((variant) => variant.id) };
}

async function seedClaim(
  work: Work,
  device: DeviceSeed,
  deviceId: number,
  claim: ClaimSeed,
  modes: ReadonlyMap<string, number>,
): Promise<void> {
  const { mode, readOn, ambientCelsius, usesPerYear, ...said } = claim;
  await recordClaim(work, {
    singleValue: false,
    lastDigit: null,
    tolerancePercent: null,
    definition: null,
    modeReason: null,
    contradictsMode: null,
    ...said,
    deviceId,
    variantId: null,
    modeId: mode === null ? null : (modes.get(mode) ?? null),
    ambientCelsius: ambientCelsius ?? null,
    usesPerYear: usesPerYear ?? null,
    authorId: null,
    source: { title: `${device.maker} ${device.model}, product page`, address: null, page: null, readOn },
  });
}
