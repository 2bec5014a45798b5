import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/platform/database/connection';
import { presentFigure, type NamedFigure } from '../presenter';
import { orderFigures } from '../rules/order';
import { stonesOf } from '../rules/stones';
import type { ChangedFigure, DeviceWithFigure, Figure } from '../schema';
import { basesOf, inputsOf, selectFigures, type BasisRow } from './named-figures';

/** Every published figure of a device with its pile, the headline first; none where the device is not known. */
export async function figuresOfDevice(deviceId: number): Promise<Figure[]> {
  return (await figuresOfDevices([deviceId])).get(deviceId) ?? [];
}

/** The same for several devices at once. */
export async function figuresOfDevices(deviceIds: number[]): Promise<Map<number, Figure[]>> {
  const categories = await categoryOfEach(deviceIds);
  const categoryIds = [...new Set(categories.values())];
  const rows = await selectFigures('where s.device_id = any($1::int[])', [deviceIds]);
  const ofCategories = await selectFigures('where s.category_id = any($1::int[])', [categoryIds]);
  const bases = await basesOf(categoryIds);
  const inputs = await inputsOf(rows.map((row) => row.id));
  const medians = new Map(ofCategories.map((row) => [`${row.categoryId} ${pileOf(row)}`, row.median]));
  return new Map(
    [...categories].map(([deviceId, categoryId]) => {
      const figures = rows
        .filter((row) => row.deviceId === deviceId)
        .map((row) => {
          const stones = stonesOf(inputs.get(row.id) ?? [], medians.get(`${categoryId} ${pileOf(row)}`) ?? null);
          return { ...presentFigure(row), flagged: stones.filter((stone) => stone.flagged).length, stones };
        });
      return [deviceId, ordered(figures, bases.get(categoryId))];
    }),
  );
}

/** Every published figure of a category with its pile of devices, the headline first. */
export async function figuresOfCategory(categoryId: number): Promise<Figure[]> {
  const rows = await selectFigures('where s.category_id = $1', [categoryId]);
  const inputs = await inputsOf(rows.map((row) => row.id));
  const figures = rows.map((row) => ({ ...presentFigure(row), stones: stonesOf(inputs.get(row.id) ?? [], null) }));
  return ordered(figures, (await basesOf([categoryId])).get(categoryId));
}

/** What each device draws on its category's basis: what a search hit shows. Devices without a figure are left out. */
export async function typicalDraws(deviceIds: number[]): Promise<Map<number, Figure>> {
  const figures = await figuresOfDevices(deviceIds);
  const headlines = [...figures].flatMap(([deviceId, ofDevice]) => {
    const headline = ofDevice.find((figure) => figure.isHeadline);
    return headline ? [[deviceId, headline] as const] : [];
  });
  return new Map(headlines);
}

/** The devices of a category, those with a figure on its basis first, from the smallest draw up. */
export async function devicesOfCategoryWithFigures(categoryId: number): Promise<DeviceWithFigure[]> {
  const devices = await database().sequelize.query<Omit<DeviceWithFigure, 'figure'>>(
    `select d.id as "deviceId", d.public_id as "publicId", s.slug, m.name || ' ' || d.model as name
     from device d
     join maker m on m.id = d.maker_id
     join slug s on s.target_kind = 'device' and s.target_id = d.id and s.current
     where d.category_id = $1 and d.state in ('new', 'confirmed') order by m.name, d.model`,
    { bind: [categoryId], type: QueryTypes.SELECT },
  );
  const draws = await typicalDraws(devices.map((device) => device.deviceId));
  return devices
    .map((device) => ({ ...device, figure: draws.get(device.deviceId) ?? null }))
    .sort((a, b) => (a.figure?.median ?? Infinity) - (b.figure?.median ?? Infinity) || 0);
}

/** The devices whose figure on the category's basis moved last, with what it was before. */
export async function recentlyChangedFigures(most: number): Promise<ChangedFigure[]> {
  const rows = await database().sequelize.query<ChangedFigure['device'] & { id: number; medianBefore: number | null }>(
    `select d.id, d.public_id as "publicId", m.name || ' ' || d.model as name, sl.slug, c.name as category,
            (select h.median from published_figure_history h
             where h.scope_id = f.scope_id and h.mode_id is not distinct from f.mode_id and h.quantity = f.quantity
               and h.power_kind = f.power_kind and h.supply_stratum = f.supply_stratum
               and h.variant_id is not distinct from f.variant_id
             order by h.id desc offset 1 limit 1) as "medianBefore"
     from (select distinct on (s.device_id) f.*, s.device_id
           from published_figure f
           join figure_scope s on s.id = f.scope_id
           join device d on d.id = s.device_id
           join category c on c.id = d.category_id
           join category_revision r on r.id = c.current_revision_id
           where f.quantity = r.basis_quantity and f.mode_id is not distinct from r.basis_mode_id
             and f.power_kind = 'real'
           order by s.device_id, f.supply_stratum = 'ac-any' desc, f.n desc, f.variant_id nulls first, f.supply_stratum) f
     join device d on d.id = f.device_id
     join maker m on m.id = d.maker_id
     join category c on c.id = d.category_id
     join slug sl on sl.target_kind = 'device' and sl.target_id = d.id and sl.current
     order by f.changed_at desc, f.id desc limit $1`,
    { bind: [most], type: QueryTypes.SELECT },
  );
  const draws = await typicalDraws(rows.map((row) => row.id));
  return rows.flatMap(({ id, medianBefore, ...device }) => {
    const figure = draws.get(id);
    return figure ? [{ device, figure, medianBefore }] : [];
  });
}

async function categoryOfEach(deviceIds: number[]): Promise<Map<number, number>> {
  const rows = await database().models.Device.findAll({ where: { id: deviceIds }, attributes: ['id', 'categoryId'] });
  return new Map(rows.map((row) => [row.id, row.categoryId]));
}

function ordered(figures: Omit<Figure, 'isHeadline' | 'isMain'>[], basis: BasisRow | undefined): Figure[] {
  if (!basis) return [];
  return orderFigures(figures, { quantity: basis.basisQuantity, modeCode: basis.basisModeCode }, basis.modeCodes);
}

const pileOf = (row: NamedFigure) => `${row.modeId} ${row.quantity} ${row.powerKind} ${row.supplyStratum}`;
