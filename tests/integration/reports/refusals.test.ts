import { beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/lib/platform/database/connection';
import { refillBuckets } from '@/lib/platform/rate-limit';
import { sendReportRoute } from '@/lib/reports/handlers/reports';
import type { Phase, ReportContent, Submission } from '@/lib/reports/schema';
import { aCategory, aDevice, aVariant } from '../../factories/catalogue';
import { aMember } from '../../factories/members';
import {
  aLog,
  aMethod,
  anInstrument,
  aSubmission,
  aTrace,
  LOG_START,
  tracedPhase,
  typedPhase,
  type Sender,
} from '../../factories/reports';
import { callRoute } from '../../factories/requests';
import { resetDatabase } from '../../setup/database';

let sender: Sender;
let trace: string;
let foreign: { trace: string; instrument: string; variantId: number };
let keys = 0;

beforeAll(async () => {
  await resetDatabase();
  const member = await aMember();
  const device = await aDevice(await aCategory());
  sender = { member, device, instrumentPublicId: await anInstrument(member), methodCode: await aMethod() };
  trace = await aTrace(
    member,
    aLog(3600, (second) => 8 + (second % 5) / 10),
  );
  const stranger = await aMember();
  foreign = {
    trace: await aTrace(
      stranger,
      aLog(3600, () => 5),
    ),
    instrument: await anInstrument(stranger),
    variantId: await aVariant(await aDevice(device.category), 'Mk 2'),
  };
});

interface Problem {
  title: string;
  errors: { pointer: string; message: string }[];
}

async function refusal(change: (submission: Submission) => unknown) {
  refillBuckets();
  const submission = aSubmission(sender);
  const body = {
    clientKey: `refused-${(keys += 1)}`,
    draftPublicId: null,
    amendsPublicId: null,
    submission: change(submission) ?? submission,
  };
  const response = await callRoute(sendReportRoute, { as: sender.member, body });
  return { status: response.status, ...((await response.json()) as Problem) };
}

const content = (traits: Partial<ReportContent>) => (submission: Submission) => ({
  ...submission,
  content: { ...submission.content, ...traits },
});
const phases = (...list: Phase[]) => content({ phases: list });
const tomorrow = () => new Date(Date.now() + 40 * 3_600_000).toISOString();

describe('a report that can’t be sent says where and why', () => {
  it.each<[string, () => (submission: Submission) => unknown, string, RegExp]>([
    ['no phase', () => phases(), '/content/phases', /at least one phase/],
    ['an unknown mode', () => phases(typedPhase('spin', 300)), '/content/phases/0/modeCode', /operating modes/],
    [
      'a minimum above the maximum',
      () => phases(typedPhase('idle', 8, { minimumWatts: 9, maximumWatts: 7 })),
      '/content/phases/0/minimumWatts',
      /above the maximum/,
    ],
    [
      'a mean below the minimum',
      () => phases(typedPhase('idle', 8, { minimumWatts: 9 })),
      '/content/phases/0/meanWatts',
      /below the minimum/,
    ],
    [
      'an energy that contradicts power times time',
      () => phases(typedPhase('idle', 8, { energyWattHours: 80 })),
      '/content/phases/0/energyWattHours',
      /8 W over that time is 8.00 Wh/,
    ],
    [
      'neither power nor energy',
      () => phases(typedPhase('idle', 8, { meanWatts: null })),
      '/content/phases/0/meanWatts',
      /mean power, the energy, or both/,
    ],
    [
      'a negative energy',
      () => phases(typedPhase('idle', 8, { energyWattHours: -1 })),
      '/content/phases/0/energyWattHours',
      /negative/,
    ],
    [
      'kilowatts of a power station',
      () => phases(typedPhase('idle', 2e6)),
      '/content/phases/0/meanWatts',
      /Check the unit/,
    ],
    [
      'no duration',
      () => phases(typedPhase('idle', 8, { durationSeconds: 0 })),
      '/content/phases/0/durationSeconds',
      /how long/,
    ],
    [
      'a phase in the future',
      () => phases(typedPhase('idle', 8, { startsAt: tomorrow() })),
      '/content/phases/0/startsAt',
      /future/,
    ],
    ['a day to come', () => content({ measuredOn: tomorrow().slice(0, 10) }), '/content/measuredOn', /still to come/],
    ['a day that no month has', () => content({ measuredOn: '2026-02-30' }), '/content/measuredOn', /day/],
    [
      'idle above busy',
      () => phases(typedPhase('idle', 20), typedPhase('busy', 9)),
      '/content/phases/0/modeCode',
      /exchanged/,
    ],
    [
      'somebody else’s instrument',
      () => (given) => ({ ...given, instrumentPublicId: foreign.instrument }),
      '/instrumentPublicId',
      /one of your instruments/,
    ],
    [
      'a supply that the instrument doesn’t measure',
      () => content({ supplyClass: 'dc' }),
      '/instrumentPublicId',
      /doesn’t measure that supply/,
    ],
    ['an unknown method', () => content({ methodCode: 'by-guessing' }), '/content/methodCode', /from the list/],
    ['somebody else’s trace', () => content({ traces: [foreign.trace] }), '/content/traces/0', /not there any more/],
    ['a trace twice', () => content({ traces: [trace, trace] }), '/content/traces/1', /twice/],
    [
      'a phase of a trace that is not among the report’s',
      () => phases(tracedPhase('idle', trace, LOG_START, LOG_START + 60)),
      '/content/phases/0/tracePublicId',
      /not among/,
    ],
    [
      'a phase beyond its trace',
      () => content({ traces: [trace], phases: [tracedPhase('idle', trace, LOG_START - 9000, LOG_START + 60)] }),
      '/content/phases/0/fromSeconds',
      /beyond its trace/,
    ],
    [
      'a phase from the end of time',
      () => content({ traces: [trace], phases: [tracedPhase('idle', trace, 0, 1e300)] }),
      '/content/phases/0/fromSeconds',
      /beyond its trace/,
    ],
    [
      'a phase that ends before it starts',
      () => content({ traces: [trace], phases: [tracedPhase('idle', trace, 9, 3)] }),
      '/content/phases/0/toSeconds',
      /before the start/,
    ],
    [
      'two phases of one mode that overlap',
      () =>
        content({
          traces: [trace],
          phases: [
            tracedPhase('idle', trace, LOG_START, LOG_START + 600),
            tracedPhase('idle', trace, LOG_START + 300, LOG_START + 900),
          ],
        }),
      '/content/phases/1/fromSeconds',
      /overlaps phase 1/,
    ],
    [
      'a photo that is not there',
      () => content({ photos: [{ publicId: 'abcdefghij', kind: 'display', caption: '' }] }),
      '/content/photos/0',
      /Add it again/,
    ],
    [
      'a photo twice',
      () => content({ photos: [1, 2].map(() => ({ publicId: 'abcdefghij', kind: 'display' as const, caption: '' })) }),
      '/content/photos/1',
      /twice/,
    ],
    [
      'a condition that the category has not',
      () => content({ conditions: { 'moon/phase': 'full' } }),
      '/content/conditions/moon~1phase',
      /notes/,
    ],
    ['notes of a novel', () => content({ notes: 'x'.repeat(20_001) }), '/content/notes', /20000/],
    [
      'another device’s variant',
      () => (given) => ({
        ...given,
        device: { from: 'catalogue', publicId: sender.device.publicId, variantId: foreign.variantId },
      }),
      '/device',
      /no such variant/,
    ],
    [
      'a variant beyond all numbers',
      () => (given) => ({ ...given, device: { from: 'catalogue', publicId: sender.device.publicId, variantId: 9e15 } }),
      '/device/variantId',
      /./,
    ],
    [
      'a device that is not there',
      () => (given) => ({ ...given, device: { from: 'catalogue', publicId: 'abcdefghij', variantId: null } }),
      '/device',
      /Choose one by search/,
    ],
    [
      'a proposal without a model',
      () => (given) => ({
        ...given,
        device: { from: 'proposal', proposal: { maker: 'Newbury', model: ' ', categoryPublicId: 'abcdefghij' } },
      }),
      '/device/proposal/model',
      /model/,
    ],
    [
      'a proposal in no category',
      () => (given) => ({
        ...given,
        device: { from: 'proposal', proposal: { maker: 'Newbury', model: 'N 1', categoryPublicId: 'abcdefghij' } },
      }),
      '/device/proposal/categoryPublicId',
      /from the list/,
    ],
    ['no licence', () => (given) => ({ ...given, licenceAgreed: false }), '/licenceAgreed', /licence/],
    ['a number as text', () => content({ supplyVolts: '230' as unknown as number }), '/content/supplyVolts', /number/],
    ['an object for a text', () => content({ notes: { $ne: '' } as unknown as string }), '/content/notes', /./],
  ])('%s', async (_what, change, pointer, message) => {
    const { status, errors } = await refusal(change());
    expect([status, errors?.map((error) => error.pointer.replace('/submission', ''))]).toEqual([
      422,
      expect.arrayContaining([pointer]),
    ]);
    expect(errors.find((error) => error.pointer.endsWith(pointer))?.message).toMatch(message);
    expect(await database().models.Report.count()).toBe(0);
  });

  it('all of it at once, so that nobody is sent back field by field', async () => {
    const change = content({
      methodCode: 'by-guessing',
      conditions: { moon: 'full' },
      phases: [typedPhase('spin', 3)],
    });
    const { errors } = await refusal(change);
    expect(errors.map((error) => error.pointer)).toEqual([
      '/content/methodCode',
      '/content/conditions/moon',
      '/content/phases/0/modeCode',
    ]);
  });

  it('a method with a caution unless its confirmation comes along', async () => {
    const methodCode = await aMethod({ needsConfirmation: true });
    expect((await refusal(content({ methodCode }))).errors).toMatchObject([{ pointer: '/content/cautionConfirmed' }]);
  });

  it.each(['\u0000', '\ud800', 'ok \udfff'])(
    'a character that no keyboard makes (%j) as one, not as a fault',
    async (odd) => {
      const { status } = await refusal(content({ notes: `x${odd}` }));
      expect(status).toBe(400);
    },
  );
});
