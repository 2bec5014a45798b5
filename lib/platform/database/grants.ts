/**
 * Tables that only grow: the application may read them and add to them, nothing else. They are the record that a
 * reader's trust rests on, so the database itself refuses a change.
 */
export const APPEND_ONLY_TABLES = [
  'category_revision',
  'category_mode',
  'claim_revision',
  'method_revision',
  'instrument_revision',
  'report_revision',
  'report_revision_trace',
  'report_revision_attachment',
  'phase',
  'phase_trace',
  'report_figure',
  'review',
  'review_remark',
  'published_figure_history',
  'event',
] as const;

/**
 * The statements that give the application's role its rights after each migration: rows everywhere, no DDL, and
 * select and insert alone on the append-only tables.
 */
export function grantStatements(applicationRole: string): string[] {
  const role = `"${applicationRole.replaceAll('"', '""')}"`;
  return [
    `grant usage on schema public to ${role}`,
    `grant select, insert, update, delete on all tables in schema public to ${role}`,
    `grant usage, select on all sequences in schema public to ${role}`,
    ...APPEND_ONLY_TABLES.map((table) => `revoke update, delete, truncate on ${table} from ${role}`),
    `revoke insert, update, delete, truncate on schema_migration from ${role}`,
  ];
}
