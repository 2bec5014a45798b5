import 'server-only';
import { UniqueConstraintError } from 'sequelize';
import { proposeDevice } from '@/lib/catalogue/commands';
import { categoryById } from '@/lib/catalogue/queries';
import type { Category } from '@/lib/catalogue/schema';
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

export interface SendOptions {
  memberId: number;
  /** Made by the client: the same key again is the same report. */
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
 * @throws {AppError} bad-input with the fields concerned.
 */
export async function sendReport(options: SendOptions): Promise<string> {
  try {
    return await inTransaction((work) => send(work, options));
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

async function send(work: Work, options: SendOptions): Promise<string> {
  const { submission, memberId } = options;
  const known = await reportOfKey(work, options);
  if (known && options.amendsPublicId === null) return known.publicId;
  const { deviceId, variantId } = await resolveDevice(work, memberId, submission);
  const category = await categoryOf(work, deviceId);
  const evidence = await gatherEvidence(work, memberId, category, submission);
  const unitId = await findOrAddUnit(work, memberId, deviceId, submission.content.unitLabel);
  const report =
    options.amendsPublicId === null
      ? await work.models.Report.create(
          {
            publicId: publicId(),
            memberId,
            deviceId,
            variantId,
            unitId,
            clientKey: options.clientKey,
            state: 'draft',
            createdAt: now(),
          },
          { transaction: work.transaction },
        )
      : await lockForAmending(work, memberId, options.amendsPublicId);
  const revisionId = await addRevision(work, report, category, submission, evidence);
  const before = report.state;
  // An amendment is of the same variant and unit: moving them now would move published figures before the verdict.
  await report.update(
    { state: 'submitted', pendingRevisionId: revisionId, submittedAt: now() },
    { transaction: work.transaction },
  );
  await closeDraft(work, options);
  await recordEvent(work, {
    actorId: memberId,
    action: 'report.submitted',
    subject: { kind: 'report', id: report.id },
    before: { state: before },
    after: { state: 'submitted', revisionId },
  });
  await tellReceived(work, memberId, report);
  work.dropTag(`report:${report.publicId}`);
  return report.publicId;
}

function reportOfKey(work: Work, { memberId, clientKey }: SendOptions): Promise<Report | null> {
  return work.models.Report.findOne({ where: { memberId, clientKey }, transaction: work.transaction });
}

async function resolveDevice(work: Work, memberId: number, { device }: Submission) {
  if (device.from === 'proposal') return proposeDevice(work, memberId, device.proposal);
  const row = await work.models.Device.findOne({ where: { publicId: device.publicId }, transaction: work.transaction });
  if (!row || row.state === 'refused')
    throw field('/device', 'There is no such device. Choose one by search, or propose it.');
  return { deviceId: row.mergedIntoId ?? row.id, variantId: row.mergedIntoId === null ? device.variantId : null };
}

async function categoryOf(work: Work, deviceId: number): Promise<Category> {
  const device = await work.models.Device.findByPk(deviceId, { transaction: work.transaction, rejectOnEmpty: true });
  const category = await categoryById(device.categoryId);
  if (!category) throw field('/device', 'This device’s category is not in use any more. Choose another device.');
  return category;
}

/** The physical specimen, by its label among the units of this device that the member has registered. */
async function findOrAddUnit(
  work: Work,
  memberId: number,
  deviceId: number,
  label: string | null,
): Promise<number | null> {
  if (!label) return null;
  const where = { deviceId, label, registeredById: memberId };
  const [unit] = await work.models.Unit.findOrCreate({
    where,
    defaults: { ...where, publicId: publicId(), createdAt: now() },
    transaction: work.transaction,
  });
  return unit.id;
}

async function lockForAmending(work: Work, memberId: number, reportPublicId: string): Promise<Report> {
  const report = await work.models.Report.findOne({
    where: { publicId: reportPublicId, memberId },
    transaction: work.transaction,
    lock: work.transaction.LOCK.UPDATE,
  });
  if (!report) throw notFound('report');
  if (!mayAmend({ memberId, role: 'member' }, report)) {
    throw new AppError(
      'conflict',
      'A report that waits for review can’t be changed. Withdraw it, or wait for the verdict.',
      {
        facts: { state: report.state },
      },
    );
  }
  return report;
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
      { label: 'See the report', href: `${env().publicOrigin}/reports/${report.publicId}` },
    ],
  });
}

function field(pointer: string, message: string): AppError {
  return new AppError('bad-input', message, { fields: [{ pointer, message }] });
}
