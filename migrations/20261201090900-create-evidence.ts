import type { MigrationStep } from '@/lib/platform/database/migration';

/** Phases, traces, photos and the figures that a revision yields. */
export const up: MigrationStep = async ({ sql }) => {
  await sql(`
    create table phase (
      id integer generated always as identity primary key,
      report_revision_id integer not null references report_revision (id),
      position integer not null check (position >= 1),
      mode_id integer not null references operating_mode (id),
      source text not null check (source in ('typed', 'trace')),
      starts_at timestamptz,
      ends_at timestamptz,
      duration_seconds double precision not null check (duration_seconds > 0),
      mean_watts double precision,
      minimum_watts double precision,
      maximum_watts double precision,
      energy_watt_hours double precision,
      uses integer check (uses >= 1),
      note text not null default '' check (char_length(note) <= 500),
      unique (report_revision_id, position),
      check (ends_at > starts_at),
      check (minimum_watts <= maximum_watts)
    )`);
  // The file as it came stays private to the report; what is published is the normalised series.
  await sql(`
    create table trace (
      id integer generated always as identity primary key,
      public_id text not null unique check (public_id ~ '^[a-z0-9]{10}$'),
      member_id integer not null references member (id),
      file_name text not null check (char_length(file_name) between 1 and 200),
      file_hash text not null check (file_hash ~ '^[0-9a-f]{64}$'),
      file_bytes integer not null check (file_bytes > 0),
      stored_file text not null unique,
      stored_series text not null unique,
      kind text not null check (kind in ('samples', 'averages', 'changes', 'counter')),
      power_kind text not null check (power_kind in ('real', 'apparent')),
      zone text not null,
      description jsonb not null,
      corrections jsonb not null,
      importer_version text not null,
      samples integer not null check (samples >= 2),
      starts_at timestamptz not null,
      ends_at timestamptz not null,
      averaging_seconds double precision check (averaging_seconds > 0),
      step double precision not null check (step >= 0),
      levels jsonb not null,
      created_at timestamptz not null,
      check (ends_at > starts_at)
    )`);
  await sql('create index trace_member on trace (member_id)');
  await sql('create index trace_file_hash on trace (file_hash)');
  await sql(`
    create table report_revision_trace (
      report_revision_id integer not null references report_revision (id),
      trace_id integer not null references trace (id),
      primary key (report_revision_id, trace_id)
    )`);
  await sql(`
    create table phase_trace (
      phase_id integer not null references phase (id),
      trace_id integer not null references trace (id),
      from_seconds double precision not null,
      to_seconds double precision not null,
      primary key (phase_id, trace_id),
      check (to_seconds > from_seconds)
    )`);
  // A photo's original is never kept: these are the two sizes that were written anew, without metadata.
  await sql(`
    create table attachment (
      id integer generated always as identity primary key,
      public_id text not null unique check (public_id ~ '^[a-z0-9]{10}$'),
      member_id integer not null references member (id),
      original_hash text not null check (original_hash ~ '^[0-9a-f]{64}$'),
      stored_large text not null unique,
      large_width integer not null check (large_width > 0),
      large_height integer not null check (large_height > 0),
      large_bytes integer not null check (large_bytes > 0),
      large_hash text not null check (large_hash ~ '^[0-9a-f]{64}$'),
      stored_small text not null unique,
      small_width integer not null check (small_width > 0),
      small_height integer not null check (small_height > 0),
      small_bytes integer not null check (small_bytes > 0),
      small_hash text not null check (small_hash ~ '^[0-9a-f]{64}$'),
      removed_metadata text[] not null,
      licence text not null check (licence in ('CC-BY-4.0')),
      created_at timestamptz not null
    )`);
  await sql('create index attachment_member on attachment (member_id)');
  await sql('create index attachment_original_hash on attachment (original_hash)');
  await sql(`
    create table report_revision_attachment (
      report_revision_id integer not null references report_revision (id),
      attachment_id integer not null references attachment (id),
      position integer not null check (position >= 1),
      kind text not null check (kind in ('display', 'set-up', 'rating-plate')),
      caption text not null default '' check (char_length(caption) <= 300),
      primary key (report_revision_id, attachment_id),
      unique (report_revision_id, position)
    )`);
  await sql(`
    create table report_figure (
      id integer generated always as identity primary key,
      report_revision_id integer not null references report_revision (id),
      mode_id integer references operating_mode (id),
      quantity text not null check (quantity in (
        'mean-power', 'minimum-power', 'maximum-power', 'day-energy', 'use-energy', 'start-extra-energy')),
      power_kind text not null check (power_kind in ('real', 'apparent')),
      supply_class text not null check (supply_class in ('ac-230', 'ac-120', 'dc')),
      value double precision not null check (value > '-Infinity' and value < 'Infinity'),
      standard_uncertainty double precision not null check (
        standard_uncertainty >= 0 and standard_uncertainty < 'Infinity'),
      gain double precision not null check (gain >= 0),
      "offset" double precision not null check ("offset" >= 0),
      resolution double precision not null check (resolution >= 0),
      repeatability double precision not null check (repeatability >= 0),
      drift double precision not null check (drift >= 0),
      below_limit double precision not null check (below_limit >= 0),
      censored_at double precision check (censored_at > 0),
      averaging_seconds double precision check (averaging_seconds > 0),
      coverage double precision check (coverage between 0 and 1),
      counted_seconds double precision not null check (counted_seconds > 0),
      computation_version text not null,
      unique nulls not distinct (report_revision_id, mode_id, quantity, power_kind)
    )`);
};

export const down: MigrationStep = async ({ sql }) => {
  await sql('drop table report_figure');
  await sql('drop table report_revision_attachment');
  await sql('drop table attachment');
  await sql('drop table phase_trace');
  await sql('drop table report_revision_trace');
  await sql('drop table trace');
  await sql('drop table phase');
};
