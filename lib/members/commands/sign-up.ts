import 'server-only';
import { hashPassword } from '@/lib/auth/commands/hash-password';
import { passwordProblem } from '@/lib/auth/rules';
import { now, secondsFromNow } from '@/lib/platform/clock';
import { recordEvent } from '@/lib/platform/database/record-event';
import { brokenConstraint, inTransaction, type Work } from '@/lib/platform/database/transaction';
import { env } from '@/lib/platform/env';
import { AppError } from '@/lib/platform/errors';
import { publicId, secretToken, sha256 } from '@/lib/platform/ids';
import { queueMail } from '@/lib/platform/mail/queue-mail';
import type { SignUpInput } from '../schema';

/** A link lies in a mailbox until its owner comes by; a day is long enough for that and short for a thief. */
export const CONFIRMATION_SECONDS = 24 * 3600;

/**
 * Makes an account whose address is still to be confirmed, and mails the link. An address that has an account gets a
 * letter that says so instead, and the caller hears the same: nobody learns here who is a member.
 *
 * @throws {AppError} bad-input where the password is too weak, with the reason.
 */
export async function signUp(input: SignUpInput): Promise<void> {
  const problem = passwordProblem(input.password, input);
  if (problem) throw new AppError('bad-input', problem, { fields: [{ pointer: '/password', message: problem }] });
  // Hashed in both cases, so that the time tells nothing either.
  const passwordHash = await hashPassword(input.password);
  try {
    await inTransaction(async (work) => {
      const known = await work.models.Member.findOne({ where: { email: input.email }, transaction: work.transaction });
      if (!known) return addMember(work, input, passwordHash);
      if (known.state === 'unconfirmed') return sendConfirmation(work, known.id, input.email);
      return tellKnown(work, input.email);
    });
  } catch (error) {
    // Two sign-ups of one address at once: the other one made the account and mailed its link.
    if (brokenConstraint(error) !== 'member_email_key') throw error;
  }
}

async function addMember(work: Work, { name, email }: SignUpInput, passwordHash: string): Promise<void> {
  const member = await work.models.Member.create(
    { publicId: publicId(), email, passwordHash, createdAt: now() },
    { transaction: work.transaction },
  );
  await work.models.PersonalDetail.create(
    { memberId: member.id, name, updatedAt: now() },
    { transaction: work.transaction },
  );
  await recordEvent(work, {
    actorId: member.id,
    action: 'member.signed-up',
    subject: { kind: 'member', id: member.id },
  });
  await sendConfirmation(work, member.id, email);
}

async function sendConfirmation(work: Work, memberId: number, email: string): Promise<void> {
  const secret = secretToken();
  // A new link replaces the old ones.
  await work.models.CredentialToken.update(
    { usedAt: now() },
    { where: { memberId, purpose: 'confirm-address', usedAt: null }, transaction: work.transaction },
  );
  await work.models.CredentialToken.create(
    {
      memberId,
      purpose: 'confirm-address',
      tokenHash: sha256(secret),
      expiresAt: secondsFromNow(CONFIRMATION_SECONDS),
      createdAt: now(),
    },
    { transaction: work.transaction },
  );
  await queueMail(work, {
    to: email,
    subject: 'Confirm your address',
    paragraphs: [
      'Somebody, likely you, made a Wattcairn account with this address. Confirm it, and you can add your measurements. The link holds for a day.',
      { label: 'Confirm this address', href: `${env().publicOrigin}/confirm#${secret}` },
      'If it was not you, do nothing: without this link the account stays closed.',
    ],
  });
}

async function tellKnown(work: Work, email: string): Promise<void> {
  await queueMail(work, {
    to: email,
    subject: 'You have an account already',
    paragraphs: [
      'Somebody, likely you, tried to make a Wattcairn account with this address. There is one already: sign in with it.',
      { label: 'Sign in', href: `${env().publicOrigin}/sign-in` },
      'If it was not you, there is nothing to do.',
    ],
  });
}

/**
 * Confirms an address by the secret of its link, once.
 * @throws {AppError} gone where the link was used, replaced, or is too old.
 */
export async function confirmAddress(secret: string): Promise<void> {
  await inTransaction(async (work) => {
    const [used] = await work.models.CredentialToken.update(
      { usedAt: now() },
      {
        where: { tokenHash: sha256(secret), purpose: 'confirm-address', usedAt: null },
        transaction: work.transaction,
        returning: false,
      },
    );
    const token = await work.models.CredentialToken.findOne({
      where: { tokenHash: sha256(secret), purpose: 'confirm-address' },
      transaction: work.transaction,
    });
    if (used !== 1 || !token || token.expiresAt <= now()) {
      throw new AppError(
        'gone',
        'This link was used already or is too old. Sign up again with the same address to get a new one.',
      );
    }
    await work.models.Member.update(
      { state: 'active', confirmedAt: now() },
      { where: { id: token.memberId, state: 'unconfirmed' }, transaction: work.transaction },
    );
    await recordEvent(work, {
      actorId: token.memberId,
      action: 'member.confirmed',
      subject: { kind: 'member', id: token.memberId },
    });
  });
}
