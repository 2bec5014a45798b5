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
 * A fresh database for this run, on the tests' own cluster, with every migration applied. The cluster is left running
 * for the next run when it ran before; other runs at the same time have databases of their own.
 */
export default async function setUp(project: TestProject) {
  const cluster = await startCluster({ root: process.cwd(), name: 'test-cluster', forTests: true });
  const name = `run_${randomBytes(6).toString('hex')}`;
  const admin = new pg.Client(cluster.url(cluster.superuser, 'postgres'));
  await admin.connect();
  await admin.query(`create database ${name} owner ${OWNER}`);
  const ownerUrl = cluster.url(OWNER, name);
  await migrate(ownerUrl, APPLICATION);
  project.provide('ownerUrl', ownerUrl);
  project.provide('applicationUrl', cluster.url(APPLICATION, name));
  return async () => {
    await admin.query(`drop database if exists ${name} with (force)`);
    await admin.end();
    if (!cluster.adopted) await cluster.stop();
  };
}
