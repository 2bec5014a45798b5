import type { Model, ModelStatic } from 'sequelize';
import { describe, expect, it } from 'vitest';
import { APPEND_ONLY_TABLES } from '@/lib/platform/database/grants';
import { database } from '@/lib/platform/database/connection';
import { asOwner } from '../../setup/database';

describe('the models', () => {
  it('have exactly the columns that the tables have', async () => {
    const { models } = database();
    const { rows } = await asOwner((client) =>
      client.query<{ table: string; columns: string[] }>(
        `select table_name as table, array_agg(column_name::text order by column_name) as columns
         from information_schema.columns
         where table_schema = 'public' and table_name <> 'schema_migration' group by 1 order by 1`,
      ),
    );
    const ofModels = (Object.values(models) as ModelStatic<Model>[])
      .map((model) => ({
        table: model.tableName,
        columns: Object.values(model.getAttributes())
          .map((attribute) => String(attribute.field))
          .sort(),
      }))
      .sort((a, b) => a.table.localeCompare(b.table));
    expect(ofModels).toEqual(rows.map((row) => ({ ...row, columns: [...row.columns].sort() })));
  });
});

describe('the application’s role', () => {
  it('may not make a table', async () => {
    await expect(database().sequelize.query('create table intruder (id integer)')).rejects.toThrow(/permission denied/);
  });

  it.each([...APPEND_ONLY_TABLES])('may add to %s but neither change nor delete what stands there', async (table) => {
    const { sequelize } = database();
    await expect(sequelize.query(`delete from ${table}`)).rejects.toThrow(/permission denied/);
    await expect(sequelize.query(`truncate ${table}`)).rejects.toThrow(/permission denied/);
    const { rows } = await asOwner((client) =>
      client.query<{ privilege: string }>(
        `select privilege_type as privilege from information_schema.role_table_grants
         where grantee = 'wattcairn_app' and table_name = $1 order by 1`,
        [table],
      ),
    );
    expect(rows.map((row) => row.privilege)).toEqual(['INSERT', 'SELECT']);
  });
});
