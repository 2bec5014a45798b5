import { spawn } from 'node:child_process';
import path from 'node:path';
import { ensureBuild } from './build.mjs';
import { run, say, StartError } from './console.mjs';
import { ensureDependencies } from './packages.mjs';

/**
 * `npm start`: from a clean clone to a running site, each step only where it is needed. `--dev` serves from the
 * sources and rebuilds as they change.
 */
const root = path.resolve(import.meta.dirname, '../..');
const development = process.argv.includes('--dev');
process.chdir(root);

/** Runs one of our TypeScript programs. */
const program = (file, args, env) =>
  run(process.execPath, ['--conditions=react-server', '--import', 'tsx', path.join(root, 'lib/ops', file), ...args], {
    env,
  });

async function start() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 12)) {
    throw new StartError(`This needs Node.js 20.12 or newer; this is ${process.versions.node}.`);
  }
  await ensureDependencies(root);
  const { prepareEnvironment } = await import('./settings.mjs');
  const { env, cluster } = await prepareEnvironment(root);
  try {
    say('Bringing the database up to date …');
    await program('migrate.ts', [], env);
    if (env.DEMO === '1') await program('seed.ts', ['--if-empty'], env);
    if (!development) await ensureBuild(root, env);
    const catcher = env.CAUGHT_MAIL_DIR ? child('mail-catcher.mjs', [], env) : null;
    const server = child('serve.mjs', development ? ['--dev'] : [], {
      ...env,
      NODE_ENV: development ? 'development' : 'production',
    });
    server.once('message', () => announce(env));
    await untilItEnds(server);
    catcher?.kill();
  } finally {
    // Also one that was adopted: it was left behind by a start that was killed.
    await cluster?.stop();
  }
}

/** A child that ends with us, also when we are killed: it watches the channel between us. */
function child(file, args, env) {
  return spawn(process.execPath, [path.join(root, 'lib/ops', file), ...args], {
    env,
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
  });
}

function untilItEnds(server) {
  return new Promise((resolve, reject) => {
    let stopping = false;
    for (const signal of ['SIGINT', 'SIGTERM']) {
      process.on(signal, () => {
        stopping = true;
        server.kill('SIGTERM');
      });
    }
    server.on('exit', (code) => {
      if (stopping || code === 0) resolve();
      else reject(new StartError(`The server ended with ${code}; what it printed above says why.`));
    });
  });
}

function announce(env) {
  say(`\nWattcairn is at ${env.PUBLIC_ORIGIN}`);
  if (env.DEMO === '1') {
    say(
      `Demonstration: an invented island. Accounts with their passwords: ${env.PUBLIC_ORIGIN}/demonstration/accounts`,
    );
    say('  member     ina@orrin-skerry.example      ina-keeps-the-lamp-lit');
    say('  moderator  nessa@orrin-skerry.example    nessa-keeps-the-lamp-lit');
    say('  admin      runa@orrin-skerry.example     runa-keeps-the-lamp-lit');
    say(`Mail that it sends is kept at ${env.PUBLIC_ORIGIN}/demonstration/mail`);
  }
  say('Ctrl-C ends it.\n');
}

start().catch((error) => {
  process.stderr.write(error instanceof StartError ? `\n${error.message}\n` : `\n${error.stack}\n`);
  process.exitCode = 1;
});
