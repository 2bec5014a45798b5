import type { MigrationStep } from '@/lib/platform/database/migration';

export const up: MigrationStep = async ({ sql }) => {
  await sql(`
    create table maker (
      id integer generated always as identity primary key,
      public_id text not null unique check (public_id ~ '^[a-z0-9]{10}$'),
      name citext not null unique check (char_length(name) between 1 and 80),
      created_at timestamptz not null
    )`);
  await sql(`
    create table device (
      id integer generated always as identity primary key,
      public_id text not null unique check (public_id ~ '^[a-z0-9]{10}$'),
      category_id integer not null references category (id),
      maker_id integer not null references maker (id),
      model citext not null check (char_length(model) between 1 and 80),
      state text not null default 'new' check (state in ('new', 'confirmed', 'merged', 'refused')),
      merged_into_id integer references device (id),
      proposed_by_id integer references member (id),
      created_at timestamptz not null,
      check (merged_into_id <> id),
      check ((state = 'merged') = (merged_into_id is not null))
    )`);
  await sql(`
    create unique index device_model on device (maker_id, model) where state in ('new', 'confirmed')`);
  await sql('create index device_category on device (category_id)');
  await sql(`
    create table variant (
      id integer generated always as identity primary key,
      device_id integer not null references device (id),
      generation text not null check (char_length(generation) between 1 and 60),
      region text check (char_length(region) <= 60),
      rated_watts double precision check (rated_watts > 0),
      rated_supply text check (char_length(rated_supply) <= 60),
      created_at timestamptz not null,
      unique nulls not distinct (device_id, generation, region),
      unique (id, device_id)
    )`);
  await sql(`
    create table device_alias (
      id integer generated always as identity primary key,
      device_id integer not null references device (id),
      name citext not null check (char_length(name) between 1 and 120),
      created_at timestamptz not null,
      unique (device_id, name)
    )`);
};

export const down: MigrationStep = async ({ sql }) => {
  await sql('drop table device_alias');
  await sql('drop table variant');
  await sql('drop table device');
  await sql('drop table maker');
};
