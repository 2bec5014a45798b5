import type { Actor } from '@/lib/auth/schema';
import type { ReportState } from './schema';

type Someone = Pick<Actor, 'memberId' | 'role'> | null;

/** Where a trace or a photo stands: whose it is, and what reports show it. */
export interface EvidenceStanding {
  memberId: number;
  isPublished: boolean;
  isSubmitted: boolean;
}

export function isModerator(actor: Someone): boolean {
  return actor !== null && actor.role !== 'member';
}

/** Published evidence is for everybody, submitted for moderators, the rest for its member alone. */
export function maySeeEvidence(actor: Someone, evidence: EvidenceStanding): boolean {
  if (evidence.isPublished || actor?.memberId === evidence.memberId) return true;
  return evidence.isSubmitted && isModerator(actor);
}

/** A report that was verified once is read by everybody; before that by its member and, once sent, by moderators. */
export function maySeeReport(
  actor: Someone,
  report: { memberId: number; state: ReportState; isPublished: boolean },
): boolean {
  if (report.isPublished || actor?.memberId === report.memberId) return true;
  return report.state !== 'draft' && isModerator(actor);
}

const WITHDRAWABLE: ReportState[] = ['submitted', 'second-review', 'changes-requested', 'verified'];

export function mayWithdraw(actor: Someone, report: { memberId: number; state: ReportState }): boolean {
  return actor?.memberId === report.memberId && WITHDRAWABLE.includes(report.state);
}

const AMENDABLE: ReportState[] = ['changes-requested', 'verified', 'declined'];

/** A report that waits is not amended under the moderator's eyes: it is withdrawn, or decided first. */
export function mayAmend(actor: Someone, report: { memberId: number; state: ReportState }): boolean {
  return actor?.memberId === report.memberId && AMENDABLE.includes(report.state);
}
