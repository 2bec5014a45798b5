import type { MigrationStep } from '@/lib/platform/database/migration';

/** Whoever follows a link to a withdrawn report is told why it is gone. */
export const up: MigrationStep = async ({ sql }) => {
  await sql(`
    alter table report
      add column withdrawal_reason text check (char_length(btrim(withdrawal_reason)) between 1 and 500),
      add constraint report_withdrawal_reason check (withdrawal_reason is null or state = 'withdrawn')`);
};

export const down: MigrationStep = async ({ sql }) => {
  await sql('alter table report drop column withdrawal_reason');
};
