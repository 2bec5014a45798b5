import 'server-only';
import { QueryTypes } from 'sequelize';
import type { Work } from '@/lib/platform/database/transaction';

/**
 * Makes the scopes' rows where they are missing and locks them in rising id. Whoever recomputes takes these locks
 * before reading, devices before categories: a second verification waits here and then sees the first one's report.
 * All in one order, so that two transactions never wait for each other.
 * @returns the scope row's id for each device or category.
 */
export async function lockScopes(work: Work, kind: 'device' | 'category', ids: number[]): Promise<Map<number, number>> {
  const { sequelize, transaction } = work;
  if (ids.length === 0) return new Map();
  const column = kind === 'device' ? 'device_id' : 'category_id';
  // What is there already is left out first: each refused insert would use up a number of the identity.
  await sequelize.query(
    `insert into figure_scope (kind, ${column})
     select '${kind}', wanted.id from unnest($1::int[]) as wanted (id)
     where not exists (select 1 from figure_scope s where s.${column} = wanted.id)
     order by wanted.id
     on conflict (${column}) do nothing`,
    { bind: [ids], transaction },
  );
  const rows = await sequelize.query<{ id: number; target: number }>(
    `select id, ${column} as target from figure_scope where ${column} = any($1::int[]) order by ${column} for update`,
    { bind: [ids], type: QueryTypes.SELECT, transaction },
  );
  return new Map(rows.map((row) => [row.target, row.id]));
}
