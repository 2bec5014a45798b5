import path from 'node:path';
import { defineConfig } from 'vitest/config';

const root = path.resolve(import.meta.dirname, '../..');

/** The tests that mutants are run against: those of the mutated folders alone. */
export default defineConfig({
  root,
  resolve: { alias: [{ find: /^@\//, replacement: `${root}/` }] },
  test: {
    include: ['tests/unit/measurement/{statistics,aggregation,claims}/**/*.test.ts'],
    environment: 'node',
    env: { TZ: 'Pacific/Chatham' },
  },
});
