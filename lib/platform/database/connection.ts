import 'server-only';
import { Sequelize } from 'sequelize';
import { initialiseModels, type Models } from '@/models';
import { env } from '../env';
import { log } from '../log';

export interface Database {
  sequelize: Sequelize;
  models: Models;
}

const key = Symbol.for('wattcairn.database');
const holder = globalThis as unknown as Record<symbol, Database | undefined>;

/**
 * The one connection pool with its models, made at first use: a build needs no database. It lives on globalThis
 * because the bundler copies this file into pages and route handlers, and each copy would open a pool of its own.
 */
export function database(): Database {
  return (holder[key] ??= connect());
}

/** Ends the pool; the next use makes a new one. */
export async function closeDatabase(): Promise<void> {
  const open = holder[key];
  holder[key] = undefined;
  await open?.sequelize.close();
}

function connect(): Database {
  const sequelize = new Sequelize(env().databaseUrl, {
    dialect: 'postgres',
    logging: env().logLevel === 'debug' ? (statement) => log().debug({ statement }) : false,
    pool: { max: 10, min: 0, acquire: 10_000, idle: 10_000 },
    dialectOptions: {
      application_name: 'wattcairn',
      // A statement that hangs must not take a pool's place for ever; migrations run elsewhere and have none.
      statement_timeout: 60_000,
      connectionTimeoutMillis: 5_000,
    },
  });
  return { sequelize, models: initialiseModels(sequelize) };
}
