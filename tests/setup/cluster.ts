import { randomBytes } from 'node:crypto';
import pg from 'pg';
import type { TestProject } from 'vitest/node';
import { APPLICATION, OWNER, startCluster } from '@/lib/ops/cluster.mjs';
import { migrate } from '@/lib/ops/migrate';

declare module 'vitest' {
  interface ProvidedContext {
    applicationUrl: string;
    ownerUrl: string;
  }
}

/**
 * A fresh database for this run, on the tests' own cluster, with every migration applied. Other runs at the same time
 * have databases of their own; who started the cluster stops it, unless another still uses it.
 */
export default async function setUp(project: TestProject) {
  const cluster = await startCluster({ root: process.cwd(), name: 'test-cluster', forTests: true });
  const name = `run_${Date.now()}_${randomBytes(4).toString('hex')}`;
  const admin = new pg.Client(cluster.url(cluster.superuser, 'postgres'));
  await admin.connect();
  await dropLeftBehind(admin);
  await admin.query(`create database ${name} owner ${OWNER}`);
  const ownerUrl = cluster.url(OWNER, name);
  await migrate(ownerUrl, APPLICATION);
  project.provide('ownerUrl', ownerUrl);
  project.provide('applicationUrl', cluster.url(APPLICATION, name));
  return async () => {
    await admin.query(`drop database if exists ${name} with (force)`);
    const { rowCount } = await admin.query(`select 1 from pg_database where datname like 'run\\_%'`);
    await admin.end();
    if (!rowCount && !cluster.adopted) await cluster.stop();
  };
}

const AN_HOUR = 3_600_000;

/** Of runs that were killed. */
async function dropLeftBehind(admin: pg.Client): Promise<void> {
  const { rows } = await admin.query<{ datname: string }>(`select datname from pg_database where datname ~ '^run_'`);
  for (const { datname } of rows) {
    const begun = Number(datname.split('_')[1]);
    if (!(Date.now() - begun < AN_HOUR)) await admin.query(`drop database if exists ${datname} with (force)`);
  }
}
