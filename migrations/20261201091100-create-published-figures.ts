import type { MigrationStep } from '@/lib/platform/database/migration';

const KEY = `
      scope_id integer not null references figure_scope (id),
      variant_id integer references variant (id),
      mode_id integer references operating_mode (id),
      quantity text not null,
      power_kind text not null check (power_kind in ('real', 'apparent')),
      supply_stratum text not null check (supply_stratum in ('ac-any', 'ac-230', 'ac-120', 'dc')),`;

const STATISTICS = `
      n integer not null check (n >= 0),
      median double precision,
      median_low double precision,
      lower_quartile double precision,
      upper_quartile double precision,
      minimum double precision,
      maximum double precision,
      interval_low double precision,
      interval_high double precision,
      interval_coverage double precision check (interval_coverage between 0.95 and 1),
      tenth_percentile double precision,
      ninetieth_percentile double precision,
      at_most boolean not null,
      standard_uncertainty double precision,
      degrees_of_freedom double precision,
      flagged integer not null check (flagged >= 0),
      set_aside integer not null check (set_aside >= 0),
      devices integer not null check (devices >= 0),
      contributors integer not null check (contributors >= 0),
      instruments integer not null check (instruments >= 0),
      reports integer not null check (reports >= 0),
      rule_version text not null,
      receipt_hash text not null check (receipt_hash ~ '^[0-9a-f]{64}$'),`;

export const up: MigrationStep = async ({ sql }) => {
  // One row a device or category: the lock a recomputation takes before it reads. Without it two verifications at
  // once each miss the other's report, and the published figure stays one short.
  await sql(`
    create table figure_scope (
      id integer generated always as identity primary key,
      kind text not null check (kind in ('device', 'category')),
      device_id integer unique references device (id),
      category_id integer unique references category (id),
      check ((kind = 'device') = (device_id is not null)),
      check ((kind = 'category') = (category_id is not null))
    )`);
  await sql(`
    create table published_figure (
      id integer generated always as identity primary key,${KEY}${STATISTICS}
      changed_at timestamptz not null,
      unique nulls not distinct (scope_id, variant_id, mode_id, quantity, power_kind, supply_stratum),
      check (minimum <= median and median <= maximum),
      check (lower_quartile <= median and median <= upper_quartile)
    )`);
  await sql(`
    create table published_figure_input (
      id integer generated always as identity primary key,
      published_figure_id integer not null references published_figure (id) on delete cascade,
      report_figure_id integer references report_figure (id),
      report_revision_id integer references report_revision (id),
      device_id integer references device (id),
      voice text not null,
      value double precision not null,
      counted boolean not null,
      flagged boolean not null,
      reason text,
      check (counted or reason is not null),
      check ((report_figure_id is not null) <> (device_id is not null))
    )`);
  await sql('create index published_figure_input_figure on published_figure_input (published_figure_id)');
  await sql('create index published_figure_input_revision on published_figure_input (report_revision_id)');
  await sql(`
    create table published_figure_history (
      id integer generated always as identity primary key,${KEY}${STATISTICS}
      event_id bigint references event (id),
      at timestamptz not null
    )`);
  await sql(`
    create index published_figure_history_key
      on published_figure_history (scope_id, mode_id, quantity, power_kind, supply_stratum, id)`);
};

export const down: MigrationStep = async ({ sql }) => {
  await sql('drop table published_figure_history');
  await sql('drop table published_figure_input');
  await sql('drop table published_figure');
  await sql('drop table figure_scope');
};
