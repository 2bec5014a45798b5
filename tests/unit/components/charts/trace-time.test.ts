import { describe, expect, test } from 'vitest';
import { moment, roundStep, stepWords, tickLabel, timeTicks } from '@/components/charts/trace-time';

const at = (text: string) => Date.parse(text) / 1000;
const oslo = { zone: 'Europe/Oslo', start: at('2026-10-14T10:00:00Z') };
const elapsed = { zone: null, start: 500 };

describe('by the clock of a zone', () => {
  test('a moment is told in that zone, not in the reader’s or the server’s', () => {
    expect(moment(at('2026-10-14T10:05:09Z'), oslo, false)).toBe('14 Oct 12:05');
    expect(moment(at('2026-10-14T10:05:09Z'), oslo, true)).toBe('14 Oct 12:05:09');
  });

  test('the hour after clocks went back is told by winter time (Europe/Oslo, 25 October 2026 at 01:00 UTC, from memory)', () => {
    expect(moment(at('2026-10-25T00:30:00Z'), oslo, false)).toBe('25 Oct 02:30');
    expect(moment(at('2026-10-25T01:30:00Z'), oslo, false)).toBe('25 Oct 02:30');
    expect(moment(at('2026-10-25T02:30:00Z'), oslo, false)).toBe('25 Oct 03:30');
  });

  test('a zone with a quarter of an hour in its offset (Pacific/Chatham, UTC+13:45 in December, from memory)', () => {
    const chatham = { zone: 'Pacific/Chatham', start: 0 };
    expect(moment(at('2026-12-01T00:00:00Z'), chatham, false)).toBe('1 Dec 13:45');
  });

  test('ticks stand at round local times, and midnight is named by its day', () => {
    const { at: ticks, step } = timeTicks(at('2026-10-14T10:00:00Z'), at('2026-10-15T10:00:00Z'), 5, oslo);
    expect(ticks.map((tick) => tickLabel(tick, step, oslo))).toEqual(['12:00', '18:00', '15 Oct', '06:00', '12:00']);
  });
});

describe('since the start', () => {
  test('times begin at zero and count days', () => {
    expect(moment(500, elapsed, false)).toBe('00:00');
    expect(moment(500 + 90_061, elapsed, true)).toBe('1 d 01:01:01');
    expect(tickLabel(500 + 172_800, 86_400, elapsed)).toBe('2 d');
  });

  test('ticks are round lengths of time from the start', () => {
    expect(timeTicks(500, 500 + 3600, 4, elapsed)).toEqual({ at: [500, 1400, 2300, 3200, 4100], step: 900 });
  });
});

test('a step is round and no more of them fit than asked for', () => {
  expect(roundStep(3600, 60)).toBe(60);
  expect(roundStep(3601, 60)).toBe(120);
  expect([5, 60, 7200, 172_800].map(stepWords)).toEqual(['5 s', '1 min', '2 h', '2 d']);
});
