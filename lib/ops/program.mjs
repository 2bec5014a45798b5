import path from 'node:path';
import { run, StartError } from './console.mjs';
import { ensureDependencies } from './packages.mjs';

/**
 * Runs one of our programs with the environment that `npm start` would give it: `node lib/ops/program.mjs seed.ts …`.
 * A cluster that was standing still is stopped again afterwards.
 */
const root = path.resolve(import.meta.dirname, '../..');
process.chdir(root);
const [file = '', ...args] = process.argv.slice(2);

try {
  await ensureDependencies(root);
  const { prepareEnvironment } = await import('./settings.mjs');
  const { env, cluster } = await prepareEnvironment(root);
  try {
    await run(
      process.execPath,
      ['--conditions=react-server', '--import', 'tsx', path.join(root, 'lib/ops', file), ...args],
      { env },
    );
  } finally {
    if (cluster && !cluster.adopted) await cluster.stop();
  }
} catch (error) {
  process.stderr.write(error instanceof StartError ? `${error.message}\n` : `${error.stack}\n`);
  process.exitCode = 1;
}
