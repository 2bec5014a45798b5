import 'server-only';
import { Op } from 'sequelize';
import type { Actor } from '@/lib/auth/schema';
import { now } from '@/lib/platform/clock';
import { database } from '@/lib/platform/database/connection';
import type { Account } from './schema';

/** A member's own account, with the sessions that are open. */
export async function accountOf(actor: Actor): Promise<Account> {
  const { Member, PersonalDetail, Session } = database().models;
  const member = await Member.findByPk(actor.memberId, { rejectOnEmpty: true });
  const detail = await PersonalDetail.findByPk(actor.memberId, { rejectOnEmpty: true });
  const sessions = await Session.findAll({
    where: {
      memberId: actor.memberId,
      endedAt: null,
      idleEndsAt: { [Op.gt]: now() },
      absoluteEndsAt: { [Op.gt]: now() },
    },
    order: [['seenAt', 'DESC']],
  });
  return {
    publicId: member.publicId,
    email: member.email ?? '',
    name: detail.name,
    region: detail.region,
    role: member.role,
    memberSince: member.createdAt.toISOString(),
    sessions: sessions.map((session) => ({
      id: session.id,
      openedAt: session.createdAt.toISOString(),
      seenAt: session.seenAt.toISOString(),
      isThisOne: session.id === actor.sessionId,
    })),
  };
}
