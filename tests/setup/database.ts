import pg from 'pg';
import { inject } from 'vitest';

/** A connection as the owner, for what the application itself may not do. */
export async function asOwner<T>(run: (client: pg.Client) => Promise<T>): Promise<T> {
  const client = new pg.Client(inject('ownerUrl'));
  await client.connect();
  try {
    return await run(client);
  } finally {
    await client.end();
  }
}

/** Empties every table; the migrations stay. */
export async function resetDatabase(): Promise<void> {
  await asOwner(async (client) => {
    const { rows } = await client.query<{ tablename: string }>(
      `select tablename from pg_tables where schemaname = 'public' and tablename <> 'schema_migration'`,
    );
    await client.query(`truncate ${rows.map((row) => `"${row.tablename}"`).join(', ')} restart identity cascade`);
  });
}
