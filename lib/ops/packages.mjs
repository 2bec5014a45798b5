import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { run, say, StartError } from './console.mjs';

/** Installs the locked dependencies when they are missing or older than the lockfile. */
export async function ensureDependencies(root) {
  const lock = createHash('sha256')
    .update(readFileSync(path.join(root, 'package-lock.json')))
    .digest('hex');
  const mark = path.join(root, 'node_modules', '.installed-from');
  if (existsSync(mark) && readFileSync(mark, 'utf8') === lock) return;
  say('Installing the locked dependencies …');
  await run('npm', ['ci', '--no-audit', '--no-fund', '--loglevel=error'], { cwd: root }).catch((error) => {
    throw new StartError(
      `The dependencies could not be installed. Check that npm reaches its registry, then start again.\n${error.message}`,
    );
  });
  writeFileSync(mark, lock);
}

/**
 * The folder with initdb and pg_ctl, the newest first, or null.
 * @param {string | null} major the only version that can run a cluster that exists.
 */
export function findPostgres(major = null) {
  const installed = '/usr/lib/postgresql';
  const versions = existsSync(installed) ? readdirSync(installed).map(Number).filter(Boolean) : [];
  const wanted = versions.sort((a, b) => b - a).filter((version) => major === null || String(version) === major);
  const folders = wanted.map((version) => path.join(installed, String(version), 'bin'));
  const onPath = major === null ? (process.env.PATH ?? '').split(path.delimiter) : [];
  return (
    [...folders, ...onPath].find(
      (folder) => existsSync(path.join(folder, 'initdb')) && existsSync(path.join(folder, 'pg_ctl')),
    ) ?? null
  );
}

/**
 * PostgreSQL's server binaries; installs Debian's package where there are none.
 * @param {string | null} major as the cluster that exists needs it.
 */
export async function ensurePostgres(major) {
  const found = findPostgres(major);
  if (found) return found;
  // Installed by hand, outside Debian's folders: the one on the path has to do.
  const other = findPostgres();
  if (other && !other.startsWith('/usr/lib/postgresql/')) return other;
  // Debian's package would otherwise make and start a cluster of its own.
  await installDebian(major === null ? 'postgresql' : `postgresql-${major}`, async (asRoot) => {
    await asRoot('mkdir', ['-p', '/etc/postgresql-common/createcluster.d']);
    await asRoot('tee', ['/etc/postgresql-common/createcluster.d/wattcairn.conf'], 'create_main_cluster = false\n');
  });
  const installed = findPostgres(major);
  if (installed) return installed;
  throw new StartError('Debian’s package postgresql was installed, but its programs are not in /usr/lib/postgresql.');
}

/** Debian's Chromium, for the browser tests; installed where it is missing. */
export async function ensureChromium() {
  const place = '/usr/bin/chromium';
  if (!existsSync(place)) await installDebian('chromium');
  if (existsSync(place)) return place;
  throw new StartError(`Debian’s package chromium was installed, but ${place} is not there.`);
}

async function installDebian(name, before = async () => {}) {
  const root = process.getuid?.() === 0;
  const maySudo =
    !root &&
    (await run('sudo', ['-n', 'true'], { quiet: true }).then(
      () => true,
      () => false,
    ));
  if ((!root && !maySudo) || !existsSync('/usr/bin/apt-get')) {
    throw new StartError(
      `The package ${name} is missing. Install it (on Debian: sudo apt-get install ${name}), then start again.`,
    );
  }
  // A kill must not stop a package manager half-way; the next start waits for its lock.
  const options = { quiet: true, outlives: true };
  const asRoot = (command, args, input) =>
    root
      ? run(command, args, { ...options, input, env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' } })
      : run('sudo', ['-n', 'DEBIAN_FRONTEND=noninteractive', command, ...args], { ...options, input });
  const apt = (...args) => asRoot('apt-get', ['-q', '-o', 'DPkg::Lock::Timeout=300', ...args]);
  say(`Installing Debian’s package ${name} …`);
  await before(asRoot);
  // Where an earlier installation was interrupted, apt-get refuses until this is done.
  await asRoot('dpkg', ['--configure', '-a']);
  await apt('update').catch((error) => {
    throw new StartError(
      `Debian’s package lists could not be fetched. Check the network, then start again.\n${error.message}`,
    );
  });
  await apt('install', '-y', '--no-install-recommends', name);
}
