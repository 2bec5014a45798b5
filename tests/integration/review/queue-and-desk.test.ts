import { beforeEach, describe, expect, it } from 'vitest';
import '@/lib/figures/register';
import { decideRoute, getDeskRoute, getQueueRoute } from '@/lib/review/handlers';
import { deskOf } from '@/lib/review/queries/desk';
import { reviewQueue } from '@/lib/review/queries/queue';
import { aCategory, aDevice } from '../../factories/catalogue';
import { aSubmittedReport, aVerifiedReport } from '../../factories/figures';
import { aMember, aModerator } from '../../factories/members';
import { callRoute } from '../../factories/requests';
import { resetDatabase } from '../../setup/database';

beforeEach(resetDatabase);

describe('the queue', () => {
  it('is empty where nothing waits', async () => {
    const moderator = await aModerator();
    const queue = await reviewQueue(moderator.id, null);
    expect(queue).toEqual({ count: 0, oldestSubmittedAt: null, categories: [], items: [] });
  });

  it('lists what waits, the longest first, and says what is a first and what is one’s own', async () => {
    const moderator = await aModerator();
    const [measured, unmeasured] = [await aDevice(await aCategory()), await aDevice(await aCategory())];
    const known = await aMember();
    await aVerifiedReport(measured, [{ value: 8 }], { member: known });
    const first = await aSubmittedReport(measured, [{ value: 9 }], { member: known });
    const second = await aSubmittedReport(unmeasured, [{ value: 9 }], { member: moderator });
    const queue = await reviewQueue(moderator.id, null);
    expect(queue.items).toMatchObject([
      { publicId: first.publicId, isFirstOfDevice: false, isFirstOfMember: false, isOwn: false },
      { publicId: second.publicId, isFirstOfDevice: true, isFirstOfMember: true, isOwn: true },
    ]);
    expect(queue.count).toBe(2);
    expect(queue.oldestSubmittedAt).toBe(queue.items[0]?.submittedAt);
    const ofOne = await reviewQueue(moderator.id, `category-${measured.category.id}`);
    expect([ofOne.items.length, ofOne.count]).toEqual([1, 2]);
  });
});

describe('the desk', () => {
  it('warns of a value far from the device’s other reports, and lists what else the member sent', async () => {
    const moderator = await aModerator();
    const device = await aDevice(await aCategory());
    await aVerifiedReport(device, [{ value: 8 }]);
    const member = await aMember();
    const other = await aSubmittedReport(device, [{ value: 8 }], { member });
    const report = await aSubmittedReport(device, [{ value: 8000 }], { member });
    const desk = await deskOf(moderator.actor, report.publicId);
    expect(desk).toMatchObject({ isOwn: false, isWaiting: true, report: { revision: 1 } });
    expect(desk.warnings.map((warning) => warning.kind)).toEqual(['unit-slip']);
    expect(desk.otherReports.map((one) => one.publicId)).toEqual([other.publicId]);
  });

  it('is not there for a report that does not exist', async () => {
    const moderator = await aModerator();
    await expect(deskOf(moderator.actor, 'aaaaaaaaaa')).rejects.toMatchObject({ code: 'not-found' });
  });
});

describe('the routes of the review', () => {
  const statuses = async (as?: Awaited<ReturnType<typeof aMember>>) => {
    const device = await aDevice(await aCategory());
    const report = await aSubmittedReport(device, [{ value: 8 }]);
    const params = { id: report.publicId };
    const verdict = { revision: 1, verdict: 'verified', checklist: [], reason: '', remarks: [] };
    const responses = [
      await callRoute(getQueueRoute, { as }),
      await callRoute(getDeskRoute, { as, params }),
      await callRoute(decideRoute, { as, params, body: verdict }),
    ];
    return responses.map((response) => response.status);
  };

  it('are for nobody who is not signed in, and for no member', async () => {
    expect(await statuses()).toEqual([401, 401, 401]);
    expect(await statuses(await aMember())).toEqual([403, 403, 403]);
  });

  it('answer a moderator; an empty checklist is refused at its field', async () => {
    expect(await statuses(await aModerator())).toEqual([200, 200, 422]);
  });
});
