import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { moveClock } from '@/lib/platform/clock';
import { refillBuckets, takeToken } from '@/lib/platform/rate-limit';

const limit = { name: 'test', atOnce: 3, perMinute: 6 };
const taken = (who: string) => {
  try {
    takeToken(limit, who);
    return true;
  } catch {
    return false;
  }
};

beforeEach(() => {
  refillBuckets();
  moveClock(0);
});
afterEach(() => moveClock(0));

describe('a token bucket', () => {
  it('gives so many at once, then says how long to wait', () => {
    expect([taken('a'), taken('a'), taken('a'), taken('a')]).toEqual([true, true, true, false]);
    expect(() => takeToken(limit, 'a')).toThrow(/Try again in \d+ seconds/);
  });

  it('keeps each key apart', () => {
    for (let i = 0; i < 4; i += 1) taken('a');
    expect(taken('b')).toBe(true);
  });

  it('fills up with time, never beyond its size, and loses nothing to a clock that is set back', () => {
    for (let i = 0; i < 3; i += 1) taken('a');
    moveClock(10);
    expect([taken('a'), taken('a')]).toEqual([true, false]);
    moveClock(3600);
    expect([taken('a'), taken('a'), taken('a'), taken('a')]).toEqual([true, true, true, false]);
    refillBuckets();
    taken('c');
    moveClock(0);
    expect(taken('c')).toBe(true);
  });
});
