import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/platform/database/connection';
import type { NamedFigure } from '../presenter';
import type { StoneInput } from '../rules/stones';
import { FIGURE_COLUMNS } from './stored-figures';

/** Published figures with the names of their modes and variants. */
export function selectFigures(condition: string, bind: unknown[]): Promise<NamedFigure[]> {
  return database().sequelize.query<NamedFigure>(
    `select ${FIGURE_COLUMNS}, f.changed_at as "changedAt", mo.code as "modeCode", mo.name as "modeName",
            v.generation, v.region
     from published_figure f
     join figure_scope s on s.id = f.scope_id
     left join operating_mode mo on mo.id = f.mode_id
     left join variant v on v.id = f.variant_id
     ${condition}`,
    { bind, type: QueryTypes.SELECT },
  );
}

/** The inputs of the figures, by figure, each named after its contributor or device. */
export async function inputsOf(figureIds: number[]): Promise<Map<number, StoneInput[]>> {
  const rows = await database().sequelize.query<StoneInput & { figureId: number }>(
    `select i.published_figure_id as "figureId", i.voice, i.value, i.counted, i.flagged,
            coalesce(d.name, 'former member ' || m.former_number, mk.name || ' ' || dev.model) as label,
            case when rf.id is not null then rf.censored_at is not null
                 else coalesce((select bool_or(df.at_most) from published_figure df
                                join figure_scope ds on ds.id = df.scope_id
                                where ds.device_id = i.device_id and df.mode_id is not distinct from f.mode_id
                                  and df.quantity = f.quantity and df.power_kind = f.power_kind
                                  and df.supply_stratum = f.supply_stratum), false) end as censored
     from published_figure_input i
     join published_figure f on f.id = i.published_figure_id
     left join report_figure rf on rf.id = i.report_figure_id
     left join report_revision rr on rr.id = rf.report_revision_id
     left join report r on r.id = rr.report_id
     left join member m on m.id = r.member_id
     left join personal_detail d on d.member_id = m.id
     left join device dev on dev.id = i.device_id
     left join maker mk on mk.id = dev.maker_id
     where i.published_figure_id = any($1::int[]) order by i.id`,
    { bind: [figureIds], type: QueryTypes.SELECT },
  );
  const byFigure = new Map<number, StoneInput[]>(figureIds.map((id) => [id, []]));
  for (const { figureId, ...input } of rows) byFigure.get(figureId)?.push(input);
  return byFigure;
}

export interface BasisRow {
  categoryId: number;
  basisQuantity: 'mean-power' | 'day-energy' | 'use-energy';
  basisModeCode: string | null;
  modeCodes: string[];
}

/** The basis of each category, with its modes in order. */
export async function basesOf(categoryIds: number[]): Promise<Map<number, BasisRow>> {
  const rows = await database().sequelize.query<BasisRow>(
    `select c.id as "categoryId", r.basis_quantity as "basisQuantity", b.code as "basisModeCode",
            coalesce((select array_agg(mo.code order by cm.position) from category_mode cm
                      join operating_mode mo on mo.id = cm.mode_id
                      where cm.category_revision_id = r.id), '{}') as "modeCodes"
     from category c
     join category_revision r on r.id = c.current_revision_id
     left join operating_mode b on b.id = r.basis_mode_id
     where c.id = any($1::int[])`,
    { bind: [categoryIds], type: QueryTypes.SELECT },
  );
  return new Map(rows.map((row) => [row.categoryId, row]));
}
