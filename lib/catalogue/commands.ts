import 'server-only';
import { now } from '@/lib/platform/clock';
import { recordEvent } from '@/lib/platform/database/record-event';
import type { Work } from '@/lib/platform/database/transaction';
import { AppError } from '@/lib/platform/errors';
import { publicId } from '@/lib/platform/ids';
import { slugFrom } from './rules';
import type { ProposedDevice } from './schema';

type SlugKind = 'category' | 'device' | 'maker' | 'guide';

/**
 * Gives a thing its address. A slug that was ever given stays taken, so a second one of the same name gets a number.
 * The unique key settles two at once: the later one tries the next number.
 */
export async function giveSlug(work: Work, kind: SlugKind, targetId: number, name: string): Promise<string> {
  const wanted = slugFrom(name);
  await work.models.Slug.update(
    { current: false },
    { where: { targetKind: kind, targetId, current: true }, transaction: work.transaction },
  );
  for (let n = 1; ; n += 1) {
    const slug = n === 1 ? wanted : `${wanted}-${n}`;
    const [rows] = await work.sequelize.query(
      `insert into slug (slug, target_kind, target_id, current, created_at) values ($1, $2, $3, true, $4)
       on conflict (slug) do nothing returning slug`,
      { bind: [slug, kind, targetId, now()], transaction: work.transaction },
    );
    if (rows.length > 0) return slug;
  }
}

/** The maker of this name, whatever its case; made when there is none. */
export async function findOrAddMaker(work: Work, name: string): Promise<number> {
  const { Maker } = work.models;
  await work.sequelize.query(
    'insert into maker (public_id, name, created_at) values ($1, $2, $3) on conflict (name) do nothing',
    { bind: [publicId(), name, now()], transaction: work.transaction },
  );
  const maker = await Maker.findOne({ where: { name }, transaction: work.transaction, rejectOnEmpty: true });
  const slug = await work.models.Slug.findOne({
    where: { targetKind: 'maker', targetId: maker.id },
    transaction: work.transaction,
  });
  if (!slug) await giveSlug(work, 'maker', maker.id, name);
  return maker.id;
}

/**
 * Adds a device that a member proposes: live at once, marked as new. The same maker and model again is the same device.
 * @throws {AppError} bad-input where there is no such category, or the model stands in another category.
 */
export async function proposeDevice(
  work: Work,
  memberId: number,
  proposal: ProposedDevice,
): Promise<{ deviceId: number; variantId: number | null; publicId: string }> {
  const { Category, Device } = work.models;
  const category = await Category.findOne({
    where: { publicId: proposal.categoryPublicId },
    transaction: work.transaction,
  });
  if (!category) throw wrongField('/categoryPublicId', 'There is no such category. Choose one from the list.');
  const makerId = await findOrAddMaker(work, proposal.maker);
  const [rows] = await work.sequelize.query(
    `insert into device (public_id, category_id, maker_id, model, state, proposed_by_id, created_at)
     values ($1, $2, $3, $4, 'new', $5, $6)
     on conflict (maker_id, model) where state in ('new', 'confirmed') do nothing returning id`,
    {
      bind: [publicId(), category.id, makerId, proposal.model, memberId, now()],
      transaction: work.transaction,
    },
  );
  const device = await Device.findOne({
    where: { makerId, model: proposal.model, state: ['new', 'confirmed'] },
    transaction: work.transaction,
    rejectOnEmpty: true,
  });
  if (device.categoryId !== category.id) {
    throw wrongField('/model', 'This model stands in another category already. Choose it there, by search.');
  }
  if (rows.length > 0) {
    await giveSlug(work, 'device', device.id, `${proposal.maker} ${proposal.model}`);
    await recordEvent(work, {
      actorId: memberId,
      action: 'device.proposed',
      subject: { kind: 'device', id: device.id },
      after: { model: proposal.model },
    });
    work.dropTag('catalogue');
    work.dropTag(`category:${category.id}`);
  }
  const variantId = proposal.generation ? await findOrAddVariant(work, device.id, proposal) : null;
  return { deviceId: device.id, variantId, publicId: device.publicId };
}

async function findOrAddVariant(work: Work, deviceId: number, proposal: ProposedDevice): Promise<number> {
  const { Variant } = work.models;
  const where = { deviceId, generation: proposal.generation ?? '', region: null };
  const [variant] = await Variant.findOrCreate({
    where,
    defaults: { ...where, ratedWatts: proposal.ratedWatts ?? null, createdAt: now() },
    transaction: work.transaction,
  });
  work.dropTag(`device:${deviceId}`);
  return variant.id;
}

function wrongField(pointer: string, message: string): AppError {
  return new AppError('bad-input', message, { fields: [{ pointer, message }] });
}
