import 'server-only';
import { UniqueConstraintError } from 'sequelize';
import { now } from '@/lib/platform/clock';
import { recordEvent } from '@/lib/platform/database/record-event';
import { brokenConstraint, inTransaction, type Work } from '@/lib/platform/database/transaction';
import { env } from '@/lib/platform/env';
import { AppError, notFound } from '@/lib/platform/errors';
import { publicId } from '@/lib/platform/ids';
import { queueMail } from '@/lib/platform/mail/queue-mail';
import type { Report } from '@/models/report';
import { mayAmend } from '../policy';
import type { Submission } from '../schema';
import { addRevision } from './add-revision';
import { gatherEvidence } from './gather-evidence';
import { categoryOf, field, findOrAddUnit, resolveDevice } from './resolve-device';

export interface SendOptions {
  memberId: number;
  /** Made by the client: the same key again is the same report, or the same revision of it. */
  clientKey: string;
  /** The report that this amends, or null for a new one. */
  amendsPublicId: string | null;
  draftPublicId: string | null;
  submission: Submission;
}

/**
 * Sends a report for review: device, unit, revision with its phases, evidence and figures, all or nothing.
 *
 * @returns the report's public id; of a repeated key the one that it made first.
 * @throws {AppError} bad-input with the fields concerned; conflict where the report to amend waits for a verdict.
 */
export async function sendReport(options: SendOptions): Promise<string> {
  try {
    return await inTransaction((work) =>
      options.amendsPublicId === null ? sendNew(work, options) : amend(work, options),
    );
  } catch (error) {
    if (!(error instanceof UniqueConstraintError) || brokenConstraint(error) !== 'report_member_id_client_key_key')
      throw error;
    // Two sendings of one key at once: the other one won, and its report is the answer.
    return inTransaction(async (work) => {
      const known = await reportOfKey(work, options);
      if (!known) throw error;
      return known.publicId;
    });
  }
}

async function sendNew(work: Work, options: SendOptions): Promise<string> {
  const { submission, memberId, clientKey } = options;
  const known = await reportOfKey(work, options);
  if (known) return known.publicId;
  const { deviceId, variantId } = await resolveDevice(work, memberId, submission);
  const category = await categoryOf(work, deviceId);
  const evidence = await gatherEvidence(work, memberId, category, submission);
  const unitId = await findOrAddUnit(work, memberId, deviceId, submission.content.unitLabel);
  const report = await work.models.Report.create(
    { publicId: publicId(), memberId, deviceId, variantId, unitId, clientKey, state: 'draft', createdAt: now() },
    { transaction: work.transaction },
  );
  const revisionId = await addRevision(work, report, category, submission, evidence, null);
  return submit(work, options, report, revisionId);
}

/**
 * An amendment is of the same device, variant and unit: moving them now would move published figures before the
 * verdict. What was verified stays published until the amendment is.
 */
async function amend(work: Work, options: SendOptions): Promise<string> {
  const { submission, memberId, clientKey } = options;
  const { models, transaction } = work;
  const report = await models.Report.findOne({
    where: { publicId: options.amendsPublicId as string, memberId },
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
  if (!report) throw notFound('report');
  const known = await models.ReportRevision.findOne({ where: { reportId: report.id, clientKey }, transaction });
  if (known) return report.publicId;
  if (!mayAmend({ memberId, role: 'member' }, report)) {
    const message = 'A report that waits for review can’t be changed. Withdraw it, or wait for the verdict.';
    throw new AppError('conflict', message, { facts: { state: report.state } });
  }
  const { deviceId } = await resolveDevice(work, memberId, submission);
  if (deviceId !== report.deviceId) {
    throw field('/device', 'An amendment is of the same device. For another one, send a new report.');
  }
  const category = await categoryOf(work, deviceId);
  const evidence = await gatherEvidence(work, memberId, category, submission);
  const revisionId = await addRevision(work, report, category, submission, evidence, clientKey);
  return submit(work, options, report, revisionId);
}

async function submit(work: Work, options: SendOptions, report: Report, revisionId: number): Promise<string> {
  const before = report.state;
  await report.update(
    { state: 'submitted', pendingRevisionId: revisionId, submittedAt: now() },
    { transaction: work.transaction },
  );
  await closeDraft(work, options);
  await recordEvent(work, {
    actorId: options.memberId,
    action: 'report.submitted',
    subject: { kind: 'report', id: report.id },
    before: { state: before },
    after: { state: 'submitted', revisionId },
  });
  await tellReceived(work, options.memberId, report);
  work.dropTag(`report:${report.publicId}`);
  return report.publicId;
}

function reportOfKey(work: Work, { memberId, clientKey }: SendOptions): Promise<Report | null> {
  return work.models.Report.findOne({ where: { memberId, clientKey }, transaction: work.transaction });
}

async function closeDraft(work: Work, { draftPublicId, memberId }: SendOptions): Promise<void> {
  if (draftPublicId === null) return;
  await work.models.ReportDraft.update(
    { sentAt: now() },
    { where: { publicId: draftPublicId, memberId, sentAt: null }, transaction: work.transaction },
  );
}

async function tellReceived(work: Work, memberId: number, report: Report): Promise<void> {
  const member = await work.models.Member.findByPk(memberId, { transaction: work.transaction, rejectOnEmpty: true });
  if (member.email === null) return;
  await queueMail(work, {
    to: member.email,
    subject: 'Your report was received',
    paragraphs: [
      'Your measurement report was received and waits for a moderator. You will hear what comes of it.',
      { label: 'See the report', href: `${env().publicOrigin}/reports/${report.publicId}/mine` },
    ],
  });
}
