import 'server-only';
import { QueryTypes } from 'sequelize';
import { database } from '@/lib/platform/database/connection';
import { notFound } from '@/lib/platform/errors';

export interface Draft {
  publicId: string;
  version: number;
  content: Record<string, unknown>;
  updatedAt: string;
  /** The report that it amends, or null. */
  amendsPublicId: string | null;
}

/** A member's open drafts, the latest first. */
export function draftsOf(memberId: number): Promise<Draft[]> {
  return select('order by d.updated_at desc, d.id desc', [memberId]);
}

/** @throws {AppError} not-found, also where it is somebody else's: a stranger learns nothing of it. */
export async function draftOf(memberId: number, draftPublicId: string): Promise<Draft> {
  const [draft] = await select('and d.public_id = $2', [memberId, draftPublicId]);
  if (!draft) throw notFound('draft');
  return draft;
}

async function select(rest: string, bind: unknown[]): Promise<Draft[]> {
  const rows = await database().sequelize.query<Omit<Draft, 'updatedAt'> & { updatedAt: Date }>(
    `select d.public_id as "publicId", d.version, d.content, d.updated_at as "updatedAt",
            r.public_id as "amendsPublicId"
     from report_draft d left join report r on r.id = d.report_id
     where d.member_id = $1 and d.sent_at is null ${rest}`,
    { bind, type: QueryTypes.SELECT },
  );
  return rows.map((row) => ({ ...row, updatedAt: new Date(row.updatedAt).toISOString() }));
}
