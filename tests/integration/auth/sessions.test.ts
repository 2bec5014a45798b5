import { encode } from 'next-auth/jwt';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { openSession } from '@/lib/auth/commands/sessions';
import { endSessionRoute, getSessionRoute } from '@/lib/auth/handlers/session';
import { readActor } from '@/lib/auth/queries';
import { SESSION_ABSOLUTE_SECONDS, SESSION_IDLE_SECONDS, sessionCookieName } from '@/lib/auth/rules';
import { getAccountRoute } from '@/lib/members/handlers';
import { moveClock } from '@/lib/platform/clock';
import { database } from '@/lib/platform/database/connection';
import { env } from '@/lib/platform/env';
import { aMember } from '../../factories/members';
import { aSessionCookie, ownRequest } from '../../factories/sessions';
import { resetDatabase } from '../../setup/database';

beforeEach(resetDatabase);
afterEach(() => moveClock(0));

const noParams = { params: Promise.resolve({}) };
const accountStatus = async (cookie: string | null) =>
  (await getAccountRoute.handler(ownRequest('/api/v1/account', cookie), noParams)).status;

describe('a session', () => {
  it('is looked up at every request: after sign-out its cookie is worth nothing (ASVS 7.4.1)', async () => {
    const member = await aMember();
    const cookie = await aSessionCookie(member.id);
    expect(await accountStatus(cookie)).toBe(200);
    const answer = await endSessionRoute.handler(ownRequest('/api/v1/session', cookie, { method: 'DELETE' }), noParams);
    expect(answer.headers.get('clear-site-data')).toBe('"cache"');
    expect(answer.headers.get('set-cookie')).toMatch(/Max-Age=0; HttpOnly; SameSite=Lax/);
    expect(await accountStatus(cookie)).toBe(401);
  });

  it('ends when nobody used it, and at the latest after its whole time (ASVS 7.3.1, 7.3.2)', async () => {
    const member = await aMember();
    const idle = await aSessionCookie(member.id);
    moveClock(SESSION_IDLE_SECONDS + 1);
    expect(await accountStatus(idle)).toBe(401);
    moveClock(0);
    const used = await aSessionCookie(member.id);
    for (let at = 0; at < SESSION_ABSOLUTE_SECONDS; at += SESSION_IDLE_SECONDS / 2) {
      moveClock(at);
      expect(await accountStatus(used)).toBe(200);
    }
    moveClock(SESSION_ABSOLUTE_SECONDS + 1);
    expect(await accountStatus(used)).toBe(401);
  });

  it('knows role and state as the database has them now (ASVS 8.3.2, 7.4.2)', async () => {
    const { Member } = database().models;
    const member = await aMember({ role: 'moderator' });
    const cookie = await aSessionCookie(member.id);
    expect((await readActor(ownRequest('/', cookie)))?.role).toBe('moderator');
    await Member.update({ role: 'member' }, { where: { id: member.id } });
    expect((await readActor(ownRequest('/', cookie)))?.role).toBe('member');
    await Member.update({ state: 'suspended' }, { where: { id: member.id } });
    expect(await readActor(ownRequest('/', cookie))).toBeNull();
  });

  it('keeps only a hash of its secret (ASVS 7.2.3)', async () => {
    const member = await aMember();
    const secrets = await Promise.all(Array.from({ length: 20 }, () => openSession(member.id)));
    expect(new Set(secrets).size).toBe(20);
    expect(secrets.every((secret) => Buffer.from(secret, 'base64url').length === 32)).toBe(true);
    const rows = await database().models.Session.findAll();
    expect(rows.some((row) => secrets.includes(row.tokenHash))).toBe(false);
  });

  it('is nobody’s when its cookie is altered, of another secret, malformed or endless (ASVS 7.2.1)', async () => {
    const member = await aMember();
    const cookie = await aSessionCookie(member.id);
    const name = sessionCookieName(false);
    const other = await encode({
      token: { sid: await openSession(member.id) },
      secret: 'another secret of some length, surely',
    });
    const unknown = await encode({ token: { sid: 'never opened' }, secret: env().secret });
    const bad = [
      `${cookie.slice(0, -6)}AAAAAA`,
      `${name}=${other}`,
      `${name}=${unknown}`,
      `${name}=%E0%A4%A`,
      `${name}=`,
      `${name}=${'x'.repeat(100_000)}`,
      `${name}=eyJhbGciOiJub25lIn0.eyJzaWQiOiJ4In0.`,
    ];
    for (const text of bad) expect(await accountStatus(text), text.slice(0, 60)).toBe(401);
    expect((await getSessionRoute.handler(ownRequest('/api/v1/session', bad[0] ?? ''), noParams)).status).toBe(200);
  });
});
