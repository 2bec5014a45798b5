import type { MigrationStep } from '@/lib/platform/database/migration';

export const up: MigrationStep = async ({ sql }) => {
  await sql(`
    create table claim (
      id integer generated always as identity primary key,
      public_id text not null unique check (public_id ~ '^[a-z0-9]{10}$'),
      device_id integer not null references device (id),
      variant_id integer,
      state text not null default 'in-force' check (state in ('in-force', 'disputed', 'superseded')),
      current_revision_id integer,
      created_at timestamptz not null,
      foreign key (variant_id, device_id) references variant (id, device_id)
    )`);
  await sql('create index claim_device on claim (device_id)');
  await sql(`
    create table claim_revision (
      id integer generated always as identity primary key,
      claim_id integer not null references claim (id),
      n integer not null check (n >= 1),
      kind text not null check (
        kind in ('typical', 'maximum', 'standby', 'networked-standby', 'annual-energy', 'use-energy')),
      lower double precision check (lower >= 0),
      upper double precision check (upper >= 0),
      single_value boolean not null default false,
      last_digit double precision check (last_digit > 0),
      tolerance_percent double precision check (tolerance_percent >= 0),
      unit text not null check (unit in ('W', 'VA', 'kWh/a', 'Wh/d', 'Wh/use')),
      uses_per_year double precision check (uses_per_year > 0),
      term text not null check (char_length(term) between 1 and 200),
      definition text check (char_length(definition) <= 2000),
      mode_id integer references operating_mode (id),
      mode_reason text check (char_length(mode_reason) <= 1000),
      contradicts_mode text check (char_length(contradicts_mode) <= 1000),
      ambient_celsius double precision,
      source_title text not null check (char_length(source_title) between 1 and 300),
      source_address text check (source_address ~ '^https?://'),
      source_page text check (char_length(source_page) <= 60),
      read_on date not null,
      valid_from date,
      valid_until date,
      author_id integer references member (id),
      created_at timestamptz not null,
      unique (claim_id, n),
      unique (id, claim_id),
      check (lower is not null or upper is not null),
      check (lower <= upper),
      check (not single_value or lower = upper),
      check (valid_from <= valid_until)
    )`);
  await sql(`
    alter table claim add constraint claim_current_revision
      foreign key (current_revision_id, id) references claim_revision (id, claim_id)`);
};

export const down: MigrationStep = async ({ sql }) => {
  await sql('alter table claim drop constraint claim_current_revision');
  await sql('drop table claim_revision');
  await sql('drop table claim');
};
