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

/** What a member called a file may say more than a measurement does, so it is for whoever works with the report. */
export function maySeeFileName(actor: Someone, evidence: { memberId: number }): boolean {
  return actor?.memberId === evidence.memberId || isModerator(actor);
}

/**
 * What was not published (a first revision, an amendment that waits, a report that was withdrawn) is read by its member
 * and, once sent, by moderators; what is published by everybody.
 */
export function maySeeUnpublished(actor: Someone, report: { memberId: number; state: ReportState }): boolean {
  if (actor?.memberId === report.memberId) return true;
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
