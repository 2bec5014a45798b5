import type { MigrationStep } from '@/lib/platform/database/migration';

export const up: MigrationStep = async ({ sql }) => {
  await sql('create extension if not exists citext');
  await sql('create extension if not exists pg_trgm');
  await sql('create extension if not exists unaccent');
};

export const down: MigrationStep = async ({ sql }) => {
  await sql('drop extension if exists unaccent');
  await sql('drop extension if exists pg_trgm');
  await sql('drop extension if exists citext');
};
