import 'server-only';
import { database } from '@/lib/platform/database/connection';
import { notFound } from '@/lib/platform/errors';

export interface Draft {
  publicId: string;
  version: number;
  content: Record<string, unknown>;
  updatedAt: string;
}

/** A member's open drafts, the latest first. */
export async function draftsOf(memberId: number): Promise<Draft[]> {
  const rows = await database().models.ReportDraft.findAll({
    where: { memberId, sentAt: null },
    order: [['updatedAt', 'DESC']],
  });
  return rows.map(toDraft);
}

/** @throws {AppError} not-found, also where it is somebody else's: a stranger learns nothing of it. */
export async function draftOf(memberId: number, draftPublicId: string): Promise<Draft> {
  const row = await database().models.ReportDraft.findOne({
    where: { publicId: draftPublicId, memberId, sentAt: null },
  });
  if (!row) throw notFound('draft');
  return toDraft(row);
}

function toDraft(row: { publicId: string; version: number; content: object; updatedAt: Date }): Draft {
  return {
    publicId: row.publicId,
    version: row.version,
    content: row.content as Record<string, unknown>,
    updatedAt: row.updatedAt.toISOString(),
  };
}
