import { z } from 'zod';

/** Normalised first, then checked, and what was checked is what is kept: one mailbox an address. */
export const emailAddress = z
  .string()
  .transform((text) => text.normalize('NFKC').trim().toLowerCase())
  .pipe(
    z
      .string()
      .max(254, 'This address is longer than any mailbox’s.')
      .regex(
        /^[a-z0-9.!#$%&'*+/=?^_`{|}~-]{1,64}@(?:[a-z0-9](?:[a-z0-9-]{0,61}[a-z0-9])?\.)+[a-z]{2,63}$/,
        'Type one e-mail address, like name@example.org.',
      ),
  );

export const memberName = z
  .string()
  .transform((text) =>
    text
      .normalize('NFC')
      .replace(/[\p{Cc}\p{Cf}]/gu, '')
      .replace(/\s+/g, ' ')
      .trim(),
  )
  .pipe(z.string().min(1, 'Type the name that stands beside your reports.').max(80, 'Shorten this to 80 characters.'));

/** What a new member gives. The password's own rules need the name and address, so the command checks them. */
export const signUpInput = z.object({
  name: memberName,
  email: emailAddress,
  password: z.string().min(1, 'Choose a password.').max(1024, 'Use 256 characters or fewer.'),
});

export const profileInput = z.object({
  name: memberName,
  region: z
    .string()
    .trim()
    .max(80, 'Shorten this to 80 characters.')
    .transform((text) => text || null),
});

export const openSession = z.object({
  id: z.int(),
  openedAt: z.string(),
  seenAt: z.string(),
  isThisOne: z.boolean(),
});

export const account = z.object({
  publicId: z.string(),
  email: z.string(),
  name: z.string(),
  region: z.string().nullable(),
  role: z.enum(['member', 'moderator', 'admin']),
  memberSince: z.string(),
  sessions: z.array(openSession),
});

export type Account = z.infer<typeof account>;
export type SignUpInput = z.infer<typeof signUpInput>;
