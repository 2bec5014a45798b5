import { spawn } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { once } from 'node:events';
import { mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { APPLICATION, freePort, OWNER, startCluster } from './cluster.mjs';
import { run, StartError, TYPESCRIPT } from './console.mjs';

/**
 * The built site for the browser tests: its own database with the demonstration in it, its own port, its own folders
 * for files and mail. Nothing of it is left afterwards.
 * @param {string} root
 * @param {string} dist the folder of the build.
 */
export async function startTestSite(root, dist) {
  const cluster = await startCluster({ root, name: 'test-cluster', forTests: true });
  const { default: pg } = await import('pg');
  const admin = new pg.Client(cluster.url(cluster.superuser, 'postgres'));
  await admin.connect();
  const database = `run_${Date.now()}_${randomBytes(4).toString('hex')}`;
  await admin.query(`create database ${database} owner ${OWNER}`);
  const scratch = mkdtempSync(path.join(os.tmpdir(), 'wattcairn-site-'));
  const mail = path.join(scratch, 'mail');
  for (const folder of [mail, path.join(scratch, 'uploads')]) mkdirSync(folder);
  const port = await freePort();
  const origin = `http://127.0.0.1:${port}`;
  const env = {
    ...process.env,
    NODE_ENV: 'production',
    NEXT_DIST_DIR: dist,
    PORT: String(port),
    PUBLIC_ORIGIN: origin,
    NEXTAUTH_URL: origin,
    NEXTAUTH_SECRET: randomBytes(48).toString('base64'),
    DATABASE_URL: cluster.url(APPLICATION, database),
    DATABASE_OWNER_URL: cluster.url(OWNER, database),
    SMTP_URL: `smtp://127.0.0.1:${await freePort()}`,
    CAUGHT_MAIL_DIR: mail,
    UPLOADS_DIR: path.join(scratch, 'uploads'),
    DEMO: '1',
    LOG_LEVEL: process.env.LOG_LEVEL ?? 'warn',
  };
  const children = [];
  const stop = async () => {
    for (const child of children) child.kill('SIGTERM');
    await Promise.all(children.map((child) => (child.exitCode === null ? once(child, 'exit') : null)));
    await admin.query(`drop database if exists ${database} with (force)`);
    await admin.end();
    if (!cluster.adopted) await cluster.stop();
    rmSync(scratch, { recursive: true, force: true });
  };
  const child = (/** @type {string} */ file) => {
    const stdio = /** @type {const} */ (['ignore', 'inherit', 'inherit', 'ipc']);
    const started = spawn(process.execPath, [path.join(root, 'lib/ops', file)], { env, stdio, cwd: root });
    children.push(started);
    return started;
  };
  try {
    for (const file of ['migrate.ts', 'seed.ts']) {
      await run(process.execPath, [...TYPESCRIPT, path.join(root, 'lib/ops', file)], { env, quiet: true });
    }
    child('mail-catcher.mjs');
    const server = child('serve.mjs');
    const first = await Promise.race([once(server, 'message'), once(server, 'exit').then(() => null)]);
    if (!first) throw new StartError('The site under test did not start; what it printed above says why.');
  } catch (error) {
    await stop();
    throw error;
  }
  return { origin, env, stop };
}
