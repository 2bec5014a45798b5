import { beforeEach, describe, expect, it } from 'vitest';
import {
  devicesOfCategoryWithFigures,
  figuresOfCategory,
  figuresOfDevice,
  recentlyChangedFigures,
  typicalDraws,
} from '@/lib/figures/queries/published-figures';
import { historyOf, receiptByHash } from '@/lib/figures/queries/receipts';
import '@/lib/figures/register';
import { changedFigure, deviceWithFigure, figure, historyEntry, receipt } from '@/lib/figures/schema';
import { now } from '@/lib/platform/clock';
import { inTransaction } from '@/lib/platform/database/transaction';
import { aCategory, aDevice } from '../../factories/catalogue';
import { aVerifiedReport } from '../../factories/figures';
import { aMember, aModerator } from '../../factories/members';
import { resetDatabase } from '../../setup/database';

beforeEach(resetDatabase);

describe('the figures of a device', () => {
  it('lead with the one on the category’s basis over both mains voltages', async () => {
    const device = await aDevice(await aCategory());
    await aVerifiedReport(device, [{ value: 30, mode: 'busy' }, { value: 8 }]);
    const figures = await figuresOfDevice(device.id);
    expect(
      figures.map(({ mode, supplyStratum, isHeadline, isMain }) => [mode?.code, supplyStratum, isHeadline, isMain]),
    ).toEqual([
      ['idle', 'ac-any', true, true],
      ['idle', 'ac-230', false, false],
      ['busy', 'ac-any', false, true],
      ['busy', 'ac-230', false, false],
    ]);
    expect(() => figure.strict().array().parse(figures)).not.toThrow();
  });

  it('have a stone for each contributor, named after who it is, at the median of what they measured', async () => {
    const device = await aDevice(await aCategory());
    const ina = await aMember({ name: 'Ina Tolvers' });
    await aVerifiedReport(device, [{ value: 8 }], { member: ina });
    await aVerifiedReport(device, [{ value: 9 }], { member: ina });
    await aVerifiedReport(device, [{ value: 10 }], { member: await aMember({ name: 'Orla Fenn' }) });
    const [headline] = await figuresOfDevice(device.id);
    const stones = headline?.stones.map(({ label, value }) => [label, value]).sort();
    expect(stones).toEqual([
      ['Ina Tolvers', 8.5],
      ['Orla Fenn', 10],
    ]);
    expect(headline?.stones.some((stone) => stone.id === ina.publicId)).toBe(true);
  });

  it('show a hollow stone for what was set aside', async () => {
    const device = await aDevice(await aCategory());
    await aVerifiedReport(device, [{ value: 8 }]);
    const odd = await aVerifiedReport(device, [{ value: 80 }]);
    const by = await aModerator();
    await inTransaction(async (work) => {
      const row = {
        reportFigureId: odd.figureIds[0] as number,
        byId: by.id,
        reason: 'A lamp hung on it.',
        fromAt: now(),
      };
      await work.models.SetAside.create(row, { transaction: work.transaction });
      work.touch({ kind: 'device', id: device.id });
    });
    const [headline] = await figuresOfDevice(device.id);
    expect(headline).toMatchObject({ n: 1, setAside: 1 });
    expect(headline?.stones.map(({ value, setAside }) => [value, setAside])).toEqual([
      [8, false],
      [80, true],
    ]);
  });

  it('are flagged from one contributor on where they lie more than five times above the category’s median', async () => {
    const category = await aCategory();
    for (const value of [8, 9, 10]) await aVerifiedReport(await aDevice(category), [{ value }]);
    const odd = await aDevice(category);
    await aVerifiedReport(odd, [{ value: 60 }]);
    const [headline] = await figuresOfDevice(odd.id);
    expect(headline).toMatchObject({ n: 1, flagged: 1, stones: [{ flagged: true }] });
    const [ofCategory] = await figuresOfCategory(category.id);
    expect(ofCategory?.stones.filter((stone) => stone.flagged)).toHaveLength(1);
  });

  it('say "at most" of a stone that the instrument could not read', async () => {
    const device = await aDevice(await aCategory());
    await aVerifiedReport(device, [{ value: 0.2, censoredAt: 0.5 }]);
    const [headline] = await figuresOfDevice(device.id);
    expect(headline).toMatchObject({ median: 0.5, atMost: true, stones: [{ value: 0.5, atMost: true }] });
    const [ofCategory] = await figuresOfCategory(device.category.id);
    expect(ofCategory).toMatchObject({ median: 0.5, atMost: true, stones: [{ atMost: true }] });
  });

  it('are none where the device is not known', async () => {
    expect(await figuresOfDevice(4711)).toEqual([]);
  });
});

describe('the devices of a category', () => {
  it('come with what they draw, from the smallest up, those without a figure last', async () => {
    const category = await aCategory();
    const [unmeasured, high, low] = [await aDevice(category), await aDevice(category), await aDevice(category)];
    await aVerifiedReport(high, [{ value: 20 }]);
    await aVerifiedReport(low, [{ value: 10 }]);
    const devices = await devicesOfCategoryWithFigures(category.id);
    expect(devices.map((device) => device.deviceId)).toEqual([low.id, high.id, unmeasured.id]);
    expect(() => deviceWithFigure.array().parse(devices)).not.toThrow();
    const draws = await typicalDraws([unmeasured.id, high.id]);
    expect([...draws.keys()]).toEqual([high.id]);
  });
});

describe('the figures that changed', () => {
  it('come the latest first, each with its median before', async () => {
    const category = await aCategory();
    const [first, second] = [await aDevice(category), await aDevice(category)];
    await aVerifiedReport(first, [{ value: 8 }]);
    await aVerifiedReport(second, [{ value: 20 }]);
    await aVerifiedReport(first, [{ value: 10 }]);
    const changed = await recentlyChangedFigures(5);
    expect(
      changed.map(({ device, figure: { median }, medianBefore }) => [device.publicId, median, medianBefore]),
    ).toEqual([
      [first.publicId, 9, 8],
      [second.publicId, 20, null],
    ]);
    expect(() => changedFigure.array().parse(changed)).not.toThrow();
  });
});

describe('a receipt', () => {
  it('names each report behind a figure, what was left out, and how the figure came about', async () => {
    const device = await aDevice(await aCategory());
    const report = await aVerifiedReport(device, [{ value: 8 }]);
    await aVerifiedReport(device, [{ value: 10 }]);
    const [headline] = await figuresOfDevice(device.id);
    const found = await receiptByHash(headline?.receiptHash ?? '');
    expect(receipt.parse(found).inputs).toContainEqual({
      reportPublicId: report.publicId,
      revision: 1,
      devicePublicId: null,
      voice: report.member.publicId,
      value: 8,
      standardUncertainty: 0.08,
      counted: true,
      flagged: false,
      reason: null,
    });
    const history = historyEntry.array().parse(await historyOf(headline?.receiptHash ?? ''));
    expect(history.map(({ n, median }) => [n, median])).toEqual([
      [1, 8],
      [2, 9],
    ]);
    expect(await receiptByHash('0'.repeat(64))).toBeNull();
  });
});
