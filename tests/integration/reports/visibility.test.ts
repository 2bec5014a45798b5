import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/lib/platform/database/connection';
import { refillBuckets } from '@/lib/platform/rate-limit';
import { sendReport } from '@/lib/reports/commands/send-report';
import { acceptPhoto } from '@/lib/reports/commands/photos';
import { withdrawReport } from '@/lib/reports/commands/withdraw-report';
import { getPhotoRoute } from '@/lib/reports/handlers/photos';
import { getReportRoute, withdrawReportRoute } from '@/lib/reports/handlers/reports';
import { downloadTraceRoute, getTraceWindowRoute, readBandsRoute } from '@/lib/reports/handlers/trace-readings';
import { getTraceRoute } from '@/lib/reports/handlers/traces';
import '@/lib/figures/register';
import { aCategory, aDevice } from '../../factories/catalogue';
import { verifyDirectly } from '../../factories/figures';
import { aMember, aModerator, type MadeMember } from '../../factories/members';
import { aJpeg } from '../../factories/pictures';
import {
  aLog,
  aMethod,
  anInstrument,
  aSubmission,
  aTrace,
  LOG_START,
  received,
  tracedPhase,
  type Sender,
} from '../../factories/reports';
import { callRoute } from '../../factories/requests';
import { resetDatabase } from '../../setup/database';

let sender: Sender;
let stranger: MadeMember;
let moderator: MadeMember;

beforeAll(async () => {
  await resetDatabase();
  const member = await aMember();
  const device = await aDevice(await aCategory());
  sender = { member, device, instrumentPublicId: await anInstrument(member), methodCode: await aMethod() };
  [stranger, moderator] = [await aMember({ name: 'Marten Oake' }), await aModerator()];
});

beforeEach(() => refillBuckets());

interface Sent {
  report: string;
  trace: string;
  photo: string;
}

let keys = 0;

async function evidence(): Promise<Omit<Sent, 'report'>> {
  const trace = await aTrace(
    sender.member,
    aLog(3600, (second) => 8 + (second % 5) / 10),
    'grandmother.csv',
  );
  const photo = await acceptPhoto(sender.member.id, await received(await aJpeg(), 'a.jpg'));
  return { trace, photo: photo.publicId };
}

async function send(notes: string, amendsPublicId: string | null = null): Promise<Sent> {
  const { trace, photo } = await evidence();
  const submission = aSubmission(sender, {
    notes,
    traces: [trace],
    photos: [{ publicId: photo, kind: 'display', caption: '' }],
    phases: [tracedPhase('idle', trace, LOG_START, LOG_START + 3600)],
  });
  const clientKey = `visibility-${(keys += 1)}`;
  const report = await sendReport({
    memberId: sender.member.id,
    clientKey,
    amendsPublicId,
    draftPublicId: null,
    submission,
  });
  return { report, trace, photo };
}

async function verify({ report: publicId }: Sent): Promise<void> {
  const row = await database().models.Report.findOne({ where: { publicId }, rejectOnEmpty: true });
  const revisionId = row.pendingRevisionId as number;
  await verifyDirectly({ ...sender, id: row.id, publicId, revisionId, deviceId: row.deviceId, figureIds: [] });
}

/** The statuses that nobody, a stranger, a moderator and its member get. */
async function statuses(call: (as: MadeMember | undefined) => Promise<Response>): Promise<number[]> {
  const answers = [];
  for (const as of [undefined, stranger, moderator, sender.member]) answers.push((await call(as)).status);
  return answers;
}

const reading =
  (id: string, query = '') =>
  (as: MadeMember | undefined) =>
    callRoute(getReportRoute, { as, params: { id }, query });

interface Shown {
  state: string;
  revision: number;
  content: { notes: string };
  traces: { fileName: string }[];
}

const shown = async (response: Promise<Response>) => (await (await response).json()) as Shown;

/** Every address under which evidence can be had. */
const EVIDENCE: [string, ({ trace, photo }: Omit<Sent, 'report'>) => (as?: MadeMember) => Promise<Response>][] = [
  [
    'photo',
    ({ photo }) =>
      (as) =>
        callRoute(getPhotoRoute, { as, params: { id: photo, size: 'small' } }),
  ],
  [
    'trace',
    ({ trace }) =>
      (as) =>
        callRoute(getTraceRoute, { as, params: { id: trace } }),
  ],
  [
    'series',
    ({ trace }) =>
      (as) =>
        callRoute(downloadTraceRoute, { as, params: { id: trace } }),
  ],
  [
    'window',
    ({ trace }) =>
      (as) =>
        callRoute(getTraceWindowRoute, {
          as,
          params: { id: trace },
          query: `?from=${LOG_START}&to=${LOG_START + 600}`,
        }),
  ],
  [
    'figures',
    ({ trace }) =>
      (as) =>
        callRoute(readBandsRoute, {
          as,
          params: { id: trace },
          body: { bands: [{ fromSeconds: LOG_START, toSeconds: LOG_START + 600 }] },
        }),
  ],
];

describe('evidence', () => {
  it.each(EVIDENCE)(
    '%s: of a draft its member’s alone, of a sent report moderators’ too, of a verified one everybody’s',
    async (_what, at) => {
      expect(await statuses(at(await evidence()))).toEqual([404, 404, 404, 200]);
      const sent = await send('first');
      expect(await statuses(at(sent))).toEqual([404, 404, 200, 200]);
      await verify(sent);
      expect(await statuses(at(sent))).toEqual([200, 200, 200, 200]);
      await withdrawReport(sender.member.actor, sent.report);
      expect(await statuses(at(sent))).toEqual([404, 404, 200, 200]);
    },
  );

  it.each(EVIDENCE)('%s: of an amendment stays hidden while the verified revision is read', async (_what, at) => {
    const sent = await send('first');
    await verify(sent);
    const amended = await send('amended', sent.report);
    expect(await statuses(at(amended))).toEqual([404, 404, 200, 200]);
    expect(await statuses(at(sent))).toEqual([200, 200, 200, 200]);
  });

  it('is named by its file for whoever works with the report, and by nothing of the member’s for others', async () => {
    const sent = await send('first');
    await verify(sent);
    const names = [];
    for (const as of [undefined, stranger, moderator, sender.member]) {
      names.push((await shown(reading(sent.report)(as))).traces[0]?.fileName);
      const trace = (await (await callRoute(getTraceRoute, { as, params: { id: sent.trace } })).json()) as object;
      names.push((trace as { fileName: string }).fileName);
    }
    const plain = `trace-${sent.trace}.csv`;
    expect(names).toEqual([plain, plain, plain, plain, ...Array.from({ length: 4 }, () => 'grandmother.csv')]);
  });

  it('travels as a file that no page can be made of', async () => {
    const sent = await send('first');
    for (const [what, at] of EVIDENCE.slice(0, 3)) {
      const { headers } = await at(sent)(sender.member);
      if (what === 'trace') continue;
      expect(headers.get('content-security-policy')).toBe("default-src 'none'; sandbox");
      expect(headers.get('x-content-type-options')).toBe('nosniff');
      expect(headers.get('cross-origin-resource-policy')).toBe('same-origin');
      expect(headers.get('content-disposition')).toMatch(/^(inline|attachment); filename="[\w.-]+"$/);
    }
  });

  it('that nobody may see is in no cache; what is published is asked about again', async () => {
    const sent = await send('first');
    const photo = (headers: Record<string, string> = {}) =>
      callRoute(getPhotoRoute, { as: sender.member, params: { id: sent.photo, size: 'large' }, headers });
    expect((await photo()).headers.get('cache-control')).toBe('private, no-store');
    await verify(sent);
    const answer = await photo();
    expect(answer.headers.get('cache-control')).toBe('public, no-cache');
    const again = await photo({ 'if-none-match': answer.headers.get('etag') ?? '' });
    expect([again.status, await again.text()]).toEqual([304, '']);
  });

  it.each(['huge', '../large', ''])('has no size %j', async (size) => {
    const { photo } = await evidence();
    const { status } = await callRoute(getPhotoRoute, { as: sender.member, params: { id: photo, size } });
    expect(status).toBe(422);
  });
});

describe('a report', () => {
  it('that was sent is read by its member and moderators, as the newest alone', async () => {
    const sent = await send('first');
    expect(await statuses(reading(sent.report))).toEqual([404, 404, 404, 404]);
    expect(await statuses(reading(sent.report, '?revision=newest'))).toEqual([404, 404, 200, 200]);
  });

  it('with an amendment that waits shows strangers the verified revision, whichever they ask for', async () => {
    const sent = await send('first');
    await verify(sent);
    await send('amended', sent.report);
    for (const as of [undefined, stranger]) {
      for (const query of ['', '?revision=newest']) {
        const report = await shown(reading(sent.report, query)(as));
        expect([report.content.notes, report.revision, report.state]).toEqual(['first', 1, 'verified']);
      }
    }
    for (const as of [moderator, sender.member]) {
      const report = await shown(reading(sent.report, '?revision=newest')(as));
      expect([report.content.notes, report.revision, report.state]).toEqual(['amended', 2, 'submitted']);
    }
  });

  it('that was withdrawn is gone with its reason, and stays readable for its member', async () => {
    const sent = await send('first');
    await verify(sent);
    const withdraw = (as: MadeMember, reason: string) =>
      callRoute(withdrawReportRoute, { as, params: { id: sent.report }, body: { reason } });
    expect((await withdraw(stranger, 'not mine')).status).toBe(404);
    expect((await withdraw(moderator, 'not mine')).status).toBe(404);
    expect((await withdraw(sender.member, ' The meter was broken. ')).status).toBe(204);
    expect((await withdraw(sender.member, 'again')).status).toBe(409);
    expect(await statuses(reading(sent.report))).toEqual([410, 410, 410, 410]);
    expect(await statuses(reading(sent.report, '?revision=newest'))).toEqual([410, 410, 200, 200]);
    const problem = (await (await reading(sent.report)(undefined)).json()) as { detail: string; facts: object };
    expect(problem.detail).toMatch(/“The meter was broken\.”/);
    expect(problem.facts).toEqual({ reason: 'The meter was broken.' });
  });

  it('that was withdrawn before it was verified was never there for strangers', async () => {
    const sent = await send('first');
    await withdrawReport(sender.member.actor, sent.report);
    expect(await statuses(reading(sent.report))).toEqual([404, 404, 404, 404]);
  });

  it.each(['nothere000', '%00', "x' or 1=1--", '../../etc'])('named %j is not there', async (id) => {
    const response = await callRoute(getReportRoute, { params: { id }, query: id === '%00' ? '?x=%00' : '' });
    expect(response.status).toBe(id === '%00' ? 400 : 404);
  });

  it('tells no address, number or hash of a password', async () => {
    const sent = await send('first');
    await verify(sent);
    const text = await (await reading(sent.report)(undefined)).text();
    expect(text).toContain('Ina Tolvers');
    expect(text).not.toContain(sender.member.email);
    expect(text).not.toMatch(/memberId|member_id|email|stored/i);
  });

  it('of somebody who left is a former member’s', async () => {
    const sent = await send('first');
    await verify(sent);
    const { Member, PersonalDetail } = database().models;
    await PersonalDetail.destroy({ where: { memberId: sender.member.id } });
    await Member.update(
      { state: 'erased', formerNumber: 7, email: null, erasedAt: new Date() },
      { where: { id: sender.member.id } },
    );
    const text = await (await reading(sent.report)(undefined)).text();
    expect(text).toContain('former member 7');
    expect(text).not.toContain('Ina Tolvers');
  });
});
