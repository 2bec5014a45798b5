import { z } from 'zod';

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

/** What a sign-in sends. Longer texts are nobody's, and hashing them would be work for a stranger. */
export const credentials = z.object({
  email: z.string().trim().toLowerCase().min(3, 'Type your e-mail address.').max(254),
  password: z.string().min(1, 'Type your password.').max(1024),
});

/** Who is signed in, as the browser hears it. */
export const sessionAnswer = z.object({
  member: z
    .object({ publicId: z.string(), name: z.string(), role: z.enum(['member', 'moderator', 'admin']) })
    .nullable(),
});
