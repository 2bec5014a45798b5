export type Role = 'member' | 'moderator' | 'admin';

/** Whoever makes a request, as the database knows them at this moment: role and state are never taken from a token. */
export interface Actor {
  memberId: number;
  publicId: string;
  name: string;
  role: Role;
  sessionId: number;
  secondFactorAt: Date | null;
}
