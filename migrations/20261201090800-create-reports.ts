import type { MigrationStep } from '@/lib/platform/database/migration';

export const up: MigrationStep = async ({ sql }) => {
  // The physical specimen: two members who measure one fridge are one voice.
  await sql(`
    create table unit (
      id integer generated always as identity primary key,
      public_id text not null unique check (public_id ~ '^[a-z0-9]{10}$'),
      device_id integer not null references device (id),
      label text not null check (char_length(btrim(label)) between 1 and 120),
      registered_by_id integer not null references member (id),
      created_at timestamptz not null,
      unique (id, device_id)
    )`);
  await sql(`
    create table report (
      id integer generated always as identity primary key,
      public_id text not null unique check (public_id ~ '^[a-z0-9]{10}$'),
      member_id integer not null references member (id),
      device_id integer not null references device (id),
      variant_id integer,
      unit_id integer,
      client_key text not null check (char_length(client_key) between 8 and 128),
      state text not null check (state in (
        'draft', 'submitted', 'second-review', 'changes-requested', 'verified', 'declined', 'withdrawn', 'lapsed')),
      pending_revision_id integer,
      published_revision_id integer,
      created_at timestamptz not null,
      submitted_at timestamptz,
      decided_at timestamptz,
      unique (member_id, client_key),
      unique (id, member_id),
      foreign key (variant_id, device_id) references variant (id, device_id) on update cascade,
      foreign key (unit_id, device_id) references unit (id, device_id) on update cascade,
      check (state <> 'verified' or published_revision_id is not null),
      check (state not in ('submitted', 'second-review') or pending_revision_id is not null)
    )`);
  await sql('create index report_device on report (device_id) where published_revision_id is not null');
  await sql('create index report_member on report (member_id)');
  await sql(`create index report_waiting on report (submitted_at) where state in ('submitted', 'second-review')`);
  await sql(`
    create table report_draft (
      id integer generated always as identity primary key,
      public_id text not null unique check (public_id ~ '^[a-z0-9]{10}$'),
      member_id integer not null references member (id),
      report_id integer,
      content jsonb not null,
      version integer not null default 1 check (version >= 1),
      created_at timestamptz not null,
      updated_at timestamptz not null,
      sent_at timestamptz,
      foreign key (report_id, member_id) references report (id, member_id)
    )`);
  await sql('create index report_draft_member on report_draft (member_id) where sent_at is null');
  await sql('create unique index report_draft_open on report_draft (report_id) where sent_at is null');
  await sql(`
    create table report_revision (
      id integer generated always as identity primary key,
      report_id integer not null references report (id),
      n integer not null check (n >= 1),
      schema_version integer not null check (schema_version >= 1),
      content jsonb not null,
      category_revision_id integer not null references category_revision (id),
      method_revision_id integer not null references method_revision (id),
      instrument_revision_id integer not null references instrument_revision (id),
      supply_class text not null check (supply_class in ('ac-230', 'ac-120', 'dc')),
      measuring_point text not null check (
        measuring_point in ('plug', 'circuit', 'battery-side', 'device-side', 'behind-adapter')),
      ambient_celsius double precision check (ambient_celsius between -60 and 80),
      licence text not null check (licence in ('CC-BY-4.0')),
      previous_hash text,
      hash text not null unique check (hash ~ '^[0-9a-f]{64}$'),
      created_at timestamptz not null,
      unique (report_id, n),
      unique (id, report_id),
      check ((n = 1) = (previous_hash is null))
    )`);
  await sql(`
    alter table report add constraint report_pending_revision
      foreign key (pending_revision_id, id) references report_revision (id, report_id)`);
  await sql(`
    alter table report add constraint report_published_revision
      foreign key (published_revision_id, id) references report_revision (id, report_id)`);
};

export const down: MigrationStep = async ({ sql }) => {
  await sql('alter table report drop constraint report_published_revision');
  await sql('alter table report drop constraint report_pending_revision');
  await sql('drop table report_revision');
  await sql('drop table report_draft');
  await sql('drop table report');
  await sql('drop table unit');
};
