import type { Transaction } from 'sequelize';

/** What a migration gets: one function that runs SQL inside the migration's own transaction, as the owner role. */
export interface MigrationContext {
  sql: (statement: string) => Promise<void>;
  transaction: Transaction;
}

/** One direction of a migration. Each file in migrations/ exports `up` and `down`, both awaited. */
export type MigrationStep = (context: MigrationContext) => Promise<void>;
