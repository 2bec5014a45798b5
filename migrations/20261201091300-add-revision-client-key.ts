import type { MigrationStep } from '@/lib/platform/database/migration';

/** An amendment has a key of its client's own, so that sending it twice is one revision. */
export const up: MigrationStep = async ({ sql }) => {
  await sql(`
    alter table report_revision
      add column client_key text check (char_length(client_key) between 8 and 128),
      add constraint report_revision_client_key unique (report_id, client_key)`);
};

export const down: MigrationStep = async ({ sql }) => {
  await sql('alter table report_revision drop column client_key');
};
