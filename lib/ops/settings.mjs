import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { APPLICATION, freePort, OWNER, startCluster } from './cluster.mjs';
import { StartError } from './console.mjs';

/**
 * The environment of everything that `npm start` runs: from what is set outside, or from a private cluster with a
 * secret and a mail catcher of its own, and the demonstration in it.
 * @param {string} root
 */
export async function prepareEnvironment(root) {
  const port = process.env.PORT ?? '3000';
  const shared = {
    ...process.env,
    NEXT_TELEMETRY_DISABLED: '1',
    PORT: port,
    PUBLIC_ORIGIN: process.env.PUBLIC_ORIGIN ?? `http://127.0.0.1:${port}`,
    UPLOADS_DIR: process.env.UPLOADS_DIR ?? path.join(root, 'uploads'),
  };
  if (process.env.DATABASE_URL) {
    if ((process.env.NEXTAUTH_SECRET ?? '').length < 32) {
      throw new StartError(
        'With a DATABASE_URL of your own, set NEXTAUTH_SECRET too (at least 32 characters: openssl rand -base64 48).',
      );
    }
    return { env: withAuthAddress(shared), cluster: null };
  }
  const cluster = await startCluster({ root });
  const caught = path.join(root, '.data', 'mail');
  mkdirSync(caught, { recursive: true });
  const smtpPort = await freePort();
  return {
    cluster,
    env: withAuthAddress({
      ...shared,
      DATABASE_URL: cluster.url(APPLICATION),
      DATABASE_OWNER_URL: cluster.url(OWNER),
      NEXTAUTH_SECRET: process.env.NEXTAUTH_SECRET ?? keptSecret(root),
      SMTP_URL: process.env.SMTP_URL ?? `smtp://127.0.0.1:${smtpPort}`,
      CAUGHT_MAIL_DIR: caught,
      DEMO: '1',
    }),
  };
}

/** next-auth takes its own address from this variable and from nowhere in a request. */
function withAuthAddress(env) {
  return { ...env, NEXTAUTH_URL: env.PUBLIC_ORIGIN };
}

/** Made once: another secret would sign everybody out. */
function keptSecret(root) {
  const file = path.join(root, '.data', 'secret');
  if (!existsSync(file)) {
    writeFileSync(`${file}.new`, randomBytes(48).toString('base64'), { mode: 0o600 });
    renameSync(`${file}.new`, file);
  }
  return readFileSync(file, 'utf8');
}
