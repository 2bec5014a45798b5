import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterAll, inject } from 'vitest';
import { closeDatabase } from '@/lib/platform/database/connection';

// Each test file has folders of its own; the application reads its environment lazily, so this comes in time.
const uploads = mkdtempSync(path.join(os.tmpdir(), 'wattcairn-uploads-'));

Object.assign(process.env, {
  DATABASE_URL: inject('applicationUrl'),
  NEXTAUTH_SECRET: 'a secret for tests, of more than thirty-two characters',
  PUBLIC_ORIGIN: 'http://127.0.0.1:3000',
  UPLOADS_DIR: uploads,
  LOG_LEVEL: 'silent',
});

afterAll(async () => {
  await closeDatabase();
  rmSync(uploads, { recursive: true, force: true });
});
