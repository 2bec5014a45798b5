import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest';
import { APPLICATION } from '@/lib/ops/cluster.mjs';
import { TYPESCRIPT } from '@/lib/ops/console.mjs';
import { migrate } from '@/lib/ops/migrate';
import { ask } from './scratch-cluster';

const whole = new URL(inject('ownerUrl'));
const name = `${whole.pathname.slice(1)}_half`;
const half = new URL(whole);
half.pathname = `/${name}`;

const DESCRIBED = `
  select table_name, column_name, data_type, is_nullable, column_default from information_schema.columns
  where table_schema = 'public' order by 1, 2`;
const CONSTRAINTS = `
  select conrelid::regclass::text as table, conname, pg_get_constraintdef(oid) as says from pg_constraint
  where connamespace = 'public'::regnamespace order by 1, 2`;

beforeAll(async () => {
  await ask(whole.href, `create database ${name}`);
});

afterAll(async () => {
  await ask(whole.href, `drop database ${name} with (force)`);
});

async function migrateAndKill(milliseconds: number): Promise<void> {
  const child = spawn(process.execPath, [...TYPESCRIPT, 'lib/ops/migrate.ts'], {
    env: { ...process.env, DATABASE_OWNER_URL: half.href },
    stdio: 'ignore',
  });
  const timer = setTimeout(() => child.kill('SIGKILL'), milliseconds);
  await once(child, 'exit');
  clearTimeout(timer);
}

describe('migrations', () => {
  it('end at the same tables though they were killed over and over on the way', async () => {
    for (let milliseconds = 250; milliseconds < 900; milliseconds += 50) await migrateAndKill(milliseconds);
    await migrate(half.href, APPLICATION);
    expect(await ask(half.href, DESCRIBED)).toEqual(await ask(whole.href, DESCRIBED));
    expect(await ask(half.href, CONSTRAINTS)).toEqual(await ask(whole.href, CONSTRAINTS));
    const names = 'select name from schema_migration order by name';
    expect(await ask(half.href, names)).toEqual(await ask(whole.href, names));
  }, 120_000);

  it('undo themselves one by one down to nothing, and come back', async () => {
    const done = await ask(half.href, 'select name from schema_migration');
    for (let left = done.length; left > 0; left -= 1) await migrate(half.href, APPLICATION, true);
    const left = await ask(half.href, `select tablename from pg_tables where schemaname = 'public'`);
    expect(left).toEqual([{ tablename: 'schema_migration' }]);
    const back = await migrate(half.href, APPLICATION);
    expect(back).toHaveLength(done.length);
    expect(await ask(half.href, DESCRIBED)).toEqual(await ask(whole.href, DESCRIBED));
  }, 120_000);

  it('are made and recorded together or not at all', async () => {
    await migrate(half.href, APPLICATION, true);
    await ask(half.href, `create function refuse() returns trigger language plpgsql as $$ begin raise 'no'; end $$`);
    await ask(half.href, 'create trigger no before insert on schema_migration execute function refuse()');
    const before = await ask(half.href, DESCRIBED);
    await expect(migrate(half.href, APPLICATION)).rejects.toThrow();
    expect(await ask(half.href, DESCRIBED)).toEqual(before);
  });

  it('are recorded without the ending of their files, whatever ran them', async () => {
    const rows = await ask(whole.href, 'select name from schema_migration');
    for (const { name: recorded } of rows) expect(recorded).toMatch(/^\d{14}-[a-z-]+$/);
  });
});
