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

/** The folder with initdb and postgres, the newest first, or null. */
export function findPostgres() {
  const installed = '/usr/lib/postgresql';
  const versions = existsSync(installed) ? readdirSync(installed).map(Number).filter(Boolean) : [];
  const folders = versions.sort((a, b) => b - a).map((version) => path.join(installed, String(version), 'bin'));
  const onPath = (process.env.PATH ?? '').split(path.delimiter);
  return (
    [...folders, ...onPath].find(
      (folder) => existsSync(path.join(folder, 'initdb')) && existsSync(path.join(folder, 'pg_ctl')),
    ) ?? null
  );
}

/** PostgreSQL's server binaries; installs Debian's package where there are none. */
export async function ensurePostgres() {
  const found = findPostgres();
  if (found) return found;
  // Debian's package would otherwise make and start a cluster of its own.
  await installDebian('postgresql', async (asRoot) => {
    await asRoot('mkdir', ['-p', '/etc/postgresql-common/createcluster.d']);
    await asRoot('tee', ['/etc/postgresql-common/createcluster.d/wattcairn.conf'], 'create_main_cluster = false\n');
  });
  const installed = findPostgres();
  if (installed) return installed;
  throw new StartError(
    'Debian’s package postgresql was installed, but its programs were not found in /usr/lib/postgresql.',
  );
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
  const asRoot = (command, args, input) =>
    root
      ? run(command, args, { quiet: true, input, env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' } })
      : run('sudo', ['-n', 'DEBIAN_FRONTEND=noninteractive', command, ...args], { quiet: true, input });
  say(`Installing Debian’s package ${name} …`);
  await before(asRoot);
  await asRoot('apt-get', ['update', '-q']);
  await asRoot('apt-get', ['install', '-y', '-q', '--no-install-recommends', name]);
}
