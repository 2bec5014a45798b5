import { readdirSync } from 'node:fs';
import path from 'node:path';
import { Sequelize, type QueryInterface } from 'sequelize';
import { Umzug } from 'umzug';
import { grantStatements } from '@/lib/platform/database/grants';
import type { MigrationContext, MigrationStep } from '@/lib/platform/database/migration';

interface MigrationFile {
  up: MigrationStep;
  down: MigrationStep;
}

/** Brings a database up to date, as its owner, and gives the application's role its rights. */
export async function migrate(ownerUrl: string, applicationRole: string, rollback = false): Promise<string[]> {
  const sequelize = new Sequelize(ownerUrl, { dialect: 'postgres', logging: false });
  try {
    const umzug = migrator(sequelize);
    if (rollback) return (await umzug.down()).map((migration) => migration.name);
    const done = await umzug.up();
    // A database of one's own may have one role for everything: it can't take rights from itself.
    const ownerRole = decodeURIComponent(new URL(ownerUrl).username);
    if (applicationRole !== ownerRole) {
      for (const statement of grantStatements(applicationRole)) await sequelize.query(statement);
    }
    return done.map((migration) => migration.name);
  } finally {
    await sequelize.close();
  }
}

function migrator(sequelize: Sequelize) {
  const folder = path.join(process.cwd(), 'migrations');
  return new Umzug<QueryInterface>({
    migrations: readdirSync(folder)
      .filter((file) => file.endsWith('.ts'))
      .sort()
      .map((file) => {
        const load = () => import(path.join(folder, file)) as Promise<MigrationFile>;
        // Without the ending, so that the record says the same whatever runs it.
        const name = file.slice(0, -'.ts'.length);
        return {
          name,
          up: async () => inOneTransaction(sequelize, (await load()).up, [RECORD, name]),
          down: async () => inOneTransaction(sequelize, (await load()).down, [UNRECORD, name]),
        };
      }),
    // What was done is recorded in the migration's own transaction: a kill between the two can't part them.
    storage: {
      logMigration: () => Promise.resolve(),
      unlogMigration: () => Promise.resolve(),
      executed: () => executed(sequelize),
    },
    logger: undefined,
  });
}

const RECORD = 'insert into schema_migration (name) values ($1)';
const UNRECORD = 'delete from schema_migration where name = $1';

function inOneTransaction(
  sequelize: Sequelize,
  step: MigrationStep,
  [statement, name]: [string, string],
): Promise<void> {
  return sequelize.transaction(async (transaction) => {
    const context: MigrationContext = {
      transaction,
      sql: async (statement) => void (await sequelize.query(statement, { transaction })),
    };
    await step(context);
    await sequelize.query(statement, { bind: [name], transaction });
  });
}

async function executed(sequelize: Sequelize): Promise<string[]> {
  await sequelize.query(
    'create table if not exists schema_migration (name text primary key, at timestamptz default now())',
  );
  const [rows] = await sequelize.query('select name from schema_migration order by name');
  return (rows as { name: string }[]).map((row) => row.name);
}

if (process.argv[1]?.endsWith('migrate.ts')) {
  const ownerUrl = process.env.DATABASE_OWNER_URL ?? process.env.DATABASE_URL;
  const applicationUrl = process.env.DATABASE_URL;
  if (!ownerUrl || !applicationUrl)
    throw new Error('Set DATABASE_URL, and DATABASE_OWNER_URL where the owner is another role.');
  const rollback = process.argv.includes('--rollback');
  const names = await migrate(ownerUrl, decodeURIComponent(new URL(applicationUrl).username), rollback);
  for (const name of names) process.stdout.write(`${rollback ? 'Undone' : 'Done'}: ${name}\n`);
}
