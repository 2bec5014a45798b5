import { spawn } from 'node:child_process';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { endOnSignals, explain, goOnUnlessInterrupted, run, say, StartError, TYPESCRIPT } from './console.mjs';

/**
 * `npm start`: from a clean clone to a running site, each step only where it is needed. `--dev` serves from the
 * sources and rebuilds as they change.
 */
const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');
const development = process.argv.includes('--dev');
process.chdir(root);

async function start() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 12)) {
    throw new StartError(`This needs Node.js 20.12 or newer; this is ${process.versions.node}.`);
  }
  endOnSignals();
  // Loaded only now: an older Node.js doesn't know all that these use, and would not say what it lacks.
  const { ensureDependencies } = await import('./packages.mjs');
  const { claimPort, takeTurn } = await import('./turn.mjs');
  const port = process.env.PORT ?? '3000';
  const giveTurnBack = takeTurn(root, process.env.PUBLIC_ORIGIN ?? `http://127.0.0.1:${port}`);
  try {
    await claimPort(port, process.env.HOST);
    await ensureDependencies(root);
    const { prepareEnvironment } = await import('./settings.mjs');
    const { env, cluster } = await prepareEnvironment(root);
    try {
      await prepare(env);
      await serve(env);
    } finally {
      // Also one that was adopted: it was left behind by a start that was killed.
      await cluster?.stop();
    }
  } finally {
    giveTurnBack();
  }
}

async function prepare(env) {
  const program = (file, ...args) =>
    run(process.execPath, [...TYPESCRIPT, path.join(root, 'lib/ops', file), ...args], { env });
  say('Bringing the database up to date …');
  await program('migrate.ts');
  if (env.DEMO === '1') await program('seed.ts', '--if-empty');
  const { ensureBuild } = await import('./build.mjs');
  if (!development) await ensureBuild(root, env);
}

async function serve(env) {
  goOnUnlessInterrupted();
  const { watchCallers } = await import('./turn.mjs');
  const catcher = env.CAUGHT_MAIL_DIR ? child('mail-catcher.mjs', [], env) : null;
  const server = child('serve.mjs', development ? ['--dev'] : [], {
    ...env,
    NODE_ENV: development ? 'development' : 'production',
  });
  let stopping = false;
  const stop = () => {
    stopping = true;
    server.kill('SIGTERM');
  };
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, stop);
  watchCallers(stop);
  server.once('message', () => announce(env));
  const code = await new Promise((resolve) => server.on('exit', resolve));
  catcher?.kill();
  if (!stopping && code !== 0) throw new StartError(`The server ended with ${code}; what it printed above says why.`);
}

/** A child that ends with us, also when we are killed: it watches the channel between us. */
function child(file, args, env) {
  return spawn(process.execPath, [path.join(root, 'lib/ops', file), ...args], {
    env,
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
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

await start().catch(explain);
