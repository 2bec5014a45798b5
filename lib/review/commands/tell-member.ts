import 'server-only';
import type { Work } from '@/lib/platform/database/transaction';
import { env } from '@/lib/platform/env';
import { queueMail } from '@/lib/platform/mail/queue-mail';
import type { Report } from '@/models/report';
import type { Review } from '@/models/review';

const LETTERS = {
  verified: {
    subject: 'Your report was verified',
    text: 'A moderator has verified your measurement report. It counts in the published figures from now on.',
  },
  'changes-requested': {
    subject: 'Changes are requested to your report',
    text: 'A moderator has looked at your measurement report and asks for changes before it can be verified.',
  },
  declined: {
    subject: 'Your report was declined',
    text: 'A moderator has looked at your measurement report and declined it.',
  },
} as const;

/** Owes the member a letter about the verdict; an erased member has no address and gets none. */
export async function tellMember(work: Work, report: Report, review: Review, remarks: number): Promise<void> {
  const member = await work.models.Member.findByPk(report.memberId, { transaction: work.transaction });
  if (!member?.email) return;
  const { subject, text } = LETTERS[review.verdict];
  const pinned = remarks === 1 ? 'One remark stands' : `${remarks} remarks stand`;
  await queueMail(work, {
    to: member.email,
    subject,
    paragraphs: [
      text,
      ...(review.reason ? [`The moderator writes: ${review.reason}`] : []),
      ...(remarks > 0 ? [`${pinned} beside the fields of your report.`] : []),
      { label: 'See the report', href: `${env().publicOrigin}/reports/${report.publicId}` },
    ],
  });
}
