import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { confirmAddressRoute, signUpRoute } from '@/lib/members/handlers';
import { CONFIRMATION_SECONDS } from '@/lib/members/commands/sign-up';
import { moveClock } from '@/lib/platform/clock';
import { database } from '@/lib/platform/database/connection';
import { refillBuckets } from '@/lib/platform/rate-limit';
import { ownRequest } from '../../factories/sessions';
import { resetDatabase } from '../../setup/database';

const noParams = { params: Promise.resolve({}) };
const petra = { name: 'Petra Lind', email: 'petra@example.org', password: 'kelp rope lamp stone' };

beforeEach(async () => {
  await resetDatabase();
  refillBuckets();
});
afterEach(() => moveClock(0));

const signUp = (input: object) =>
  signUpRoute.handler(ownRequest('/api/v1/members', null, { method: 'POST', body: JSON.stringify(input) }), noParams);
const confirm = (secret: string) =>
  confirmAddressRoute.handler(
    ownRequest('/api/v1/confirmations', null, { method: 'POST', body: JSON.stringify({ secret }) }),
    noParams,
  );

async function secretOf(letter: number): Promise<string> {
  const rows = await database().models.Outbox.findAll({ order: [['id', 'ASC']] });
  return /#(\S+)/.exec(rows[letter]?.bodyText ?? '')?.[1] ?? '';
}

describe('signing up', () => {
  it('makes an account that stays closed until its address is confirmed, once', async () => {
    expect((await signUp(petra)).status).toBe(202);
    const { Member, CredentialToken } = database().models;
    expect((await Member.findOne())?.state).toBe('unconfirmed');
    const secret = await secretOf(0);
    expect((await CredentialToken.findOne())?.tokenHash).not.toContain(secret);
    expect((await confirm(secret)).status).toBe(200);
    expect((await Member.findOne())?.state).toBe('active');
    expect((await confirm(secret)).status).toBe(410);
  });

  it('lets a link die after a day, and when a newer one was asked for (ASVS 6.5.1, 6.5.5)', async () => {
    await signUp(petra);
    await signUp(petra);
    expect((await confirm(await secretOf(0))).status).toBe(410);
    moveClock(CONFIRMATION_SECONDS + 1);
    expect((await confirm(await secretOf(1))).status).toBe(410);
    expect((await database().models.Member.findOne())?.state).toBe('unconfirmed');
  });

  it('answers the same for an address that has an account, and mails its owner instead (ASVS 6.3.8)', async () => {
    const first = await signUp(petra);
    await confirm(await secretOf(0));
    const again = await signUp({ ...petra, name: 'Somebody Else' });
    expect(again.status).toBe(first.status);
    expect(await again.json()).toEqual(await first.json());
    const letters = await database().models.Outbox.findAll({ order: [['id', 'ASC']] });
    expect(letters.map((letter) => letter.subject)).toEqual(['Confirm your address', 'You have an account already']);
    expect(await database().models.Member.count()).toBe(1);
  });

  it('makes one account of two sign-ups at once', async () => {
    const answers = await Promise.all([signUp(petra), signUp(petra), signUp(petra)]);
    expect(answers.map((answer) => answer.status)).toEqual([202, 202, 202]);
    expect(await database().models.Member.count()).toBe(1);
  });

  it('takes no role, state or date from what is sent (ASVS 15.3.3)', async () => {
    await signUp({
      ...petra,
      role: 'admin',
      state: 'active',
      confirmedAt: '2026-01-01T00:00:00Z',
      id: 7,
      createdAt: 'x',
    });
    const member = await database().models.Member.findOne();
    expect(member).toMatchObject({ role: 'member', state: 'unconfirmed', confirmedAt: null });
  });

  it('says what is wrong with each field, and makes nothing', async () => {
    const answer = await signUp({ name: ' ', email: 'a@x@y', password: 'short' });
    expect(answer.status).toBe(422);
    const { errors } = (await answer.json()) as { errors: { pointer: string }[] };
    expect(errors.map((error) => error.pointer).sort()).toEqual(['/email', '/name']);
    expect((await signUp({ ...petra, password: 'petra petra petra' })).status).toBe(422);
    expect(await database().models.Member.count()).toBe(0);
    expect(await database().models.Outbox.count()).toBe(0);
  });
});
