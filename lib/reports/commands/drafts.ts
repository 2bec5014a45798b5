import 'server-only';
import { UniqueConstraintError } from 'sequelize';
import { now } from '@/lib/platform/clock';
import { database } from '@/lib/platform/database/connection';
import { AppError, notFound } from '@/lib/platform/errors';
import { publicId } from '@/lib/platform/ids';
import { mayAmend } from '../policy';

const MOST_DRAFTS = 50;

export interface SavedDraft {
  publicId: string;
  version: number;
}

/**
 * Begins a draft, of a new report or of an amendment. A report has one open amendment: beginning it again finds it.
 *
 * @param amendsPublicId one's own report, or null.
 * @throws {AppError} quota-reached at fifty open drafts; conflict where the report can't be amended now.
 */
export async function beginDraft(
  memberId: number,
  content: object,
  amendsPublicId: string | null,
): Promise<SavedDraft> {
  const { ReportDraft } = database().models;
  const reportId = amendsPublicId === null ? null : await reportToAmend(memberId, amendsPublicId);
  const open = reportId === null ? null : await openAmendment(reportId);
  if (open) return open;
  if ((await ReportDraft.count({ where: { memberId, sentAt: null } })) >= MOST_DRAFTS) {
    throw new AppError('quota-reached', `You have ${MOST_DRAFTS} drafts open, the most. Send or delete one first.`);
  }
  try {
    const row = await ReportDraft.create({
      publicId: publicId(),
      memberId,
      reportId,
      content,
      createdAt: now(),
      updatedAt: now(),
    });
    return { publicId: row.publicId, version: row.version };
  } catch (error) {
    if (reportId === null || !(error instanceof UniqueConstraintError)) throw error;
    const other = await openAmendment(reportId);
    if (!other) throw error;
    return other;
  }
}

async function reportToAmend(memberId: number, reportPublicId: string): Promise<number> {
  const report = await database().models.Report.findOne({ where: { publicId: reportPublicId, memberId } });
  if (!report) throw notFound('report');
  if (!mayAmend({ memberId, role: 'member' }, report)) {
    const message = 'A report that waits for review can’t be changed. Withdraw it, or wait for the verdict.';
    throw new AppError('conflict', message, { facts: { state: report.state } });
  }
  return report.id;
}

async function openAmendment(reportId: number): Promise<SavedDraft | null> {
  const row = await database().models.ReportDraft.findOne({ where: { reportId, sentAt: null } });
  return row && { publicId: row.publicId, version: row.version };
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
