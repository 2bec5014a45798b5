import pg from 'pg';
import { closeDatabase, database } from '@/lib/platform/database/connection';
import { seedDemonstration } from '@/seeders';

/**
 * `npm run db:seed`: the invented island, into a database that holds nothing yet. It takes many transactions, so a
 * table stands in the database until it is whole: one that finds it there begins anew.
 */
const MARK = 'demonstration_half_made';
const { sequelize, models } = database();
const owner = new pg.Client(process.env.DATABASE_OWNER_URL ?? process.env.DATABASE_URL);
await owner.connect();
const { rows } = await owner.query<{ mark: string | null }>('select to_regclass($1) as mark', [`public.${MARK}`]);
const halfMade = rows[0]?.mark !== null;
if (halfMade) {
  process.stdout.write('The demonstration was left half made; it is made anew.\n');
  const tables = Object.values(sequelize.models).map((model) => `"${String(model.getTableName())}"`);
  await owner.query(`truncate ${tables.join(', ')} restart identity cascade`);
}
if (halfMade || (await models.Member.count()) === 0) {
  process.stdout.write('Seeding the demonstration …\n');
  await owner.query(`create table if not exists ${MARK} ()`);
  await seedDemonstration();
  await owner.query(`drop table ${MARK}`);
} else if (!process.argv.includes('--if-empty')) {
  process.stderr.write('The database holds members already; `npm run db:reset` empties it first.\n');
  process.exitCode = 1;
}
await owner.end();
await closeDatabase();
