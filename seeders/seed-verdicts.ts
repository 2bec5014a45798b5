import type { Actor } from '@/lib/auth/schema';
import { decide } from '@/lib/review/commands/decide';
import type { VerdictInput } from '@/lib/review/schema';
import { withdrawReport } from '@/lib/reports/commands/withdraw-report';
import { CHECKLIST } from './catalogue/methods';
import type { PlannedOutcome, PlannedReport } from './report-plan';
import type { SeededMember } from './seed-people';

type Verdict = Omit<VerdictInput, 'revision' | 'checklist'> & { failed: string | null };

const VERDICTS: Partial<Record<PlannedOutcome, Verdict>> = {
  verified: { verdict: 'verified', reason: '', remarks: [], failed: null },
  withdrawn: { verdict: 'verified', reason: '', remarks: [], failed: null },
  'changes-requested': {
    verdict: 'changes-requested',
    reason:
      'The meter sat behind the adapter, so it read the low-voltage side. The category compares what the plug draws.',
    remarks: [
      { pointer: '/measuringPoint', remark: 'Measure at the plug, before the adapter, or say why that can’t be.' },
    ],
    failed: 'evidence',
  },
  declined: {
    verdict: 'declined',
    reason: 'Filled from the hot tap, the machine heated hardly anything: the energy went through another meter.',
    remarks: [{ pointer: '/conditions/inlet', remark: 'Inlet water of 30 °C is no ordinary use of this programme.' }],
    failed: 'conditions',
  },
};

/** What the moderators made of a planned report: by turns, and never one's own. */
export async function seedVerdict(
  plan: PlannedReport,
  reportPublicId: string,
  members: ReadonlyMap<string, SeededMember>,
): Promise<void> {
  const given = VERDICTS[plan.outcome];
  if (!given) return;
  const moderator = members.get(plan.member.length % 3 === 0 ? 'halvard' : 'nessa');
  const author = members.get(plan.member);
  if (!moderator || !author) throw new Error('The demonstration has two moderators, and each report its member.');
  const { failed, ...verdict } = given;
  await decide(actorOf(moderator, 'moderator'), reportPublicId, {
    ...verdict,
    revision: 1,
    checklist: CHECKLIST.map(({ key }) => ({
      key,
      result: key === failed ? ('failed' as const) : ('passed' as const),
      remark: key === failed ? verdict.reason : '',
    })),
  });
  if (plan.outcome === 'withdrawn') await withdrawReport(actorOf(author, 'member'), reportPublicId);
}

function actorOf(member: SeededMember, role: Actor['role']): Actor {
  return {
    memberId: member.id,
    publicId: member.publicId,
    name: member.name,
    role,
    sessionId: 0,
    secondFactorAt: null,
  };
}
