import type { MigrationStep } from '@/lib/platform/database/migration';

export const up: MigrationStep = async ({ sql }) => {
  // A slug is never given twice: an old address redirects for ever, so its row stays when the current one moves on.
  await sql(`
    create table slug (
      slug text primary key check (slug ~ '^[a-z0-9]+(-[a-z0-9]+)*$' and char_length(slug) <= 120),
      target_kind text not null check (target_kind in ('category', 'device', 'maker', 'guide')),
      target_id integer not null,
      current boolean not null default true,
      created_at timestamptz not null
    )`);
  await sql('create unique index slug_current on slug (target_kind, target_id) where current');
  await sql(`
    create table operating_mode (
      id integer generated always as identity primary key,
      code text not null unique check (code ~ '^[a-z]+(-[a-z]+)*$'),
      name text not null,
      definition text not null
    )`);
  await sql(`
    create table category (
      id integer generated always as identity primary key,
      public_id text not null unique check (public_id ~ '^[a-z0-9]{10}$'),
      parent_id integer references category (id),
      name citext not null unique,
      current_revision_id integer,
      created_at timestamptz not null,
      check (parent_id <> id)
    )`);
  await sql(`
    create table category_revision (
      id integer generated always as identity primary key,
      category_id integer not null references category (id),
      n integer not null check (n >= 1),
      summary text not null,
      duty text not null check (duty in ('continuous', 'cyclic', 'per-use', 'modulating')),
      basis_quantity text not null check (basis_quantity in ('mean-power', 'day-energy', 'use-energy')),
      basis_mode_id integer references operating_mode (id),
      pools_variants boolean not null,
      pools_supplies boolean not null,
      unit_spread double precision not null check (unit_spread > 0 and unit_spread < 1),
      may_be_switched_off boolean not null,
      use_pattern jsonb not null,
      conditions jsonb not null,
      cautions jsonb not null,
      author_id integer references member (id),
      created_at timestamptz not null,
      unique (category_id, n),
      unique (id, category_id),
      check ((basis_quantity = 'mean-power') = (basis_mode_id is not null))
    )`);
  await sql(`
    alter table category add constraint category_current_revision
      foreign key (current_revision_id, id) references category_revision (id, category_id)`);
  await sql(`
    create table category_mode (
      category_revision_id integer not null references category_revision (id),
      mode_id integer not null references operating_mode (id),
      position integer not null check (position >= 1),
      note text not null default '',
      primary key (category_revision_id, mode_id),
      unique (category_revision_id, position)
    )`);
};

export const down: MigrationStep = async ({ sql }) => {
  await sql('drop table category_mode');
  await sql('alter table category drop constraint category_current_revision');
  await sql('drop table category_revision');
  await sql('drop table category');
  await sql('drop table operating_mode');
  await sql('drop table slug');
};
