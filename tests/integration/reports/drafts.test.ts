import { beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/lib/platform/database/connection';
import { refillBuckets } from '@/lib/platform/rate-limit';
import { sendReport } from '@/lib/reports/commands/send-report';
import {
  beginDraftRoute,
  deleteDraftRoute,
  getDraftRoute,
  listDraftsRoute,
  saveDraftRoute,
} from '@/lib/reports/handlers/drafts';
import '@/lib/figures/register';
import { aCategory, aDevice } from '../../factories/catalogue';
import { verifyDirectly } from '../../factories/figures';
import { aMember, aModerator, type MadeMember } from '../../factories/members';
import { aMethod, anInstrument, aSubmission } from '../../factories/reports';
import { callRoute } from '../../factories/requests';
import { resetDatabase } from '../../setup/database';

let member: MadeMember;

beforeEach(async () => {
  await resetDatabase();
  refillBuckets();
  member = await aMember();
});

interface Draft {
  publicId: string;
  version: number;
  content: object;
  amendsPublicId: string | null;
  facts: { version: number; content: object };
  detail: string;
}

const json = async (response: Response) => (await response.json()) as Draft;

const begin = (body: object, headers: Record<string, string> = {}) =>
  callRoute(beginDraftRoute, { as: member, body, headers });

const save = (id: string, content: object, version?: number, as = member) =>
  callRoute(saveDraftRoute, {
    as,
    params: { id },
    body: { content },
    headers: version === undefined ? {} : { 'if-match': `"${version}"` },
  });

const fillDrafts = (count: number) =>
  database().models.ReportDraft.bulkCreate(
    Array.from({ length: count }, (_, i) => ({
      publicId: `draft${String(i).padStart(5, '0')}`,
      memberId: member.id,
      content: {},
      createdAt: new Date(),
      updatedAt: new Date(),
    })),
  );

describe('a draft', () => {
  it('keeps whatever was typed, as it was typed', async () => {
    const content = { mean: '0,6 kW', phases: [{ note: '' }], deviceName: 'Frøsta  ', nothing: null };
    const { publicId, version } = await json(await begin({ content }));
    expect(version).toBe(1);
    const kept = await json(await callRoute(getDraftRoute, { as: member, params: { id: publicId } }));
    expect(kept).toMatchObject({ content, version: 1, amendsPublicId: null });
  });

  it('begun twice with one key is one draft', async () => {
    const headers = { 'idempotency-key': 'one editor, opened once' };
    const first = await json(await begin({ content: { a: 1 } }, headers));
    const second = await json(await begin({ content: { a: 1 } }, headers));
    expect(second.publicId).toBe(first.publicId);
    expect((await begin({ content: { a: 2 } }, headers)).status).toBe(422);
    expect(await database().models.ReportDraft.count()).toBe(1);
  });

  it('is saved over the version that was read', async () => {
    const { publicId } = await json(await begin({ content: {} }));
    expect(await json(await save(publicId, { a: 1 }, 1))).toMatchObject({ version: 2 });
    expect(await json(await save(publicId, { a: 2 }, 2))).toMatchObject({ version: 3 });
  });

  it('is not saved without a version, nor over one that was not read, and then shows what is there', async () => {
    const { publicId } = await json(await begin({ content: { from: 'the phone' } }));
    await save(publicId, { from: 'the desk' }, 1);
    expect((await save(publicId, { from: 'the phone, later' })).status).toBe(428);
    const late = await save(publicId, { from: 'the phone, later' }, 1);
    expect(late.status).toBe(412);
    expect((await json(late)).facts).toEqual({ version: 2, content: { from: 'the desk' } });
  });

  it('of ten savings of one version at once takes exactly one', async () => {
    const { publicId } = await json(await begin({ content: {} }));
    const answers = await Promise.all(Array.from({ length: 10 }, (_, i) => save(publicId, { editor: i }, 1)));
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, ...Array.from({ length: 9 }, () => 412)]);
  });

  it('is its member’s alone', async () => {
    const { publicId: id } = await json(await begin({ content: { secret: 1 } }));
    for (const as of [await aMember(), await aModerator()]) {
      expect((await callRoute(getDraftRoute, { as, params: { id } })).status).toBe(404);
      expect((await save(id, {}, 1, as)).status).toBe(404);
      expect((await callRoute(deleteDraftRoute, { as, params: { id } })).status).toBe(404);
      expect(await (await callRoute(listDraftsRoute, { as })).json()).toEqual({ drafts: [] });
    }
    for (const route of [getDraftRoute, deleteDraftRoute]) {
      expect((await callRoute(route, { params: { id } })).status).toBe(401);
    }
    expect(await database().models.ReportDraft.count()).toBe(1);
  });

  it('can be deleted, and is then gone', async () => {
    const { publicId: id } = await json(await begin({ content: {} }));
    expect((await callRoute(deleteDraftRoute, { as: member, params: { id } })).status).toBe(204);
    expect((await callRoute(deleteDraftRoute, { as: member, params: { id } })).status).toBe(404);
  });

  it('beyond fifty is refused, with what to do', async () => {
    await fillDrafts(50);
    const response = await begin({ content: {} });
    expect([response.status, (await json(response)).detail]).toEqual([
      429,
      expect.stringMatching(/Send or delete one/),
    ]);
  });

  it.each([
    ['of 400,000 characters and more', { content: { notes: 'x'.repeat(400_001) } }, 422],
    ['of a megabyte', { content: { notes: 'x'.repeat(1_000_001) } }, 413],
    ['that is no object', { content: 'text' }, 422],
    ['that is missing', {}, 422],
    ['with a NUL in it', { content: { notes: 'a\u0000b' } }, 400],
    ['with a NUL in a name', { content: { 'a\u0000b': 1 } }, 400],
  ])('%s is refused', async (_what, body, status) => {
    expect((await begin(body)).status).toBe(status);
    expect(await database().models.ReportDraft.count()).toBe(0);
  });

  it('that names a prototype is a draft like others', async () => {
    const body = JSON.parse('{"content":{"__proto__":{"role":"admin"},"constructor":1}}') as object;
    expect([200, 201, 422]).toContain((await begin(body)).status);
    expect(({} as Record<string, unknown>).role).toBeUndefined();
    expect((await begin({ content: {} })).status).toBe(201);
  });
});

describe('the draft of an amendment', () => {
  async function aSentReport(): Promise<string> {
    const device = await aDevice(await aCategory());
    const own = { device, instrumentPublicId: await anInstrument(member), methodCode: await aMethod() };
    const options = { amendsPublicId: null, draftPublicId: null, clientKey: 'the first one' };
    return sendReport({ memberId: member.id, ...options, submission: aSubmission(own) });
  }

  async function verify(publicId: string): Promise<void> {
    const row = await database().models.Report.findOne({ where: { publicId }, rejectOnEmpty: true });
    const revisionId = row.pendingRevisionId as number;
    await verifyDirectly({ id: row.id, publicId, member, revisionId, deviceId: row.deviceId, figureIds: [] });
  }

  it('is one a report: beginning it again finds it, also from two tabs at once', async () => {
    const report = await aSentReport();
    await verify(report);
    const begun = await Promise.all(
      Array.from({ length: 5 }, () => begin({ content: { a: 1 }, amendsPublicId: report })),
    );
    const drafts = await Promise.all(begun.map(json));
    expect(new Set(drafts.map((draft) => draft.publicId)).size).toBe(1);
    const id = drafts[0]?.publicId as string;
    const kept = await json(await callRoute(getDraftRoute, { as: member, params: { id } }));
    expect(kept.amendsPublicId).toBe(report);
  });

  it('is found again also at the most drafts that one may have', async () => {
    const report = await aSentReport();
    await verify(report);
    const { publicId } = await json(await begin({ content: {}, amendsPublicId: report }));
    await fillDrafts(49);
    expect((await begin({ content: {} })).status).toBe(429);
    expect(await json(await begin({ content: {}, amendsPublicId: report }))).toMatchObject({ publicId });
  });

  it('is refused while the report waits, and of another member’s report', async () => {
    const report = await aSentReport();
    expect((await begin({ content: {}, amendsPublicId: report })).status).toBe(409);
    await verify(report);
    const as = await aMember();
    const foreign = await callRoute(beginDraftRoute, { as, body: { content: {}, amendsPublicId: report } });
    expect(foreign.status).toBe(404);
  });
});
