/**
 * Mutation testing of the rules that make a published figure and judge a claim: each line is changed once, and a test
 * must notice. Slow, so it is part of test:deep and not of a change's own tests.
 */
export default {
  testRunner: 'vitest',
  vitest: { configFile: 'tests/setup/vitest.mutation.config.ts', related: false },
  mutate: [
    'lib/measurement/statistics/**/*.ts',
    'lib/measurement/aggregation/**/*.ts',
    'lib/measurement/claims/**/*.ts',
  ],
  // Constants that are read once, when a module loads, would need a fresh process for each mutant.
  ignoreStatic: true,
  coverageAnalysis: 'perTest',
  concurrency: 2,
  reporters: ['clear-text', 'dots'],
  clearTextReporter: { allowColor: false, reportTests: false },
  thresholds: { high: 95, low: 90, break: 85 },
  tempDirName: '.data/stryker',
  ignorePatterns: [
    '.next',
    '.next-*',
    '.data',
    'uploads',
    'public',
    'app',
    'components',
    'models',
    'migrations',
    'seeders',
  ],
  allowEmpty: false,
};
