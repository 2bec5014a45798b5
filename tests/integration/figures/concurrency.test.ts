import { beforeEach, describe, expect, it } from 'vitest';
import { recomputeAll, recomputeTouched } from '@/lib/figures/commands/recompute';
import '@/lib/figures/register';
import { now } from '@/lib/platform/clock';
import { database } from '@/lib/platform/database/connection';
import { beforeCommit, inTransaction, type Work } from '@/lib/platform/database/transaction';
import { aCategory, aDevice, type MadeDevice } from '../../factories/catalogue';
import { aSubmittedReport, aVerifiedReport, type MadeReport } from '../../factories/figures';
import { aModerator, type MadeMember } from '../../factories/members';
import { resetDatabase } from '../../setup/database';
import { checkedFromScratch, figuresOf, theFigure } from './reading';

beforeEach(async () => {
  await resetDatabase();
  beforeCommit('figures', recomputeTouched);
  beforeCommit('hold', async () => undefined);
});

/** A gate that holds whoever waits at it until it is opened. */
function aGate() {
  let open: () => void = () => undefined;
  const opened = new Promise<void>((resolve) => (open = resolve));
  return { opened, open: () => open() };
}

async function verify(work: Work, report: MadeReport) {
  await work.models.Report.update(
    { state: 'verified', publishedRevisionId: report.revisionId, decidedAt: now() },
    { where: { id: report.id }, transaction: work.transaction },
  );
  work.touch({ kind: 'device', id: report.deviceId });
}

/**
 * Two verifications, each holding its change open until both have made theirs. Whichever has recomputed first then
 * keeps its commit back, so that the other one would read without it if nothing made it wait.
 */
async function verifyBothAtOnce(first: MadeReport, second: MadeReport) {
  const gates = [aGate(), aGate()] as const;
  const bothRecomputed = aGate();
  let recomputed = 0;
  beforeCommit('hold', async () => {
    recomputed += 1;
    if (recomputed === 2) bothRecomputed.open();
    const aMoment = new Promise<void>((resolve) => setTimeout(resolve, 500));
    await Promise.race([bothRecomputed.opened, aMoment]);
  });
  const run = (report: MadeReport, mine: number) =>
    inTransaction(async (work) => {
      await verify(work, report);
      gates[mine]?.open();
      await gates[1 - mine]?.opened;
    });
  await Promise.all([run(first, 0), run(second, 1)]);
}

describe('two verifications held open on two connections', () => {
  it('publish both reports of one device', async () => {
    const device = await aDevice(await aCategory());
    await aVerifiedReport(device, [{ value: 9 }]);
    const reports = [await aSubmittedReport(device, [{ value: 8 }]), await aSubmittedReport(device, [{ value: 10 }])];
    await verifyBothAtOnce(reports[0] as MadeReport, reports[1] as MadeReport);
    expect(await theFigure(device, 'ac-230')).toMatchObject({ n: 3, median: 9 });
    expect(await checkedFromScratch()).toEqual([]);
  });

  it('publish both devices of one category', async () => {
    const category = await aCategory();
    const devices = [await aDevice(category), await aDevice(category)] as const;
    for (const device of devices) await aVerifiedReport(device, [{ value: 30, mode: 'busy' }]);
    const first = await aSubmittedReport(devices[0], [{ value: 8 }]);
    const second = await aSubmittedReport(devices[1], [{ value: 10 }]);
    await verifyBothAtOnce(first, second);
    const [figure] = await figuresOf({ categoryId: category.id }, 'ac-230');
    expect(await checkedFromScratch()).toEqual([]);
    expect(figure).toMatchObject({ n: 2, median: 9, contributors: 2 });
  });

  it('of two devices each, in opposite orders, don’t wait for each other for ever', async () => {
    const category = await aCategory();
    const [a, b] = [await aDevice(category), await aDevice(category)] as const;
    const touchBoth = (order: MadeDevice[]) =>
      inTransaction(async (work) => order.forEach((device) => work.touch({ kind: 'device', id: device.id })));
    for (const device of [a, b]) await aVerifiedReport(device, [{ value: 8 }]);
    await Promise.all(Array.from({ length: 10 }, (_, i) => touchBoth(i % 2 === 0 ? [a, b] : [b, a])));
    expect(await checkedFromScratch()).toEqual([]);
  });

  it('lose one report where the scopes are not locked, and the check says so', async () => {
    const device = await aDevice(await aCategory());
    await aVerifiedReport(device, [{ value: 7 }]);
    const first = await aSubmittedReport(device, [{ value: 8 }]);
    const second = await aSubmittedReport(device, [{ value: 10 }]);
    const bothHaveRead = [aGate(), aGate()];
    let arrived = 0;
    // The planted fault: reading before the lock is taken, which is what an aggregate by read-then-write does.
    beforeCommit('figures', async (work) => {
      if (work.touched.length === 0) return;
      const mine = arrived++;
      await recomputeTouched({ ...work, sequelize: readingEarly(work, bothHaveRead, mine) });
    });
    await verifyBothAtOnce(first, second);
    const problems = await checkedFromScratch();
    expect(problems.some((problem) => problem.includes('n: 2 is stored, 3 follows from the reports'))).toBe(true);
    expect(await inTransaction(recomputeAll)).not.toEqual({ repaired: 0 });
    expect(await checkedFromScratch()).toEqual([]);
  });
});

/** A connection that skips the scopes' lock, and holds what it has read until the other one has read too. */
function readingEarly(work: Work, gates: ReturnType<typeof aGate>[], mine: number): Work['sequelize'] {
  const query = async (statement: string, options: object) => {
    const isLock = statement.includes('for update');
    const rows: unknown = await work.sequelize.query(isLock ? statement.replace('for update', '') : statement, options);
    if (statement.includes('from report r')) {
      gates[mine]?.open();
      await gates[1 - mine]?.opened;
    }
    return rows;
  };
  return new Proxy(work.sequelize, {
    get: (target, name) => (name === 'query' ? query : (Reflect.get(target, name) as unknown)),
  });
}

describe('a hundred changes at random, eight at a time', () => {
  it('leave what a recomputation from scratch finds', { timeout: 120_000 }, async () => {
    const random = seeded(20261201);
    const category = await aCategory();
    const devices = [await aDevice(category), await aDevice(category), await aDevice(await aCategory())];
    const reports: MadeReport[] = [];
    for (let i = 0; i < 24; i += 1) {
      const device = devices[i % devices.length] as MadeDevice;
      const value = 5 + 10 * random();
      const figures = [
        { value },
        { value: 3 * value, mode: 'busy' },
        { value: 24 * value, mode: null, quantity: 'day-energy' as const },
      ];
      reports.push(await aSubmittedReport(device, figures, { supplyClass: random() < 0.7 ? 'ac-230' : 'ac-120' }));
    }
    const moderator = await aModerator();
    const changes = Array.from({ length: 100 }, () => {
      const report = reports[Math.floor(random() * reports.length)] as MadeReport;
      const which = random();
      return () => inTransaction((work) => change(work, report, which, moderator));
    });
    const workers = Array.from({ length: 8 }, async () => {
      for (let next = changes.pop(); next; next = changes.pop()) await next();
    });
    await Promise.all(workers);
    expect(await checkedFromScratch()).toEqual([]);
    const published = await database().models.PublishedFigure.count();
    expect(published).toBeGreaterThan(10);
    expect(await inTransaction(recomputeAll)).toEqual({ repaired: 0 });
  });
});

/** Verify, withdraw, set aside or undo that: whatever the dice say, in the state that the report is in. */
async function change(work: Work, report: MadeReport, which: number, moderator: MadeMember) {
  const { models, transaction } = work;
  const row = await models.Report.findByPk(report.id, {
    transaction,
    lock: transaction.LOCK.UPDATE,
    rejectOnEmpty: true,
  });
  if (which < 0.5) return verify(work, report);
  if (which < 0.65) {
    if (row.publishedRevisionId !== null) await row.update({ state: 'withdrawn' }, { transaction });
  } else {
    const reportFigureId = report.figureIds[0] as number;
    const open = await models.SetAside.findOne({ where: { reportFigureId, untilAt: null }, transaction });
    if (open) await open.update({ untilAt: now() }, { transaction });
    else {
      const setAside = { reportFigureId, byId: moderator.id, reason: 'Not alone on the circuit.', fromAt: now() };
      await models.SetAside.create(setAside, { transaction });
    }
  }
  work.touch({ kind: 'device', id: report.deviceId });
}

/** Mulberry32: the same hundred on every run. */
function seeded(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}
