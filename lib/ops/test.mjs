import { mkdirSync, readFileSync, rmSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { endOnSignals, explain, goOnUnlessInterrupted, Interrupted, run, say, TYPESCRIPT } from './console.mjs';

/**
 * `npm test`: all that a change must pass, from a clean clone, each stage though an earlier one failed. `npm test --
 * unit e2e` runs those stages alone, `--deep` those that take long. Its last line is `N passed, N failed`.
 */
const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');
process.chdir(root);
const results = path.join(root, '.data', 'results');
const DIST = '.next-test';
const env = { ...process.env, NEXT_TELEMETRY_DISABLED: '1', NEXT_DIST_DIR: DIST };
const tool = (/** @type {string} */ name, ...args) => run(path.join(root, 'node_modules/.bin', name), args, { env });

/** What each stage runs; one that counts its tests answers them, any other is one test of its own. */
const STAGES = {
  format: () => tool('prettier', '--check', '--log-level', 'warn', '.'),
  lint: () => tool('eslint', '.', '--max-warnings', '0'),
  types: async () => {
    // Makes next-env.d.ts and the types of the routes, which a clean clone lacks.
    await tool('next', 'typegen');
    await tool('tsc', '--noEmit');
  },
  structure: () => run(process.execPath, [...TYPESCRIPT, 'lib/ops/check-structure.ts'], { env }),
  unit: () => vitest('unit'),
  integration: () => vitest('integration'),
  build: async () => {
    const { ensureBuild } = await import('./build.mjs');
    await ensureBuild(root, { ...env, DEMO: '1' });
  },
  e2e: browserTests,
};
const DEEP = {
  build: STAGES.build,
  deep: () => vitest('deep'),
  mutation: () => tool('stryker', 'run'),
};

function vitest(project) {
  const file = path.join(results, `${project}.json`);
  const reporters = ['--reporter=dot', '--reporter=json', `--outputFile.json=${file}`];
  return counted(file, vitestCounts, () => tool('vitest', 'run', '--project', project, ...reporters));
}

async function browserTests() {
  const { ensureChromium } = await import('./packages.mjs');
  const { startTestSite } = await import('./test-site.mjs');
  const chromium = await ensureChromium();
  const site = await startTestSite(root, DIST);
  const file = path.join(results, 'e2e.json');
  const settings = { ...site.env, NODE_ENV: 'test', CHROMIUM: chromium, PLAYWRIGHT_JSON_OUTPUT_NAME: file };
  const playwright = path.join(root, 'node_modules/.bin/playwright');
  try {
    return await counted(file, playwrightCounts, () => run(playwright, ['test'], { env: settings }));
  } finally {
    await site.stop();
  }
}

/** Runs what writes a report; where it failed, the report says how many did. */
async function counted(file, read, execute) {
  rmSync(file, { force: true });
  const failure = await execute().then(
    () => null,
    (error) => error,
  );
  if (failure instanceof Interrupted) throw failure;
  const counts = read(JSON.parse(readFileSync(file, 'utf8')));
  // A run may end badly although each of its tests passed (an error outside of them).
  if (failure && counts.failed === 0) counts.failed = 1;
  return counts;
}

const vitestCounts = (report) => ({
  passed: report.numPassedTests,
  // A file that can’t be loaded has no tests to fail.
  failed: Math.max(report.numFailedTests, report.testResults.filter((file) => file.status === 'failed').length),
});

const playwrightCounts = ({ stats, errors }) => ({
  passed: stats.expected,
  failed: stats.unexpected + stats.flaky + errors.length,
});

async function test() {
  endOnSignals();
  const { ensureDependencies } = await import('./packages.mjs');
  await ensureDependencies(root);
  mkdirSync(results, { recursive: true });
  const asked = process.argv.slice(2);
  const all = asked.includes('--deep') ? DEEP : STAGES;
  const named = asked.filter((name) => !name.startsWith('--'));
  const total = { passed: 0, failed: 0 };
  const lines = [];
  for (const [name, stage] of Object.entries(all)) {
    if (named.length > 0 && !named.includes(name)) continue;
    say(`\n── ${name}`);
    const began = Date.now();
    const { passed, failed } = await outcomeOf(stage);
    total.passed += passed;
    total.failed += failed;
    const seconds = ((Date.now() - began) / 1000).toFixed(0);
    lines.push(`${failed ? 'FAILED' : 'passed'}  ${name.padEnd(12)} ${passed} passed, ${failed} failed, ${seconds} s`);
    say(lines.at(-1));
  }
  say(`\n${lines.join('\n')}\n`);
  if (total.failed > 0 || total.passed === 0) process.exitCode = 1;
  say(`${total.passed} passed, ${total.failed} failed`);
}

async function outcomeOf(stage) {
  goOnUnlessInterrupted();
  try {
    const counts = await stage();
    return typeof counts === 'object' ? counts : { passed: 1, failed: 0 };
  } catch (error) {
    if (error instanceof Interrupted) throw error;
    process.stderr.write(`${error.message}\n`);
    return { passed: 0, failed: 1 };
  }
}

await test().catch(explain);
