import type { MigrationStep } from '@/lib/platform/database/migration';

export const up: MigrationStep = async ({ sql }) => {
  await sql(`
    create table member (
      id integer generated always as identity primary key,
      public_id text not null unique check (public_id ~ '^[a-z0-9]{10}$'),
      email citext unique,
      password_hash text,
      role text not null default 'member' check (role in ('member', 'moderator', 'admin')),
      state text not null default 'unconfirmed' check (state in ('unconfirmed', 'active', 'suspended', 'erased')),
      confirmed_at timestamptz,
      erased_at timestamptz,
      former_number integer unique,
      created_at timestamptz not null,
      check ((state = 'erased') = (erased_at is not null)),
      check (state <> 'erased' or (email is null and password_hash is null and former_number is not null)),
      check (state <> 'active' or confirmed_at is not null)
    )`);
  // Everything about a person that can be erased stands in this one row; all other tables hold member ids alone.
  await sql(`
    create table personal_detail (
      member_id integer primary key references member (id),
      name text not null check (char_length(btrim(name)) between 1 and 80),
      region text check (char_length(region) <= 80),
      updated_at timestamptz not null
    )`);
};

export const down: MigrationStep = async ({ sql }) => {
  await sql('drop table personal_detail');
  await sql('drop table member');
};
