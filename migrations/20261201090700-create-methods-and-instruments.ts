import type { MigrationStep } from '@/lib/platform/database/migration';

export const up: MigrationStep = async ({ sql }) => {
  await sql(`
    create table method (
      id integer generated always as identity primary key,
      code text not null unique check (code ~ '^[a-z]+(-[a-z]+)*$'),
      current_revision_id integer
    )`);
  await sql(`
    create table method_revision (
      id integer generated always as identity primary key,
      method_id integer not null references method (id),
      n integer not null check (n >= 1),
      name text not null,
      summary text not null,
      minimum_seconds double precision not null check (minimum_seconds >= 0),
      minimum_cycles integer not null default 0 check (minimum_cycles >= 0),
      caution text not null,
      needs_confirmation boolean not null,
      counts boolean not null,
      checklist jsonb not null,
      created_at timestamptz not null,
      unique (method_id, n),
      unique (id, method_id)
    )`);
  await sql(`
    alter table method add constraint method_current_revision
      foreign key (current_revision_id, id) references method_revision (id, method_id)`);
  await sql(`
    create table instrument (
      id integer generated always as identity primary key,
      public_id text not null unique check (public_id ~ '^[a-z0-9]{10}$'),
      member_id integer not null references member (id),
      name text not null check (char_length(btrim(name)) between 1 and 80),
      current_revision_id integer,
      retired_at timestamptz,
      created_at timestamptz not null
    )`);
  await sql('create index instrument_member on instrument (member_id)');
  await sql(`
    create table instrument_revision (
      id integer generated always as identity primary key,
      instrument_id integer not null references instrument (id),
      n integer not null check (n >= 1),
      kind text not null check (
        kind in ('plug-in-meter', 'metering-breaker', 'clamp', 'dc-shunt', 'inverter-log', 'bench-analyser')),
      model_name text not null check (char_length(model_name) between 1 and 80),
      percent_of_reading double precision not null check (percent_of_reading between 0 and 100),
      percent_of_range double precision not null check (percent_of_range between 0 and 100),
      range_watts double precision check (range_watts > 0),
      counts double precision not null check (counts between 0 and 1000),
      resolution_watts double precision not null check (resolution_watts > 0),
      resolution_watt_hours double precision check (resolution_watt_hours > 0),
      lower_limit_watts double precision check (lower_limit_watts >= 0),
      reads_true_power boolean not null,
      supplies text[] not null check (supplies <@ array['ac-230', 'ac-120', 'dc'] and cardinality(supplies) >= 1),
      averaging_seconds double precision check (averaging_seconds > 0),
      calibrated_on date,
      created_at timestamptz not null,
      unique (instrument_id, n),
      unique (id, instrument_id),
      check (percent_of_range = 0 or range_watts is not null)
    )`);
  await sql(`
    alter table instrument add constraint instrument_current_revision
      foreign key (current_revision_id, id) references instrument_revision (id, instrument_id)`);
};

export const down: MigrationStep = async ({ sql }) => {
  await sql('alter table instrument drop constraint instrument_current_revision');
  await sql('drop table instrument_revision');
  await sql('drop table instrument');
  await sql('alter table method drop constraint method_current_revision');
  await sql('drop table method_revision');
  await sql('drop table method');
};
