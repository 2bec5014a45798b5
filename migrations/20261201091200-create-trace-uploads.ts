import type { MigrationStep } from '@/lib/platform/database/migration';

/** A file as it came, before and after it is understood: it can be read again with other corrections. */
export const up: MigrationStep = async ({ sql }) => {
  await sql(`
    create table trace_upload (
      id integer generated always as identity primary key,
      public_id text not null unique check (public_id ~ '^[a-z0-9]{10}$'),
      member_id integer not null references member (id),
      file_name text not null check (char_length(file_name) between 1 and 200),
      file_hash text not null check (file_hash ~ '^[0-9a-f]{64}$'),
      file_bytes integer not null check (file_bytes > 0),
      stored_file text not null unique,
      created_at timestamptz not null
    )`);
  await sql('create index trace_upload_member on trace_upload (member_id)');
  await sql('alter table trace drop constraint trace_stored_file_key');
  await sql('alter table trace add column upload_id integer not null references trace_upload (id)');
  await sql('create index trace_upload_of on trace (upload_id)');
};

export const down: MigrationStep = async ({ sql }) => {
  await sql('alter table trace drop column upload_id');
  await sql('alter table trace add constraint trace_stored_file_key unique (stored_file)');
  await sql('drop table trace_upload');
};
