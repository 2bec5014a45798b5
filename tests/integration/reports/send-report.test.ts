import { beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/lib/platform/database/connection';
import { sha256 } from '@/lib/platform/ids';
import { sendReport, type SendOptions } from '@/lib/reports/commands/send-report';
import { beginDraft } from '@/lib/reports/commands/drafts';
import { sendReportRoute } from '@/lib/reports/handlers/reports';
import { canonicalJson } from '@/lib/reports/rules/canonical-json';
import type { ReportContent } from '@/lib/reports/schema';
import '@/lib/figures/register';
import { aCategory, aDevice } from '../../factories/catalogue';
import { verifyDirectly } from '../../factories/figures';
import { aMember } from '../../factories/members';
import {
  aLog,
  aMethod,
  anInstrument,
  aSubmission,
  aTrace,
  freezerWatts,
  LOG_START,
  tracedPhase,
  type Sender,
} from '../../factories/reports';
import { callRoute } from '../../factories/requests';
import { resetDatabase } from '../../setup/database';
import { droppedTags } from '../../setup/next-cache';

let sender: Sender;
let keys = 0;

beforeEach(async () => {
  await resetDatabase();
  droppedTags.length = 0;
  const member = await aMember();
  const device = await aDevice(await aCategory());
  sender = { member, device, instrumentPublicId: await anInstrument(member), methodCode: await aMethod() };
});

function send(traits: Partial<ReportContent> = {}, options: Partial<SendOptions> = {}): Promise<string> {
  return sendReport({
    memberId: sender.member.id,
    clientKey: `test-key-${(keys += 1)}`,
    amendsPublicId: null,
    draftPublicId: null,
    submission: aSubmission(sender, traits),
    ...options,
  });
}

const reportOf = (publicId: string) => database().models.Report.findOne({ where: { publicId }, rejectOnEmpty: true });

async function verify(publicId: string): Promise<void> {
  const { id, pendingRevisionId } = await reportOf(publicId);
  const revisionId = pendingRevisionId as number;
  await verifyDirectly({ ...sender, id, publicId, revisionId, deviceId: sender.device.id, figureIds: [] });
}

describe('sending a report', () => {
  it('makes the report, its revision, phases, figures, event and mail', async () => {
    const publicId = await send({ unitLabel: 'the one in the hall' });
    const { models } = database();
    const report = await reportOf(publicId);
    expect(report.state).toBe('submitted');
    const unit = await models.Unit.findByPk(report.unitId as number);
    expect(unit?.label).toBe('the one in the hall');
    const revision = await models.ReportRevision.findByPk(report.pendingRevisionId as number, { rejectOnEmpty: true });
    expect(revision).toMatchObject({ n: 1, schemaVersion: 1, licence: 'CC-BY-4.0', previousHash: null });
    const of = { where: { reportRevisionId: revision.id } };
    expect(await models.Phase.findAll(of)).toMatchObject([{ meanWatts: 8.1, durationSeconds: 3600, source: 'typed' }]);
    expect(await models.ReportFigure.findAll(of)).toMatchObject([{ quantity: 'mean-power', value: 8.1 }]);
    expect(await models.Event.count({ where: { action: 'report.submitted', subjectId: report.id } })).toBe(1);
    const [mail] = await models.Outbox.findAll();
    expect(mail).toMatchObject({ toAddress: sender.member.email });
  });

  it('yields a day’s energy and the parts of its cycles from a freezer’s trace', async () => {
    sender.device = await aDevice(
      await aCategory({ duty: 'cyclic', basisQuantity: 'day-energy', modes: ['cycling', 'running', 'between-cycles'] }),
    );
    const trace = await aTrace(sender.member, aLog(86_400, freezerWatts));
    const phases = [tracedPhase('cycling', trace, LOG_START, LOG_START + 86_400)];
    const report = await reportOf(await send({ phases, traces: [trace] }));
    const figures = await database().models.ReportFigure.findAll({
      where: { reportRevisionId: report.pendingRevisionId as number },
    });
    const day = figures.find((figure) => figure.quantity === 'day-energy');
    // Twenty minutes of some 78.3 W and forty of 1.6 W in every hour; a sample's edges cost or gain a few joules.
    expect(day?.value).toBeCloseTo(24 * ((78.345 + 2 * 1.6) / 3), -1);
    expect(figures.map((figure) => figure.quantity).sort()).toEqual(['day-energy', 'mean-power', 'mean-power']);
  });

  it('takes the same key again as the same report', async () => {
    const options = { clientKey: 'the same key' };
    const first = await send({}, options);
    expect(await send({ notes: 'changed' }, options)).toBe(first);
    // A repeat is answered, not judged: by now the photo that it shows may be gone.
    const gone = [{ publicId: 'abcdefghij', kind: 'display' as const, caption: '' }];
    expect(await send({ photos: gone }, options)).toBe(first);
    expect(await database().models.ReportRevision.count()).toBe(1);
  });

  it('makes one report of twenty sendings of one key at once', async () => {
    const options = { clientKey: 'pressed many times' };
    const sent = await Promise.all(Array.from({ length: 20 }, () => send({}, options)));
    expect(new Set(sent).size).toBe(1);
    const { Report, ReportRevision, Outbox } = database().models;
    expect([await Report.count(), await ReportRevision.count(), await Outbox.count()]).toEqual([1, 1, 1]);
  });

  it('takes one key of two members as two reports', async () => {
    const first = await send({}, { clientKey: 'a common key' });
    const member = await aMember({ name: 'Marten Oake' });
    const instrumentPublicId = await anInstrument(member);
    const submission = aSubmission({ ...sender, instrumentPublicId });
    expect(await send({}, { clientKey: 'a common key', memberId: member.id, submission })).not.toBe(first);
  });

  it('leaves nothing of a refused one, not even the device that it proposed', async () => {
    const submission = {
      ...aSubmission(sender, { photos: [{ publicId: 'abcdefghij', kind: 'display', caption: '' }] }),
      device: {
        from: 'proposal' as const,
        proposal: { maker: 'Newbury', model: 'N 1', categoryPublicId: sender.device.category.publicId },
      },
    };
    await expect(send({}, { submission })).rejects.toMatchObject({ code: 'bad-input' });
    const { Device, Maker, Unit, Report, Slug } = database().models;
    expect(await Device.count()).toBe(1);
    expect(await Maker.count({ where: { name: 'Newbury' } })).toBe(0);
    expect([await Unit.count(), await Report.count(), await Slug.count()]).toEqual([0, 0, 2]);
  });

  it('takes a proposed device along, marked as new', async () => {
    const submission = {
      ...aSubmission(sender),
      device: {
        from: 'proposal' as const,
        proposal: { maker: 'Newbury', model: 'N 1', categoryPublicId: sender.device.category.publicId },
      },
    };
    const report = await reportOf(await send({}, { submission }));
    const device = await database().models.Device.findByPk(report.deviceId);
    expect(device).toMatchObject({ model: 'N 1', state: 'new', proposedById: sender.member.id });
  });

  it('closes the draft it came from, and only its member’s own', async () => {
    const mine = await beginDraft(sender.member.id, {}, null);
    const other = await beginDraft((await aMember()).id, {}, null);
    await send({}, { draftPublicId: mine.publicId });
    await send({}, { draftPublicId: other.publicId });
    const { ReportDraft } = database().models;
    expect((await ReportDraft.findOne({ where: { publicId: mine.publicId } }))?.sentAt).not.toBeNull();
    expect((await ReportDraft.findOne({ where: { publicId: other.publicId } }))?.sentAt).toBeNull();
  });
});

describe('the API of sending', () => {
  it('changes nothing by fields that are not the sender’s to set', async () => {
    const submission = { ...aSubmission(sender), state: 'verified', memberId: 1, createdAt: '2020-01-01T00:00:00Z' };
    const keysOfOthers = { state: 'verified', publishedRevisionId: 1 };
    const body = { clientKey: 'setting-much', draftPublicId: null, amendsPublicId: null, submission, ...keysOfOthers };
    const response = await callRoute(sendReportRoute, { as: sender.member, body });
    expect(response.status).toBe(201);
    const { publicId } = (await response.json()) as { publicId: string };
    const report = await reportOf(publicId);
    expect(report).toMatchObject({ state: 'submitted', publishedRevisionId: null, memberId: sender.member.id });
    expect(report.createdAt.getFullYear()).toBeGreaterThan(2020);
    expect(droppedTags).toEqual([`report:${publicId}`]);
  });

  it('is for members', async () => {
    const body = {
      clientKey: 'from nobody',
      draftPublicId: null,
      amendsPublicId: null,
      submission: aSubmission(sender),
    };
    expect((await callRoute(sendReportRoute, { body })).status).toBe(401);
    const headers = { origin: 'http://elsewhere.example' };
    expect((await callRoute(sendReportRoute, { as: sender.member, body, headers })).status).toBe(403);
    expect(await database().models.Report.count()).toBe(0);
  });
});

describe('an amendment', () => {
  it('waits as the next revision while the verified one stays published', async () => {
    const publicId = await send();
    await verify(publicId);
    const { publishedRevisionId } = await reportOf(publicId);
    await send({ notes: 'The clamp was loose.' }, { amendsPublicId: publicId });
    const report = await reportOf(publicId);
    expect(report.publishedRevisionId).toBe(publishedRevisionId);
    expect(report.pendingRevisionId).not.toBe(publishedRevisionId);
    expect(report.state).toBe('submitted');
  });

  it('is one revision, however often it is sent', async () => {
    const publicId = await send();
    await verify(publicId);
    const options = { amendsPublicId: publicId, clientKey: 'an amendment' };
    const answers = await Promise.all(Array.from({ length: 8 }, () => send({ notes: 'again' }, options)));
    expect(new Set(answers)).toEqual(new Set([publicId]));
    expect(await database().models.ReportRevision.count()).toBe(2);
  });

  it('is refused while the report waits, for another device, and of another member’s report', async () => {
    const publicId = await send();
    const waiting = send({}, { amendsPublicId: publicId });
    await expect(waiting).rejects.toMatchObject({ code: 'conflict', details: { facts: { state: 'submitted' } } });
    await verify(publicId);
    const device = await aDevice(sender.device.category);
    const elsewhere = send({}, { amendsPublicId: publicId, submission: aSubmission({ ...sender, device }) });
    await expect(elsewhere).rejects.toMatchObject({ details: { fields: [{ pointer: '/device' }] } });
    const stranger = await aMember();
    const foreign = send({}, { amendsPublicId: publicId, memberId: stranger.id });
    await expect(foreign).rejects.toMatchObject({ code: 'not-found' });
  });

  it('is chained to the revision before it by hash, which anybody can recompute', async () => {
    const publicId = await send();
    await verify(publicId);
    await send({ notes: 'The clamp was loose.' }, { amendsPublicId: publicId });
    const rows = await database().models.ReportRevision.findAll({ order: [['n', 'ASC']] });
    const hashes = rows.map(({ n, content, previousHash, instrumentRevisionId, methodRevisionId }) =>
      sha256(
        canonicalJson({
          report: publicId,
          n,
          content,
          previousHash,
          instrument: instrumentRevisionId,
          method: methodRevisionId,
        }),
      ),
    );
    expect(rows.map((row) => row.hash)).toEqual(hashes);
    expect(rows.map((row) => row.previousHash)).toEqual([null, hashes[0]]);
  });
});
