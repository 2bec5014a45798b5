import { beforeEach, describe, expect, it } from 'vitest';
import '@/lib/figures/register';
import { database } from '@/lib/platform/database/connection';
import { decide } from '@/lib/review/commands/decide';
import type { VerdictInput } from '@/lib/review/schema';
import { aCategory, aDevice } from '../../factories/catalogue';
import { aRevision, aSubmittedReport, CHECKLIST, type MadeReport } from '../../factories/figures';
import { aMember, aModerator } from '../../factories/members';
import { resetDatabase } from '../../setup/database';

beforeEach(resetDatabase);

const passed = CHECKLIST.map(({ key }) => ({ key, result: 'passed' as const, remark: '' }));
const failed = passed.map((item, i) => (i === 2 ? { ...item, result: 'failed' as const } : item));

const verify: VerdictInput = { revision: 1, verdict: 'verified', checklist: passed, reason: '', remarks: [] };
const decline: VerdictInput = {
  revision: 1,
  verdict: 'declined',
  checklist: failed,
  reason: 'The display shows another figure.',
  remarks: [],
};

async function aWaitingReport(traits = {}): Promise<MadeReport> {
  return aSubmittedReport(await aDevice(await aCategory()), [{ value: 42, mode: 'idle' }], traits);
}

const stateOf = async (report: MadeReport) => (await database().models.Report.findByPk(report.id))?.state;

describe('a verdict', () => {
  it('verifies: the report counts at once, the member is told, and it stands on the record', async () => {
    const report = await aWaitingReport();
    const moderator = await aModerator();
    await decide(moderator.actor, report.publicId, verify);
    expect(await stateOf(report)).toBe('verified');
    const [figure] = await database().models.PublishedFigure.findAll({ where: { n: 1 } });
    expect(figure?.median).toBe(42);
    const letter = await database().models.Outbox.findOne();
    expect(letter?.toAddress).toBe(report.member.email);
    const event = await database().models.Event.findOne({ where: { action: 'report.verified' } });
    expect(event).toMatchObject({ actorId: moderator.id, subjectKind: 'report', subjectId: report.id });
  });

  it('requests changes with remarks at their fields, and nothing counts', async () => {
    const report = await aWaitingReport();
    const remarks = [{ pointer: '/notes', remark: 'Say which firmware it ran.' }];
    await decide((await aModerator()).actor, report.publicId, {
      ...decline,
      verdict: 'changes-requested',
      remarks,
    });
    expect(await stateOf(report)).toBe('changes-requested');
    expect(await database().models.ReviewRemark.findAll({ raw: true })).toMatchObject(remarks);
    expect(await database().models.PublishedFigure.count()).toBe(0);
  });

  it('follows from the checklist: a failed item can’t be verified, nor a passed list declined', async () => {
    const report = await aWaitingReport();
    const { actor } = await aModerator();
    await expect(decide(actor, report.publicId, { ...verify, checklist: failed })).rejects.toMatchObject({
      code: 'bad-input',
    });
    await expect(decide(actor, report.publicId, { ...decline, checklist: passed })).rejects.toMatchObject({
      code: 'bad-input',
    });
    await expect(decide(actor, report.publicId, { ...verify, checklist: passed.slice(1) })).rejects.toMatchObject({
      code: 'bad-input',
    });
    expect(await stateOf(report)).toBe('submitted');
  });

  it('refuses a remark that points nowhere', async () => {
    const report = await aWaitingReport();
    const remarks = [{ pointer: '/nowhere/3', remark: 'Here.' }];
    await expect(decide((await aModerator()).actor, report.publicId, { ...decline, remarks })).rejects.toMatchObject({
      code: 'bad-input',
    });
  });
});

describe('who may decide', () => {
  it('is never the member who wrote it: the command refuses, and so does the database (ASVS 2.3.5)', async () => {
    const author = await aModerator('Halvard Strand');
    const report = await aWaitingReport({ member: author });
    await expect(decide(author.actor, report.publicId, verify)).rejects.toMatchObject({ code: 'not-allowed' });
    const row = {
      reportId: report.id,
      reportRevisionId: report.revisionId,
      reviewerId: author.id,
      slot: 'first' as const,
      verdict: 'verified' as const,
      checklist: passed,
      createdAt: new Date(),
    };
    const { Review } = database().models;
    await expect(Review.create({ ...row, authorId: author.id })).rejects.toThrow(/check constraint/);
    // Naming somebody else as the author doesn't help: the report's own key knows who wrote it.
    const other = await aMember();
    await expect(Review.create({ ...row, authorId: other.id })).rejects.toThrow(/foreign key constraint/);
  });

  it('is no member, and no moderator who was demoted since the request began', async () => {
    const report = await aWaitingReport();
    await expect(decide((await aMember()).actor, report.publicId, verify)).rejects.toMatchObject({
      code: 'not-allowed',
    });
    const demoted = await aModerator();
    await database().models.Member.update({ role: 'member' }, { where: { id: demoted.id } });
    await expect(decide(demoted.actor, report.publicId, verify)).rejects.toMatchObject({ code: 'not-allowed' });
  });
});

describe('two at once', () => {
  it('gives a double click the first answer, and writes one review', async () => {
    const report = await aWaitingReport();
    const { actor } = await aModerator();
    const [first, second] = await Promise.all([
      decide(actor, report.publicId, verify),
      decide(actor, report.publicId, verify),
    ]);
    expect(second).toEqual(first);
    expect(await database().models.Review.count()).toBe(1);
    expect(await database().models.Outbox.count()).toBe(1);
  });

  it('lets one of twenty moderators win and tells the others who did (ASVS 2.3.4)', async () => {
    const report = await aWaitingReport();
    const moderators = await Promise.all(Array.from({ length: 20 }, (_, i) => aModerator(`Moderator ${i}`)));
    const answers = await Promise.allSettled(moderators.map(({ actor }) => decide(actor, report.publicId, verify)));
    const lost = answers.flatMap((answer) => (answer.status === 'rejected' ? [answer.reason as Error] : []));
    expect(lost).toHaveLength(19);
    const [review] = await database().models.Review.findAll();
    const winner = moderators.find(({ id }) => id === review?.reviewerId)?.actor.name ?? 'nobody';
    for (const error of lost) {
      expect(error).toMatchObject({ code: 'conflict' });
      expect(`${error.message} ${JSON.stringify(error)}`).toContain(winner);
    }
    expect(await database().models.Review.count()).toBe(1);
  });

  it('refuses a verdict on a revision that is no longer the newest', async () => {
    const device = await aDevice(await aCategory());
    const report = await aSubmittedReport(device, [{ value: 42, mode: 'idle' }]);
    await aRevision(report, device, [{ value: 43, mode: 'idle' }]);
    await expect(decide((await aModerator()).actor, report.publicId, verify)).rejects.toMatchObject({
      code: 'conflict',
    });
    expect(await stateOf(report)).toBe('submitted');
  });
});
