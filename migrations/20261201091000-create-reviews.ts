import type { MigrationStep } from '@/lib/platform/database/migration';

export const up: MigrationStep = async ({ sql }) => {
  // The author's id stands here through the report's own key, so that the database itself refuses a self-review.
  await sql(`
    create table review (
      id integer generated always as identity primary key,
      report_id integer not null,
      report_revision_id integer not null,
      author_id integer not null,
      reviewer_id integer not null references member (id),
      slot text not null check (slot in ('first', 'second')),
      verdict text not null check (verdict in ('verified', 'changes-requested', 'declined')),
      checklist jsonb not null,
      reason text not null default '' check (char_length(reason) <= 4000),
      created_at timestamptz not null,
      foreign key (report_id, author_id) references report (id, member_id),
      foreign key (report_revision_id, report_id) references report_revision (id, report_id),
      unique (report_revision_id, reviewer_id),
      unique (report_revision_id, slot),
      check (author_id <> reviewer_id),
      check (verdict = 'verified' or char_length(btrim(reason)) >= 1)
    )`);
  await sql('create index review_reviewer on review (reviewer_id)');
  await sql(`
    create table review_remark (
      id integer generated always as identity primary key,
      review_id integer not null references review (id),
      pointer text not null check (pointer ~ '^(/[^/]*)+$'),
      remark text not null check (char_length(btrim(remark)) between 1 and 2000)
    )`);
  await sql('create index review_remark_review on review_remark (review_id)');
  await sql(`
    create table set_aside (
      id integer generated always as identity primary key,
      report_figure_id integer not null references report_figure (id),
      by_id integer not null references member (id),
      reason text not null check (char_length(btrim(reason)) between 1 and 2000),
      from_at timestamptz not null,
      until_at timestamptz,
      check (until_at >= from_at)
    )`);
  await sql('create unique index set_aside_open on set_aside (report_figure_id) where until_at is null');
};

export const down: MigrationStep = async ({ sql }) => {
  await sql('drop table set_aside');
  await sql('drop table review_remark');
  await sql('drop table review');
};
