import 'server-only';
import { QueryTypes, type Transaction } from 'sequelize';
import { database } from '@/lib/platform/database/connection';
import { describeBasis, variantLabel } from './rules';
import { conditionField, usePattern, type Category, type Device, type OperatingMode } from './schema';

interface CategoryRow extends Omit<Category, 'parent' | 'basis' | 'modes'> {
  parentName: string | null;
  parentSlug: string | null;
  basisQuantity: Category['basis']['quantity'];
  basisModeId: number | null;
  modes: OperatingMode[];
}

const CATEGORY = `
  select c.id, c.public_id as "publicId", r.id as "revisionId", s.slug, c.name, p.name as "parentName",
         ps.slug as "parentSlug", r.summary, r.duty, r.basis_quantity as "basisQuantity",
         r.basis_mode_id as "basisModeId", r.pools_variants as "poolsVariants", r.pools_supplies as "poolsSupplies",
         r.unit_spread as "unitSpread", r.may_be_switched_off as "mayBeSwitchedOff", r.use_pattern as "usePattern",
         r.conditions, r.cautions,
         coalesce((select jsonb_agg(jsonb_build_object('id', m.id, 'code', m.code, 'name', m.name,
                                                       'definition', m.definition, 'note', cm.note) order by cm.position)
                   from category_mode cm join operating_mode m on m.id = cm.mode_id
                   where cm.category_revision_id = r.id), '[]') as modes
  from category c
  join category_revision r on r.id = c.current_revision_id
  join slug s on s.target_kind = 'category' and s.target_id = c.id and s.current
  left join category p on p.id = c.parent_id
  left join slug ps on ps.target_kind = 'category' and ps.target_id = p.id and ps.current`;

/** Every category that has a revision in force, by name. */
export async function listCategories(): Promise<Category[]> {
  return selectCategories('order by c.name', []);
}

/** @param transaction where a command reads: a second connection for it could be the one that everybody waits for. */
export async function categoryById(id: number, transaction?: Transaction): Promise<Category | null> {
  return (await selectCategories('where c.id = $1', [id], transaction))[0] ?? null;
}

export async function categoryByPublicId(publicId: string): Promise<Category | null> {
  return (await selectCategories('where c.public_id = $1', [publicId]))[0] ?? null;
}

async function selectCategories(condition: string, bind: unknown[], transaction?: Transaction): Promise<Category[]> {
  const rows = await database().sequelize.query<CategoryRow>(`${CATEGORY} ${condition}`, {
    bind,
    transaction,
    type: QueryTypes.SELECT,
  });
  return rows.map(({ parentName, parentSlug, basisQuantity, basisModeId, ...row }) => ({
    ...row,
    parent: parentName && parentSlug ? { name: parentName, slug: parentSlug } : null,
    basis: describeBasis(basisQuantity, row.modes.find((mode) => mode.id === basisModeId) ?? null),
    usePattern: usePattern.parse(row.usePattern),
    conditions: conditionField.array().parse(row.conditions),
  }));
}

/** Where an address leads: the current slug of its target, so that an old one can redirect. Null where none does. */
export async function resolveSlug(
  kind: 'category' | 'device' | 'maker' | 'guide',
  slug: string,
): Promise<{ targetId: number; currentSlug: string } | null> {
  const rows = await database().sequelize.query<{ targetId: number; currentSlug: string }>(
    `select coalesce(d.merged_into_id, s.target_id) as "targetId", c.slug as "currentSlug"
     from slug s
     left join device d on s.target_kind = 'device' and d.id = s.target_id
     join slug c on c.target_kind = s.target_kind and c.current and c.target_id = coalesce(d.merged_into_id, s.target_id)
     where s.target_kind = $1 and s.slug = $2`,
    { bind: [kind, slug], type: QueryTypes.SELECT },
  );
  return rows[0] ?? null;
}

interface DeviceRow extends Omit<Device, 'category' | 'variants'> {
  categoryId: number;
  categoryName: string;
  categorySlug: string;
  variants: Omit<Device['variants'][number], 'publicLabel'>[];
}

const DEVICE = `
  select d.id, d.public_id as "publicId", s.slug, m.name || ' ' || d.model as name, m.name as maker, d.model, d.state,
         c.id as "categoryId", c.name as "categoryName", cs.slug as "categorySlug",
         coalesce((select jsonb_agg(a.name order by a.id) from device_alias a where a.device_id = d.id), '[]') as aliases,
         coalesce((select jsonb_agg(jsonb_build_object('id', v.id, 'generation', v.generation, 'region', v.region,
                     'ratedWatts', v.rated_watts, 'ratedSupply', v.rated_supply) order by v.id)
                   from variant v where v.device_id = d.id), '[]') as variants
  from device d
  join maker m on m.id = d.maker_id
  join category c on c.id = d.category_id
  join slug s on s.target_kind = 'device' and s.target_id = d.id and s.current
  join slug cs on cs.target_kind = 'category' and cs.target_id = c.id and cs.current`;

export async function deviceById(id: number): Promise<Device | null> {
  return (await selectDevices('where d.id = $1', [id]))[0] ?? null;
}

export async function deviceByPublicId(publicId: string): Promise<Device | null> {
  return (await selectDevices('where d.public_id = $1', [publicId]))[0] ?? null;
}

/** The devices that readers see, by maker and model. */
export async function listDevices(): Promise<Device[]> {
  return selectDevices(`where d.state in ('new', 'confirmed') order by m.name, d.model`, []);
}

export async function devicesOfCategory(categoryId: number): Promise<Device[]> {
  return selectDevices(`where d.state in ('new', 'confirmed') and d.category_id = $1 order by m.name, d.model`, [
    categoryId,
  ]);
}

async function selectDevices(condition: string, bind: unknown[]): Promise<Device[]> {
  const rows = await database().sequelize.query<DeviceRow>(`${DEVICE} ${condition}`, { bind, type: QueryTypes.SELECT });
  return rows.map(({ categoryId, categoryName, categorySlug, variants, ...row }) => ({
    ...row,
    category: { id: categoryId, name: categoryName, slug: categorySlug },
    variants: variants.map((known) => ({ ...known, publicLabel: variantLabel(known) })),
  }));
}
