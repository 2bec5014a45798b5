import path from 'node:path';
import { endOnSignals, explain, run, say, StartError, TYPESCRIPT } from './console.mjs';
import { ensureDependencies } from './packages.mjs';
import { runningStart } from './turn.mjs';

/**
 * Runs one of our programs with the environment that `npm start` would give it: `node lib/ops/program.mjs seed.ts …`.
 * A cluster that was standing still is stopped again afterwards.
 */
const root = path.resolve(import.meta.dirname, '../..');
process.chdir(root);
endOnSignals();
const [file = '', ...args] = process.argv.slice(2);

try {
  if (file === 'reset.ts' && runningStart(root)) {
    throw new StartError('The site runs on this database. End it with Ctrl-C first, then empty it.');
  }
  await ensureDependencies(root);
  const { prepareEnvironment } = await import('./settings.mjs');
  const { env, cluster } = await prepareEnvironment(root);
  try {
    await run(process.execPath, [...TYPESCRIPT, path.join(root, 'lib/ops', file), ...args], { env });
    if (file === 'recompute.ts' && !args.includes('--check') && runningStart(root)) {
      say('The site that runs shows the pages it keeps until it is started again.');
    }
  } finally {
    // A start that came meanwhile has adopted it.
    if (cluster && !cluster.adopted && !runningStart(root)) await cluster.stop();
  }
} catch (error) {
  explain(error);
}
