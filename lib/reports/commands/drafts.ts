import 'server-only';
import { now } from '@/lib/platform/clock';
import { database } from '@/lib/platform/database/connection';
import { AppError, notFound } from '@/lib/platform/errors';
import { publicId } from '@/lib/platform/ids';

const MOST_DRAFTS = 50;

/**
 * Begins a draft.
 * @throws {AppError} quota-reached at fifty open drafts.
 */
export async function beginDraft(memberId: number, content: object): Promise<{ publicId: string; version: number }> {
  const { ReportDraft } = database().models;
  if ((await ReportDraft.count({ where: { memberId, sentAt: null } })) >= MOST_DRAFTS) {
    throw new AppError('quota-reached', `You have ${MOST_DRAFTS} drafts open. Send or delete one first.`);
  }
  const row = await ReportDraft.create({
    publicId: publicId(),
    memberId,
    content,
    createdAt: now(),
    updatedAt: now(),
  });
  return { publicId: row.publicId, version: row.version };
}

/**
 * Saves a draft over the version that was read. The check and the write are one statement, so that of two editors one is
 * told; neither text is lost.
 *
 * @throws {AppError} version-missing, or version-changed with what is saved now.
 */
export async function saveDraft(
  memberId: number,
  draftPublicId: string,
  version: number | null,
  content: object,
): Promise<number> {
  if (version === null) {
    throw new AppError(
      'version-missing',
      'Say which version you read, in If-Match, so that nothing is overwritten unseen.',
    );
  }
  const { ReportDraft } = database().models;
  const [changed] = await ReportDraft.update(
    { content, version: version + 1, updatedAt: now() },
    { where: { publicId: draftPublicId, memberId, version, sentAt: null } },
  );
  if (changed === 1) return version + 1;
  const current = await ReportDraft.findOne({ where: { publicId: draftPublicId, memberId } });
  if (!current) throw notFound('draft');
  if (current.sentAt) throw new AppError('gone', 'This draft was sent; the report goes on from there.');
  throw new AppError('version-changed', 'This draft was changed elsewhere. Compare the two and choose what stays.', {
    facts: { version: current.version, content: current.content },
  });
}

export async function deleteDraft(memberId: number, draftPublicId: string): Promise<void> {
  const { ReportDraft } = database().models;
  const deleted = await ReportDraft.destroy({ where: { publicId: draftPublicId, memberId, sentAt: null } });
  if (deleted === 0) throw notFound('draft');
}
