import 'server-only';
import { proposeDevice } from '@/lib/catalogue/commands';
import { categoryById } from '@/lib/catalogue/queries';
import type { Category } from '@/lib/catalogue/schema';
import { now } from '@/lib/platform/clock';
import type { Work } from '@/lib/platform/database/transaction';
import { AppError } from '@/lib/platform/errors';
import { publicId } from '@/lib/platform/ids';
import type { Submission } from '../schema';

export interface ReportedDevice {
  deviceId: number;
  variantId: number | null;
}

/**
 * The device that a submission is about: of the catalogue, the one it was merged into, or the one it proposes.
 * @throws {AppError} bad-input where there is none, or no such variant of it.
 */
export async function resolveDevice(work: Work, memberId: number, { device }: Submission): Promise<ReportedDevice> {
  if (device.from === 'proposal') return proposed(work, memberId, device.proposal);
  const { models, transaction } = work;
  const row = await models.Device.findOne({ where: { publicId: device.publicId }, transaction });
  if (!row || row.state === 'refused') {
    throw field('/device', 'There is no such device. Choose one by search, or propose it.');
  }
  if (row.mergedIntoId !== null) return { deviceId: row.mergedIntoId, variantId: null };
  if (device.variantId !== null) {
    const variant = await models.Variant.findOne({ where: { id: device.variantId, deviceId: row.id }, transaction });
    if (!variant) throw field('/device', 'This device has no such variant. Choose one from its list, or none.');
  }
  return { deviceId: row.id, variantId: device.variantId };
}

/** The catalogue names fields of a proposal; here they stand under the device. */
async function proposed(
  work: Work,
  memberId: number,
  proposal: Parameters<typeof proposeDevice>[2],
): Promise<ReportedDevice> {
  try {
    return await proposeDevice(work, memberId, proposal);
  } catch (error) {
    if (!(error instanceof AppError) || !error.details.fields) throw error;
    const fields = error.details.fields.map(({ pointer, message }) => {
      return { pointer: `/device/proposal${pointer}`, message };
    });
    throw new AppError(error.code, error.message, { ...error.details, fields });
  }
}

export async function categoryOf(work: Work, deviceId: number): Promise<Category> {
  const device = await work.models.Device.findByPk(deviceId, { transaction: work.transaction, rejectOnEmpty: true });
  const category = await categoryById(device.categoryId, work.transaction);
  if (!category) throw field('/device', 'This device’s category is not in use any more. Choose another device.');
  return category;
}

/** The physical specimen, by its label among the units of this device that the member has registered. */
export async function findOrAddUnit(
  work: Work,
  memberId: number,
  deviceId: number,
  label: string | null,
): Promise<number | null> {
  if (!label) return null;
  const where = { deviceId, label, registeredById: memberId };
  const [unit] = await work.models.Unit.findOrCreate({
    where,
    defaults: { ...where, publicId: publicId(), createdAt: now() },
    transaction: work.transaction,
  });
  return unit.id;
}

export function field(pointer: string, message: string): AppError {
  return new AppError('bad-input', message, { fields: [{ pointer, message }] });
}
