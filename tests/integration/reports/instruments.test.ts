import { beforeEach, describe, expect, it } from 'vitest';
import { database } from '@/lib/platform/database/connection';
import { refillBuckets } from '@/lib/platform/rate-limit';
import {
  addInstrumentRoute,
  listInstrumentsRoute,
  retireInstrumentRoute,
  reviseInstrumentRoute,
} from '@/lib/reports/handlers/instruments';
import type { Instrument, InstrumentInput } from '@/lib/reports/schema';
import { aMember, type MadeMember } from '../../factories/members';
import { METER } from '../../factories/reports';
import { callRoute } from '../../factories/requests';
import { resetDatabase } from '../../setup/database';

let member: MadeMember;

beforeEach(async () => {
  await resetDatabase();
  refillBuckets();
  member = await aMember();
});

async function add(traits: Partial<InstrumentInput> = {}): Promise<string> {
  const response = await callRoute(addInstrumentRoute, { as: member, body: { ...METER, ...traits } });
  return ((await response.json()) as { publicId: string }).publicId;
}

const revise = (id: string, body: object, revision?: number, as = member) =>
  callRoute(reviseInstrumentRoute, {
    as,
    params: { id },
    body,
    headers: revision === undefined ? {} : { 'if-match': `"${revision}"` },
  });

async function mine(as = member): Promise<Instrument[]> {
  const response = await callRoute(listInstrumentsRoute, { as });
  return ((await response.json()) as { instruments: Instrument[] }).instruments;
}

describe('an instrument', () => {
  it('is kept with what its manual states', async () => {
    const publicId = await add();
    expect(await mine()).toEqual([{ ...METER, publicId, revision: 1 }]);
  });

  it('changed is a new revision, and the old one stays for the reports that rest on it', async () => {
    const id = await add();
    expect((await revise(id, { ...METER, percentOfReading: 2 }, 1)).status).toBe(200);
    expect(await mine()).toMatchObject([{ revision: 2, percentOfReading: 2 }]);
    const rows = await database().models.InstrumentRevision.findAll({ order: [['n', 'ASC']] });
    expect(rows.map((row) => row.percentOfReading)).toEqual([1, 2]);
  });

  it('saved unchanged makes no revision', async () => {
    const id = await add({ calibratedOn: '2026-05-01' });
    expect((await revise(id, { ...METER, calibratedOn: '2026-05-01' }, 1)).status).toBe(200);
    expect(await database().models.InstrumentRevision.count()).toBe(1);
  });

  it('is not changed without the revision that was read, nor over another', async () => {
    const id = await add();
    const changed = { ...METER, counts: 5 };
    expect((await revise(id, changed)).status).toBe(428);
    await revise(id, changed, 1);
    const late = await revise(id, { ...METER, counts: 9 }, 1);
    expect([late.status, ((await late.json()) as { facts: object }).facts]).toEqual([412, { version: 2 }]);
    const at = await Promise.all([7, 8].map((counts) => revise(id, { ...METER, counts }, 2)));
    expect(at.map((response) => response.status).sort()).toEqual([200, 412]);
  });

  it('out of use is offered no more, and its revisions stay', async () => {
    const id = await add();
    const retire = (as: MadeMember) => callRoute(retireInstrumentRoute, { as, params: { id } });
    expect((await retire(await aMember())).status).toBe(404);
    expect((await retire(member)).status).toBe(204);
    expect((await retire(member)).status).toBe(204);
    expect(await mine()).toEqual([]);
    expect(await database().models.InstrumentRevision.count()).toBe(1);
  });

  it('is its member’s alone', async () => {
    const id = await add();
    const stranger = await aMember();
    expect(await mine(stranger)).toEqual([]);
    expect((await revise(id, METER, 1, stranger)).status).toBe(404);
    expect((await callRoute(addInstrumentRoute, { body: METER })).status).toBe(401);
  });

  it.each<[string, object, string]>([
    ['a share of a range without the range', { percentOfRange: 1 }, '/rangeWatts'],
    ['more than everything', { percentOfReading: 101 }, '/percentOfReading'],
    ['no resolution', { resolutionWatts: 0 }, '/resolutionWatts'],
    ['no supply', { supplies: [] }, '/supplies'],
    ['no name', { name: '  ' }, '/name'],
    ['an empty text for a number', { counts: '' }, '/counts'],
    ['a day that no month has', { calibratedOn: '2026-02-30' }, '/calibratedOn'],
  ])('with %s is refused at that field', async (_what, traits, pointer) => {
    const response = await callRoute(addInstrumentRoute, { as: member, body: { ...METER, ...traits } });
    expect(response.status).toBe(422);
    const { errors } = (await response.json()) as { errors: { pointer: string }[] };
    expect(errors.map((error) => error.pointer)).toEqual([pointer]);
  });
});
