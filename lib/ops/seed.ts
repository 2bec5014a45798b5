import { database, closeDatabase } from '@/lib/platform/database/connection';
import { seedDemonstration } from '@/seeders';

/** `npm run db:seed`: the invented island, into a database that holds nothing yet. */
const { Member } = database().models;
if ((await Member.count()) > 0) {
  if (!process.argv.includes('--if-empty')) {
    process.stderr.write('The database holds members already; `npm run db:reset` empties it first.\n');
    process.exitCode = 1;
  }
} else {
  process.stdout.write('Seeding the demonstration …\n');
  await seedDemonstration();
}
await closeDatabase();
