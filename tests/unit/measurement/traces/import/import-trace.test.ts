import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { importTrace } from '@/lib/measurement/traces/import/import-trace';
import type { TraceCorrections } from '@/lib/measurement/traces/import/types';

async function* chunks(bytes: Uint8Array, size = 64 * 1024): AsyncGenerator<Uint8Array> {
  for (let at = 0; at < bytes.length; at += size) yield bytes.subarray(at, at + size);
}

const read = (content: string | Uint8Array, corrections: TraceCorrections = {}, zone = 'Europe/Oslo', size?: number) =>
  importTrace(chunks(typeof content === 'string' ? new TextEncoder().encode(content) : content, size), {
    zone,
    corrections,
  });

async function readTrace(
  content: string | Uint8Array,
  corrections: TraceCorrections = {},
  zone?: string,
  size?: number,
) {
  const result = await read(content, corrections, zone, size);
  if (!result.ok) throw new Error(JSON.stringify(result.problem ?? result.description?.questions));
  return result;
}

const rows = (lines: string[]) => `${lines.join('\n')}\n`;
const START = Date.parse('2026-10-03T10:00:00Z') / 1000;
const three = [START, START + 10, START + 20];

describe('a log’s dialect', () => {
  it.each([
    [
      'comma, point, ISO with Z',
      rows(['time,power_W', '2026-10-03T10:00:00Z,40.5', '2026-10-03T10:00:10Z,41', '2026-10-03T10:00:20Z,42.5']),
    ],
    [
      'ISO with an offset',
      rows([
        'time,power_W',
        '2026-10-03T12:00:00+02:00,40.5',
        '2026-10-03T12:00:10+02:00,41',
        '2026-10-03T12:00:20+02:00,42.5',
      ]),
    ],
    [
      'local ISO in the named zone',
      rows(['time;P (W)', '2026-10-03 12:00:00;40.5', '2026-10-03 12:00:10;41', '2026-10-03 12:00:20;42.5']),
    ],
    [
      'semicolon, decimal comma, day first with points',
      rows(['Zeit;Power (W)', '03.10.2026 12:00:00;40,5', '03.10.2026 12:00:10;41,0', '03.10.2026 12:00:20;42,5']),
    ],
    [
      'date and time in two columns',
      rows(['Date;Time;Power (W)', '03.10.2026;12:00:00;40,5', '03.10.2026;12:00:10;41,0', '03.10.2026;12:00:20;42,5']),
    ],
    [
      'tabs and a preamble',
      rows([
        'Socket logger 3',
        'serial\t17',
        '',
        'time\tpower [W]',
        '2026-10-03T10:00:00Z\t40.5',
        '2026-10-03T10:00:10Z\t41',
        '2026-10-03T10:00:20Z\t42.5',
      ]),
    ],
    [
      'a row of units below the header',
      rows(['time,power', ',W', '2026-10-03T10:00:00Z,40.5', '2026-10-03T10:00:10Z,41', '2026-10-03T10:00:20Z,42.5']),
    ],
    [
      'quoted fields',
      rows([
        '"time","power_W"',
        '"2026-10-03T10:00:00Z","40.5"',
        '"2026-10-03T10:00:10Z","41"',
        '"2026-10-03T10:00:20Z","42.5"',
      ]),
    ],
    ['epoch seconds', rows(['ts,power_W', `${START},40.5`, `${START + 10},41`, `${START + 20},42.5`])],
    ['epoch milliseconds', rows(['ts,power_W', `${START}000,40.5`, `${START + 10}000,41`, `${START + 20}000,42.5`])],
    [
      'kilowatts',
      rows([
        'time,power_kW',
        '2026-10-03T10:00:00Z,0.0405',
        '2026-10-03T10:00:10Z,0.041',
        '2026-10-03T10:00:20Z,0.0425',
      ]),
    ],
    [
      'units in the cells',
      rows(['time,power', '2026-10-03T10:00:00Z,40.5 W', '2026-10-03T10:00:10Z,41 W', '2026-10-03T10:00:20Z,42.5 W']),
    ],
    [
      'newest first',
      rows(['time,power_W', '2026-10-03T10:00:20Z,42.5', '2026-10-03T10:00:10Z,41', '2026-10-03T10:00:00Z,40.5']),
    ],
    [
      'carriage returns',
      'time,power_W\r\n2026-10-03T10:00:00Z,40.5\r\n2026-10-03T10:00:10Z,41\r\n2026-10-03T10:00:20Z,42.5\r\n',
    ],
    [
      'a byte-order mark',
      '\ufefftime,power_W\n2026-10-03T10:00:00Z,40.5\n2026-10-03T10:00:10Z,41\n2026-10-03T10:00:20Z,42.5\n',
    ],
    [
      'a twelve-hour clock, month first beyond doubt',
      rows(['time,power_W', '10/13/2026 11:59:50 AM,1', '10/13/2026 12:00:00 PM,2', '10/13/2026 12:00:10 PM,3']),
    ],
  ])('%s', async (name, content) => {
    const { trace } = await readTrace(content);
    if (name.startsWith('a twelve-hour')) {
      const noon = Date.parse('2026-10-13T10:00:00Z') / 1000;
      expect([...trace.timeSeconds]).toEqual([noon - 10, noon, noon + 10]);
      return;
    }
    expect([...trace.timeSeconds]).toEqual(three);
    expect([...trace.values].map((value) => Number(value.toFixed(6)))).toEqual([40.5, 41, 42.5]);
  });

  it('reads UTF-16, and a file cut anywhere into chunks', async () => {
    const text = 'time,power_W\n2026-10-03T10:00:00Z,40.5\n2026-10-03T10:00:10Z,41\n2026-10-03T10:00:20Z,42.5\n';
    const utf16 = Buffer.from(`\ufeff${text}`, 'utf16le');
    for (const size of [1, 2, 3, 7, 1000]) {
      expect([...(await readTrace(utf16, {}, 'UTC', size)).trace.timeSeconds]).toEqual(three);
      expect([...(await readTrace(text, {}, 'UTC', size)).trace.timeSeconds]).toEqual(three);
    }
  });
});

describe('what a file leaves open is asked, and read again with the answer', () => {
  it('asks for the order of a date that may be either', async () => {
    const content = rows(['time,power_W', '03/10/2026 12:00:00,1', '03/10/2026 12:00:10,2', '03/10/2026 12:00:20,3']);
    const asked = await read(content);
    expect(asked).toMatchObject({ ok: false, problem: null });
    expect(asked.description?.questions.map((question) => question.key)).toEqual(['timeFormat']);
    const dayFirst = await readTrace(content, { timeFormat: 'day-first' });
    const monthFirst = await readTrace(content, { timeFormat: 'month-first' });
    expect(dayFirst.trace.timeSeconds[0]).toBe(START);
    expect(monthFirst.trace.timeSeconds[0]).toBe(Date.parse('2026-03-10T11:00:00Z') / 1000);
  });

  it('asks which of several power columns, and leaves the one that was chosen', async () => {
    const content = rows(['time,fridge_W,tv_W', '2026-10-03T10:00:00Z,1,9', '2026-10-03T10:00:10Z,2,8']);
    expect((await read(content)).description?.questions[0]).toMatchObject({ key: 'valueColumn' });
    expect([...(await readTrace(content, { valueColumn: 2 })).trace.values]).toEqual([9, 8]);
  });

  it('asks for the voltage of amperes, and calls the product apparent power', async () => {
    const content = rows(['time,current_A', '2026-10-03T10:00:00Z,0.5', '2026-10-03T10:00:10Z,1']);
    expect((await read(content)).description?.questions[0]).toMatchObject({ key: 'volts' });
    const { trace } = await readTrace(content, { volts: 230 });
    expect(trace).toMatchObject({ powerKind: 'apparent' });
    expect([...trace.values]).toEqual([115, 230]);
  });
});

describe('readings are never changed', () => {
  it('keeps a counter from its first value on, and joins what a reset parts', async () => {
    const content = rows([
      'time,energy_kWh',
      '2026-10-03T10:00:00Z,5',
      '2026-10-03T11:00:00Z,5.2',
      '2026-10-03T12:00:00Z,0.1',
      '2026-10-03T13:00:00Z,0.3',
    ]);
    const { trace, description } = await readTrace(content, { kind: 'counter' });
    expect([...trace.values].map(Math.round)).toEqual([0, 200, 300, 500]);
    expect(description.resets).toBe(1);
  });

  it('keeps negative readings and says so; turns every sign when asked', async () => {
    const content = rows(['time,power_W', '2026-10-03T10:00:00Z,-40', '2026-10-03T10:00:10Z,-41']);
    const kept = await readTrace(content);
    expect([...kept.trace.values]).toEqual([-40, -41]);
    expect(kept.description.warnings.map((warning) => warning.message).join()).toMatch(/negative/);
    expect([...(await readTrace(content, { turnSign: true })).trace.values]).toEqual([40, 41]);
  });

  it('leaves out codes for “no reading”, and keeps a zero a zero', async () => {
    const lines = ['0', 'NaN', '', '-', 'N/A', '5', '0'].map((cell, i) => `2026-10-03T10:00:0${i}Z,${cell}`);
    const { trace, description } = await readTrace(rows(['time,power_W', ...lines]));
    expect([...trace.values]).toEqual([0, 5, 0]);
    expect(description.missing.count).toBe(4);
  });

  it('averages readings at one time, and sorts a row that is out of order, with their numbers', async () => {
    const content = rows([
      'time,power_W',
      '2026-10-03T10:00:00Z,1',
      '2026-10-03T10:00:00Z,3',
      '2026-10-03T10:00:20Z,5',
      '2026-10-03T10:00:10Z,4',
      '2026-10-03T10:00:30Z,6',
    ]);
    const { trace, description } = await readTrace(content);
    expect([...trace.values]).toEqual([2, 4, 5, 6]);
    expect(description).toMatchObject({ averagedDuplicates: 1, sortedRows: 1 });
  });

  it('knows the hour that comes twice when summer time ends', async () => {
    const lines = ['02:30:00', '02:45:00', '02:00:00', '02:15:00', '02:30:00', '03:00:00'].map(
      (clock) => `2026-10-25 ${clock},1`,
    );
    const { trace } = await readTrace(rows(['time,power_W', ...lines]));
    const steps = [...trace.timeSeconds].slice(1).map((time, i) => time - (trace.timeSeconds[i] ?? 0));
    expect(steps).toEqual([900, 900, 900, 900, 1800]);
  });

  it('gives the same trace whatever the unit it was written in', async () => {
    await fc.assert(
      fc.asyncProperty(
        fc.array(fc.integer({ min: 0, max: 900_000 }), { minLength: 2, maxLength: 40 }),
        async (milliwatts) => {
          const write = (unit: string, digits: number) =>
            rows([
              `time,power_${unit}`,
              ...milliwatts.map(
                (mw, i) => `${new Date((START + i) * 1000).toISOString()},${(mw / 10 ** digits).toFixed(digits)}`,
              ),
            ]);
          const inWatts = (await readTrace(write('W', 3))).trace.values;
          const inKilowatts = (await readTrace(write('kW', 6))).trace.values;
          inWatts.forEach((watts, i) => expect(inKilowatts[i]).toBeCloseTo(watts, 9));
        },
      ),
      { numRuns: 30 },
    );
  });
});

describe('a file that is no log ends in a clear problem', () => {
  it.each([
    ['empty', '', 'empty'],
    ['blank lines', '\n\n\n', 'empty'],
    ['prose', 'dear diary\nnothing happened\n', 'no-value'],
    ['no times beside the numbers', rows(['power_W,room', '40,20', '41,20', '42,21']), 'no-time'],
    ['one reading', rows(['time,power_W', '2026-10-03T10:00:00Z,40']), 'too-few-readings'],
    ['NUL bytes', 'time,power_W\n2026-10-03T10:00:00Z,\u00001\n', 'not-text'],
    ['one endless line', 'x'.repeat(3_000_000), 'line-too-long'],
    ['a thousand columns', rows(['1,'.repeat(1000), '2,'.repeat(1000)]), 'too-many-columns'],
  ])('%s', async (_name, content, code) => {
    const result = await read(content);
    expect(result).toMatchObject({ ok: false, problem: { code } });
    expect(result.ok === false && result.problem?.message).toMatch(/\.$/);
  });

  it('names unreadable rows by line, and stops where more than one in a hundred is', async () => {
    const lines = Array.from({ length: 300 }, (_, i) => `${new Date((START + i) * 1000).toISOString()},${i}`);
    lines[41] = '2026-10-03T10:00:41Z,forty';
    const few = await readTrace(rows(['time,power_W', ...lines]));
    expect(few.description.unreadable).toMatchObject({ count: 1, lines: [{ line: 43 }] });
    for (let i = 100; i < 110; i += 1) lines[i] = 'noise,noise';
    expect(await read(rows(['time,power_W', ...lines]))).toMatchObject({
      problem: { code: 'unreadable-rows', line: 43 },
    });
  });

  it('stops at the largest size while it streams', async () => {
    const result = await importTrace(chunks(new Uint8Array(2_000_000).fill(48), 1000), {
      zone: 'UTC',
      mostBytes: 10_000,
    });
    expect(result).toMatchObject({ ok: false, problem: { code: 'too-large' } });
  });
});
