import type { Actor } from '@/lib/auth/schema';

type Someone = Pick<Actor, 'memberId' | 'role'>;

/** Moderators and admins review, and nobody their own report. */
export function mayReview(actor: Someone, report: { memberId: number }): boolean {
  return actor.role !== 'member' && actor.memberId !== report.memberId;
}
