import { describe, expect, it } from 'vitest';
import { draftContent, phase, reportContent } from '@/lib/reports/schema';
import { traceCorrections, zoneName } from '@/lib/reports/schema/trace';

const typed = {
  source: 'typed',
  modeCode: 'idle',
  startsAt: null,
  durationSeconds: 3600,
  meanWatts: 40,
  minimumWatts: null,
  maximumWatts: null,
  energyWattHours: null,
  uses: null,
  note: '',
};
const problemsOf = (traits: object) =>
  phase.safeParse({ ...typed, ...traits }).error?.issues.map((issue) => issue.path.join('.')) ?? [];

describe('a phase read off a display', () => {
  it.each([
    ['mean alone', {}],
    ['energy alone', { meanWatts: null, energyWattHours: 40 }],
    ['both, in agreement', { energyWattHours: 40 }],
    ['both, 5 % and one step of a counter apart', { energyWattHours: 42.9 }],
    ['a mean at its minimum and maximum', { minimumWatts: 40, maximumWatts: 40 }],
    ['nothing drawn', { meanWatts: 0 }],
    ['power that went the other way', { meanWatts: -12, minimumWatts: -15, maximumWatts: -2 }],
  ])('is taken with %s', (_what, traits) => expect(problemsOf(traits)).toEqual([]));

  it.each<[string, object, string[]]>([
    ['both, more than 5 % and a step apart', { energyWattHours: 43.1 }, ['energyWattHours']],
    ['an energy in kWh for one in Wh', { energyWattHours: 0.04 }, ['energyWattHours']],
    ['neither', { meanWatts: null }, ['meanWatts']],
    [
      'the minimum above the maximum',
      { minimumWatts: 50, maximumWatts: 45, meanWatts: 47 },
      ['minimumWatts', 'meanWatts', 'meanWatts'],
    ],
    ['infinite power', { meanWatts: Infinity }, ['meanWatts']],
    ['no number', { meanWatts: NaN }, ['meanWatts']],
    ['a text', { meanWatts: '40' }, ['meanWatts']],
    ['more than a megawatt', { meanWatts: 1_000_001 }, ['meanWatts']],
    ['no use', { uses: 0 }, ['uses']],
    ['half a use', { uses: 1.5 }, ['uses']],
    ['longer than a year', { durationSeconds: 400 * 86_400 }, ['durationSeconds']],
    ['a start without a zone', { startsAt: '2026-11-02T10:00:00' }, ['startsAt']],
  ])('is refused with %s', (_what, traits, paths) => expect(problemsOf(traits)).toEqual(paths));
});

describe('a draft’s content', () => {
  it('may hold anything of ordinary size, and nothing at all', () => {
    expect(draftContent.safeParse({}).success).toBe(true);
    expect(draftContent.safeParse({ mean: '0,6 kW', phases: [null, { a: [] }] }).success).toBe(true);
  });

  it('longer than 400,000 characters says what to shorten', () => {
    const { error } = draftContent.safeParse({ notes: 'x'.repeat(400_000) });
    expect(error?.issues[0]?.message).toMatch(/Shorten the notes/);
  });
});

describe('a report’s content', () => {
  it('says for each missing part what to give', () => {
    const { error } = reportContent.safeParse({});
    const messages = new Map(error?.issues.map((issue) => [issue.path[0], issue.message]));
    expect(messages.get('measuringPoint')).toBe('Choose where it was measured.');
    expect(messages.get('supplyClass')).toBe('Choose the supply.');
    expect(messages.get('isOnlyLoad')).toBe('Say whether it was the only load there.');
    expect(messages.get('measuredOn')).toBe('Give the day on which the measurement began.');
  });
});

describe('what a member sets right in a reading', () => {
  it.each([
    { timeFormat: 'day-first', unit: 'kW', segment: 0 },
    { startsAt: '2026-11-02T10:00:00+01:00' },
    { dateColumn: null },
    {},
  ])('is taken: %j', (given) => expect(traceCorrections.safeParse(given).success).toBe(true));

  it.each([
    { startsAt: '2026-11-02 10:00' },
    { delimiter: '||' },
    { volts: 0 },
    { valueColumn: -1 },
    { unit: 'hp' },
    { path: '/etc/passwd' },
  ])('is refused: %j', (given) => expect(traceCorrections.safeParse(given).success).toBe(false));
});

describe('a time zone', () => {
  it.each(['UTC', 'Atlantic/Faroe', 'Pacific/Chatham', 'Asia/Calcutta'])('%s is known', (zone) => {
    expect(zoneName.safeParse(zone).success).toBe(true);
  });

  it.each(['', 'Orrin/Skerry', '../UTC', '\u0000', 'x'.repeat(61)])('%j is none', (zone) => {
    expect(zoneName.safeParse(zone).success).toBe(false);
  });
});
