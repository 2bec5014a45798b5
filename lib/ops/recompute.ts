import { Transaction } from 'sequelize';
import { checkFigures, recomputeAll } from '@/lib/figures/commands/recompute';
import { closeDatabase, database } from '@/lib/platform/database/connection';
import { inTransaction } from '@/lib/platform/database/transaction';

/**
 * `npm run recompute` recomputes every published figure from all verified reports and repairs what differs; with
 * `--check` it changes nothing, prints each difference and ends with 1 where there is one.
 */
const say = (line: string) => process.stdout.write(`${line}\n`);

async function check(): Promise<boolean> {
  const { sequelize } = database();
  // One view of the database: what is verified meanwhile is seen with its figures or not at all.
  const isolationLevel = Transaction.ISOLATION_LEVELS.REPEATABLE_READ;
  const differences = await sequelize.transaction({ isolationLevel, readOnly: true }, (transaction) =>
    checkFigures({ sequelize, transaction }),
  );
  for (const difference of differences) say(difference);
  const published = await database().models.PublishedFigure.count();
  say(
    differences.length === 0
      ? `${published} published figures equal a recomputation from all verified reports, to the last digit.`
      : `${differences.length} differences. \`npm run recompute\` repairs them.`,
  );
  return differences.length === 0;
}

if (process.argv.includes('--check')) {
  if (!(await check())) process.exitCode = 1;
} else {
  const { repaired } = await inTransaction(recomputeAll);
  say(repaired === 0 ? 'Every published figure stood as it should.' : `${repaired} published figures were repaired.`);
}
await closeDatabase();
