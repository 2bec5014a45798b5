import type { MigrationStep } from '@/lib/platform/database/migration';

export const up: MigrationStep = async ({ sql }) => {
  await sql(`
    create table session (
      id integer generated always as identity primary key,
      member_id integer not null references member (id),
      token_hash text not null unique,
      created_at timestamptz not null,
      seen_at timestamptz not null,
      idle_ends_at timestamptz not null,
      absolute_ends_at timestamptz not null,
      second_factor_at timestamptz,
      ended_at timestamptz,
      check (absolute_ends_at > created_at)
    )`);
  await sql('create index session_member on session (member_id)');
  await sql(`
    create table credential_token (
      id integer generated always as identity primary key,
      member_id integer not null references member (id),
      purpose text not null check (purpose in ('confirm-address', 'reset-password', 'change-address')),
      token_hash text not null unique,
      expires_at timestamptz not null,
      used_at timestamptz,
      created_at timestamptz not null,
      check (expires_at > created_at)
    )`);
  await sql('create index credential_token_member on credential_token (member_id)');
};

export const down: MigrationStep = async ({ sql }) => {
  await sql('drop table credential_token');
  await sql('drop table session');
};
