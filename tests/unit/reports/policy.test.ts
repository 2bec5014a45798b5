import { describe, expect, it } from 'vitest';
import { mayAmend, maySeeEvidence, maySeeFileName, maySeeUnpublished, mayWithdraw } from '@/lib/reports/policy';
import { REPORT_STATES } from '@/lib/reports/schema';

const author = { memberId: 1, role: 'member' as const };
const stranger = { memberId: 2, role: 'member' as const };
const moderator = { memberId: 3, role: 'moderator' as const };
const admin = { memberId: 4, role: 'admin' as const };
const everybody = [null, stranger, moderator, admin, author];

describe('who may', () => {
  it.each(REPORT_STATES)('see what is not published of a report that is %s', (state) => {
    const staff = state !== 'draft';
    expect(everybody.map((actor) => maySeeUnpublished(actor, { memberId: 1, state }))).toEqual([
      false,
      false,
      staff,
      staff,
      true,
    ]);
  });

  it.each([
    [false, false, [false, false, false, false, true]],
    [true, false, [false, false, true, true, true]],
    [true, true, [true, true, true, true, true]],
  ])('see evidence that is sent: %s, published: %s', (isSubmitted, isPublished, expected) => {
    const evidence = { memberId: 1, isSubmitted, isPublished };
    expect(everybody.map((actor) => maySeeEvidence(actor, evidence))).toEqual(expected);
  });

  it('see what a member called a file', () => {
    expect(everybody.map((actor) => maySeeFileName(actor, { memberId: 1 }))).toEqual([false, false, true, true, true]);
  });

  it('amend: its member, once there is a verdict', () => {
    const states = REPORT_STATES.filter((state) => mayAmend(author, { memberId: 1, state }));
    expect(states).toEqual(['changes-requested', 'verified', 'declined']);
    for (const actor of [null, stranger, moderator, admin]) {
      expect(REPORT_STATES.some((state) => mayAmend(actor, { memberId: 1, state }))).toBe(false);
    }
  });

  it('withdraw: its member, what waits or counts', () => {
    const states = REPORT_STATES.filter((state) => mayWithdraw(author, { memberId: 1, state }));
    expect(states).toEqual(['submitted', 'second-review', 'changes-requested', 'verified']);
    for (const actor of [null, stranger, moderator, admin]) {
      expect(REPORT_STATES.some((state) => mayWithdraw(actor, { memberId: 1, state }))).toBe(false);
    }
  });
});
