import { database } from '@/lib/platform/database/connection';
import { now } from '@/lib/platform/clock';
import { publicId } from '@/lib/platform/ids';
import type { Actor, Role } from '@/lib/auth/schema';

export interface MadeMember {
  id: number;
  publicId: string;
  email: string;
  /** As a command gets whoever calls it. */
  actor: Actor;
}

/** An active member with a confirmed address. */
export async function aMember({ name = 'Ina Tolvers', role = 'member' as Role } = {}): Promise<MadeMember> {
  const { Member, PersonalDetail } = database().models;
  const id = publicId();
  const email = `${id}@orrin-skerry.example`;
  const row = await Member.create({
    publicId: id,
    email,
    role,
    state: 'active',
    confirmedAt: now(),
    createdAt: now(),
  });
  await PersonalDetail.create({ memberId: row.id, name, updatedAt: now() });
  const actor: Actor = { memberId: row.id, publicId: id, name, role, sessionId: 0, secondFactorAt: null };
  return { id: row.id, publicId: id, email, actor };
}

export const aModerator = (name = 'Nessa Quill') => aMember({ name, role: 'moderator' });
