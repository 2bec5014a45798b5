import pg from 'pg';

/** `npm run db:reset`: empties the private cluster's database, so that the next start makes it anew. */
const url = process.env.DATABASE_OWNER_URL;
if (!url || process.env.DEMO !== '1') {
  process.stderr.write('This empties the demonstration’s own database only; yours is for you to empty.\n');
  process.exit(1);
}
const client = new pg.Client(url);
await client.connect();
await client.query('drop schema public cascade');
await client.query('create schema public');
await client.end();
process.stdout.write('The database is empty. `npm start` makes it anew.\n');
