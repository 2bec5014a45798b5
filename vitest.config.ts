import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

const root = import.meta.dirname;
const shared = {
  plugins: [react()],
  resolve: {
    alias: [
      { find: /^@\//, replacement: `${root}/` },
      // Outside Next's bundler the package's default entry throws; its server entry is empty.
      { find: /^server-only$/, replacement: `${root}/node_modules/server-only/empty.js` },
    ],
  },
};

// An odd time zone shows every place that silently reads the machine's own.
const env = { TZ: 'Pacific/Chatham' };

export default defineConfig({
  test: {
    projects: [
      {
        ...shared,
        test: {
          name: 'unit',
          include: ['tests/unit/**/*.test.{ts,tsx}'],
          environment: 'node',
          env,
          setupFiles: ['tests/setup/no-network.ts'],
        },
      },
      {
        ...shared,
        test: {
          name: 'integration',
          include: ['tests/integration/**/*.test.ts'],
          environment: 'node',
          env,
          setupFiles: ['tests/setup/no-network.ts', 'tests/setup/environment.ts', 'tests/setup/next-cache.ts'],
          globalSetup: ['tests/setup/cluster.ts'],
          // One database a run: files commit, lock and recompute, so they take turns.
          fileParallelism: false,
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        ...shared,
        // What takes minutes: `npm run test:deep`.
        test: { name: 'deep', include: ['tests/**/*.deep.ts'], environment: 'node', env, fileParallelism: false },
      },
    ],
    coverage: { provider: 'v8', include: ['lib/measurement/**/*.ts'], reporter: ['text-summary', 'json-summary'] },
  },
});
