import { beforeEach, describe, expect, it } from 'vitest';
import { hashPassword } from '@/lib/auth/commands/hash-password';
import { signIn } from '@/lib/auth/commands/sign-in';
import { actorOfSession } from '@/lib/auth/queries';
import { database } from '@/lib/platform/database/connection';
import { refillBuckets } from '@/lib/platform/rate-limit';
import { aMember } from '../../factories/members';
import { resetDatabase } from '../../setup/database';

const PASSWORD = 'a lamp, a rope, Ünd ein Boot';

beforeEach(async () => {
  await resetDatabase();
  refillBuckets();
});

async function aMemberWithPassword() {
  const member = await aMember();
  await database().models.Member.update({ passwordHash: await hashPassword(PASSWORD) }, { where: { id: member.id } });
  return member;
}

const attempt = (email: string, password: string, address = '192.0.2.1', formerSecret: string | null = null) =>
  signIn({ email, password, address, formerSecret });

describe('signing in', () => {
  it('stores Argon2id with 19 MiB and two passes (ASVS 11.4.2)', async () => {
    const member = await aMemberWithPassword();
    const row = await database().models.Member.findByPk(member.id);
    expect(row?.passwordHash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  });

  it('checks a password exactly as typed, whole, composed and decomposed forms alike (ASVS 6.2.5, 6.2.8)', async () => {
    const member = await aMemberWithPassword();
    expect(await attempt(member.email, PASSWORD.normalize('NFD'))).not.toBeNull();
    for (const wrong of [PASSWORD.toLowerCase(), `${PASSWORD} `, PASSWORD.slice(0, -1), '']) {
      expect(await attempt(member.email, wrong), wrong).toBeNull();
    }
  });

  it('tells an altered character far into a long password (ASVS 6.2.9)', async () => {
    const member = await aMember();
    const long = Array.from({ length: 100 }, (_, i) => String.fromCharCode(97 + (i % 26))).join('');
    await database().models.Member.update({ passwordHash: await hashPassword(long) }, { where: { id: member.id } });
    expect(await attempt(member.email, `${long.slice(0, 72)}X${long.slice(73)}`)).toBeNull();
    expect(await attempt(member.email, long)).not.toBeNull();
  });

  it('gives a new session and ends the one that the browser had before (ASVS 7.2.4)', async () => {
    const member = await aMemberWithPassword();
    const first = await attempt(member.email, PASSWORD);
    const second = await attempt(member.email, PASSWORD, '192.0.2.1', first);
    expect(second).not.toBe(first);
    expect(await actorOfSession(first ?? '')).toBeNull();
    expect((await actorOfSession(second ?? ''))?.memberId).toBe(member.id);
  });

  it('opens nothing for an account that is not confirmed or suspended', async () => {
    const member = await aMemberWithPassword();
    await database().models.Member.update({ state: 'suspended' }, { where: { id: member.id } });
    expect(await attempt(member.email, PASSWORD)).toBeNull();
  });

  it('refuses one address that guesses over many accounts (ASVS 6.3.1)', async () => {
    const guesses = Array.from({ length: 30 }, (_, i) => () => attempt(`nobody${i}@example.org`, 'guess', '192.0.2.9'));
    let refused = 0;
    for (const guess of guesses)
      refused += await guess().then(
        () => 0,
        (error: { code: string }) => (error.code === 'too-many' ? 1 : 0),
      );
    expect(refused).toBeGreaterThanOrEqual(8);
  });

  it('slows guesses at one account but lets its owner in from elsewhere (ASVS 6.3.1)', async () => {
    const member = await aMemberWithPassword();
    await Promise.all(Array.from({ length: 14 }, (_, i) => attempt(member.email, 'wrong', `192.0.2.${20 + i}`)));
    expect(await attempt(member.email, PASSWORD, '198.51.100.7')).not.toBeNull();
  });
});
