import { QueryTypes } from 'sequelize';
import { beforeEach, describe, expect, it } from 'vitest';
import { recomputeAll } from '@/lib/figures/commands/recompute';
import '@/lib/figures/register';
import { now } from '@/lib/platform/clock';
import { database } from '@/lib/platform/database/connection';
import { recordEvent } from '@/lib/platform/database/record-event';
import { inTransaction } from '@/lib/platform/database/transaction';
import { aCategory, aDevice, aVariant, type MadeDevice } from '../../factories/catalogue';
import { aMethodRevision, aRevision, aVerifiedReport, verifyDirectly } from '../../factories/figures';
import { aMember, aModerator } from '../../factories/members';
import { resetDatabase } from '../../setup/database';
import { checkedFromScratch, figuresOf, historyCount, theFigure } from './reading';

beforeEach(resetDatabase);

const aRouter = async (options = {}) => aDevice(await aCategory(options));

describe('a verified report', () => {
  it('publishes its device’s and its category’s figures in the same transaction', async () => {
    const device = await aRouter();
    await aVerifiedReport(device, [{ value: 8 }]);
    await aVerifiedReport(device, [{ value: 10 }]);
    expect(await theFigure(device, 'ac-230')).toMatchObject({ n: 2, median: 9, minimum: 8, maximum: 10 });
    const [category] = await figuresOf({ categoryId: device.category.id }, 'ac-230');
    expect(category).toMatchObject({ n: 1, median: 9, devices: 1, contributors: 2, reports: 2, instruments: 1 });
    expect(await checkedFromScratch()).toEqual([]);
  });

  it('stands in a pool of its supply, and in one of both where the category pools them', async () => {
    const device = await aRouter();
    await aVerifiedReport(device, [{ value: 8 }]);
    await aVerifiedReport(device, [{ value: 12 }], { supplyClass: 'ac-120' });
    await aVerifiedReport(device, [{ value: 30 }], { supplyClass: 'dc' });
    expect(await theFigure(device, 'ac-any')).toMatchObject({ n: 2, median: 10 });
    expect(await theFigure(device, 'ac-120')).toMatchObject({ n: 1, median: 12 });
    expect(await theFigure(device, 'dc')).toMatchObject({ n: 1, median: 30 });
  });

  it('stands apart by supply alone where the category says that supplies differ', async () => {
    const device = await aRouter({ poolsSupplies: false });
    await aVerifiedReport(device, [{ value: 8 }]);
    expect(await figuresOf({ deviceId: device.id }, 'ac-any')).toEqual([]);
  });

  it('speaks once for its contributor, however many reports there are', async () => {
    const device = await aRouter();
    const member = await aMember();
    await aVerifiedReport(device, [{ value: 8 }], { member });
    await aVerifiedReport(device, [{ value: 10 }], { member });
    expect(await theFigure(device, 'ac-230')).toMatchObject({ n: 1, median: 9, contributors: 1, reports: 2 });
  });

  it('of a method that does not count moves nothing', async () => {
    const device = await aRouter();
    await aVerifiedReport(device, [{ value: 8 }], { methodRevisionId: await aMethodRevision({ counts: false }) });
    expect(await figuresOf({ deviceId: device.id })).toEqual([]);
  });

  it('is replaced by its amendment only once that is verified', async () => {
    const device = await aRouter();
    const report = await aVerifiedReport(device, [{ value: 8 }]);
    const amended = await aRevision(report, device, [{ value: 9 }]);
    await inTransaction(async (work) => work.touch({ kind: 'device', id: device.id }));
    expect(await theFigure(device, 'ac-230')).toMatchObject({ median: 8 });
    await verifyDirectly({ ...report, ...amended });
    expect(await theFigure(device, 'ac-230')).toMatchObject({ n: 1, median: 9 });
    expect(await checkedFromScratch()).toEqual([]);
  });
});

describe('a device whose variants stand apart', () => {
  it('has a figure for each, and speaks in its category with the median of their medians', async () => {
    const device = await aRouter({ poolsVariants: false });
    const values = { first: 8, second: 10, third: 30 };
    for (const [generation, value] of Object.entries(values)) {
      await aVerifiedReport(device, [{ value }], { variantId: await aVariant(device, generation) });
    }
    const figures = await figuresOf({ deviceId: device.id }, 'ac-230');
    expect(figures.map((figure) => figure.median)).toEqual([8, 10, 30]);
    const [category] = await figuresOf({ categoryId: device.category.id }, 'ac-230');
    expect(category).toMatchObject({ n: 1, median: 10, contributors: 3, reports: 3 });
    expect(await checkedFromScratch()).toEqual([]);
  });
});

describe('a withdrawn report', () => {
  it('takes its figure away and ends the history with a row of none, naming the event', async () => {
    const device = await aRouter();
    const report = await aVerifiedReport(device, [{ value: 8 }]);
    const eventId = await withdraw(report.id, device);
    expect(await figuresOf({ deviceId: device.id })).toEqual([]);
    expect(await figuresOf({ categoryId: device.category.id })).toEqual([]);
    const rows = await database().models.PublishedFigureHistory.findAll({ order: [['id', 'DESC']] });
    expect(rows[0]).toMatchObject({ n: 0, median: null, eventId });
    expect(await checkedFromScratch()).toEqual([]);
  });
});

describe('a figure that is set aside', () => {
  it('does not count, stays listed with its reason, and counts again when that is undone', async () => {
    const device = await aRouter();
    await aVerifiedReport(device, [{ value: 8 }]);
    const odd = await aVerifiedReport(device, [{ value: 80 }]);
    const by = await aModerator();
    await inTransaction(async (work) => {
      const setAside = {
        reportFigureId: odd.figureIds[0] as number,
        byId: by.id,
        reason: 'A lamp hung on it.',
        fromAt: now(),
      };
      await work.models.SetAside.create(setAside, { transaction: work.transaction });
      work.touch({ kind: 'device', id: device.id });
    });
    expect(await theFigure(device, 'ac-230')).toMatchObject({ n: 1, median: 8, setAside: 1 });
    const input = await database().models.PublishedFigureInput.findOne({ where: { counted: false } });
    expect(input).toMatchObject({ value: 80, reason: 'Set aside: A lamp hung on it.' });
    await inTransaction(async (work) => {
      const where = { reportFigureId: odd.figureIds[0] as number, untilAt: null };
      await work.models.SetAside.update({ untilAt: now() }, { where, transaction: work.transaction });
      work.touch({ kind: 'device', id: device.id });
    });
    expect(await theFigure(device, 'ac-230')).toMatchObject({ n: 2, median: 44, setAside: 0 });
    expect(await checkedFromScratch()).toEqual([]);
  });
});

describe('a category whose pooling changes', () => {
  it('has all its devices’ figures redone when it is touched', async () => {
    const device = await aRouter();
    await aVerifiedReport(device, [{ value: 8 }]);
    await inTransaction(async (work) => {
      const { CategoryRevision, Category } = work.models;
      const { transaction } = work;
      const old = await CategoryRevision.findByPk(device.category.revisionId, { rejectOnEmpty: true, transaction });
      const { id: _old, ...kept } = old.get({ plain: true });
      const revision = await CategoryRevision.create({ ...kept, n: 2, poolsSupplies: false }, { transaction });
      await Category.update({ currentRevisionId: revision.id }, { where: { id: device.category.id }, transaction });
      work.touch({ kind: 'category', id: device.category.id });
    });
    expect(await figuresOf({ deviceId: device.id }, 'ac-any')).toEqual([]);
    expect(await checkedFromScratch()).toEqual([]);
  });
});

describe('recomputing', () => {
  it('what stands already changes nothing and writes no history', async () => {
    const device = await aRouter();
    await aVerifiedReport(device, [{ value: 8 }]);
    const before = await historyCount();
    await inTransaction(async (work) => work.touch({ kind: 'device', id: device.id }));
    expect(await inTransaction(recomputeAll)).toEqual({ repaired: 0 });
    expect(await historyCount()).toBe(before);
  });

  it('from scratch repairs a wrong digit, a lost row, a lost input and a row from nowhere', async () => {
    const device = await aRouter();
    await aVerifiedReport(device, [{ value: 8 }]);
    const { sequelize } = database();
    await sequelize.query(`update published_figure set standard_uncertainty = standard_uncertainty * (1 + 2.3e-16)`);
    expect((await checkedFromScratch()).length).toBeGreaterThan(0);
    await sequelize.query(`delete from published_figure where id = (select min(id) from published_figure)`);
    await sequelize.query(`delete from published_figure_input where id = (select max(id) from published_figure_input)`);
    await sequelize.query(
      `insert into published_figure (scope_id, quantity, power_kind, supply_stratum, n, at_most, flagged, set_aside,
         devices, contributors, instruments, reports, rule_version, receipt_hash, changed_at)
       select scope_id, 'use-energy', power_kind, supply_stratum, n, at_most, flagged, set_aside,
         devices, contributors, instruments, reports, rule_version, receipt_hash, changed_at
       from published_figure limit 1`,
    );
    expect((await checkedFromScratch()).length).toBeGreaterThan(2);
    const { repaired } = await inTransaction(recomputeAll);
    expect(repaired).toBeGreaterThan(2);
    expect(await checkedFromScratch()).toEqual([]);
    expect(await theFigure(device, 'ac-230')).toMatchObject({ median: 8 });
  });
});

describe('the quartiles', () => {
  it('of our rules and of percentile_cont over the same rows are the same doubles', async () => {
    const device = await aRouter();
    for (const value of [7.1, 8.3, 8.7, 9.9, 10.4, 13.3, 14.7]) await aVerifiedReport(device, [{ value }]);
    const ours = await theFigure(device, 'ac-230');
    const [theirs] = await database().sequelize.query<{ quartiles: number[] }>(
      `select percentile_cont(array[0.25, 0.5, 0.75]) within group (order by i.value) as quartiles
       from published_figure_input i join published_figure f on f.id = i.published_figure_id
       join figure_scope s on s.id = f.scope_id
       where s.device_id = $1 and f.supply_stratum = 'ac-230' and i.counted`,
      { bind: [device.id], type: QueryTypes.SELECT },
    );
    expect([ours.lowerQuartile, ours.median, ours.upperQuartile]).toEqual(theirs?.quartiles);
  });
});

async function withdraw(reportId: number, device: MadeDevice): Promise<string | null> {
  return inTransaction(async (work) => {
    const where = { id: reportId };
    await work.models.Report.update({ state: 'withdrawn' }, { where, transaction: work.transaction });
    await recordEvent(work, { actorId: null, action: 'report.withdrawn', subject: { kind: 'report', id: reportId } });
    work.touch({ kind: 'device', id: device.id });
    return work.eventId;
  });
}
