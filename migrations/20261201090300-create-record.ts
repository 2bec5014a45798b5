import type { MigrationStep } from '@/lib/platform/database/migration';

/** What stands beside every change: the event, the mail that it owes, and the answer to a repeated request. */
export const up: MigrationStep = async ({ sql }) => {
  await sql(`
    create table event (
      id bigint generated always as identity primary key,
      at timestamptz not null,
      actor_id integer references member (id),
      action text not null check (action ~ '^[a-z]+([.-][a-z]+)+$'),
      subject_kind text not null,
      subject_id integer not null,
      before jsonb,
      after jsonb,
      request_id text
    )`);
  await sql('create index event_subject on event (subject_kind, subject_id)');
  await sql('create index event_actor on event (actor_id)');
  await sql(`
    create table outbox (
      id integer generated always as identity primary key,
      message_id text not null unique,
      to_address text not null,
      subject text not null check (subject !~ '[\\r\\n]'),
      body_text text not null,
      body_html text not null,
      attempts integer not null default 0 check (attempts >= 0),
      not_before timestamptz not null,
      sent_at timestamptz,
      last_error text,
      created_at timestamptz not null
    )`);
  await sql('create index outbox_waiting on outbox (not_before) where sent_at is null');
  await sql(`
    create table idempotency_key (
      member_id integer not null references member (id),
      key text not null check (char_length(key) between 8 and 128),
      request_hash text not null,
      status integer not null,
      response jsonb not null,
      created_at timestamptz not null,
      primary key (member_id, key)
    )`);
};

export const down: MigrationStep = async ({ sql }) => {
  await sql('drop table idempotency_key');
  await sql('drop table outbox');
  await sql('drop table event');
};
