import { describe, expect, it } from 'vitest';
import { compareSets, type ContrastInput } from '@/lib/measurement/contrast/compare-sets';
import { testInterleaving } from '@/lib/measurement/contrast/interleaving';
import { welchDifference } from '@/lib/measurement/contrast/welch';
import fromR from '@/tests/reference/change-points.json';

/** Stretches of an hour each, at these places in a row of hours. */
const at = (...hours: number[]) => hours.map((hour) => ({ fromSeconds: hour * 3600, toSeconds: (hour + 1) * 3600 }));

const sets = (first: number[], second: number[], more: Partial<ContrastInput> = {}): ContrastInput => ({
  first: {
    name: 'rain',
    stretches: at(0, 2, 4, 6, 8)
      .slice(0, first.length)
      .map((s, i) => ({ ...s, meanWatts: first[i]! })),
  },
  second: {
    name: 'dry',
    stretches: at(1, 3, 5, 7, 9)
      .slice(0, second.length)
      .map((s, i) => ({ ...s, meanWatts: second[i]! })),
  },
  sameInstrument: true,
  percentOfReading: 0,
  stepWatts: 0,
  averagingSeconds: 0,
  unit: 'W',
  ...more,
});

describe('difference of two sets', () => {
  it.each(fromR.welch.map((entry, i) => [i, entry] as const))(
    'agrees with R’s t.test on pair %i (change-points.R)',
    (_, entry) => {
      const found = welchDifference(entry.first, entry.second, 0);
      expect(found.standardError).toBeCloseTo(entry.error, 9);
      expect(found.degreesOfFreedom).toBeCloseTo(entry.df, 9);
      expect([found.interval.low, found.interval.high]).toEqual(entry.interval.map((end) => expect.closeTo(end, 7)));
    },
  );

  it('has the example of its docstring', () => {
    expect(welchDifference([10, 11, 12], [7, 8, 9], 0)).toMatchObject({
      difference: 3,
      degreesOfFreedom: expect.closeTo(4, 12),
    });
  });

  it('never is surer than the logger’s step', () => {
    const found = welchDifference([5, 5, 5], [6, 6, 6], 1);
    expect(found.standardError).toBeCloseTo(Math.sqrt(2 / 3 / 12), 12);
    expect(found.degreesOfFreedom).toBe(4);
  });

  it('says larger, with its interval and what the gain leaves', () => {
    const contrast = compareSets(sets([50, 51, 52], [40, 41, 42], { percentOfReading: 1 }));
    expect(contrast).toMatchObject({ outcome: 'larger', difference: 10, gainRemainder: 0.1, reason: null });
    expect(contrast.interval).toEqual({ low: expect.closeTo(7.7331, 3), high: expect.closeTo(12.2669, 3) });
    expect(contrast.sentence).toBe(
      'rain drew 10.0 W more than dry (95 % interval 7.7–12.3 W; the instrument’s gain leaves 0.100 W open). The readings are instants.',
    );
  });

  it('says smaller, and over what the readings average', () => {
    const contrast = compareSets(sets([40, 41, 42], [50, 51, 52], { averagingSeconds: 3600 }));
    expect(contrast.outcome).toBe('smaller');
    expect(contrast.sentence).toBe(
      'rain drew 10.0 W less than dry (95 % interval 7.7–12.3 W). The readings average over 1 h: what is shorter is hidden in them.',
    );
  });

  it('says how large a difference could still hide, where none is shown', () => {
    const contrast = compareSets(sets([40, 44, 42], [41, 43, 45]));
    expect(contrast.outcome).toBe('no-difference-shown');
    expect(contrast.atMost).toBe(Math.max(-contrast.interval!.low, contrast.interval!.high));
    expect(contrast.sentence).toMatch(/^No difference larger than 5\.53 W shown between rain and dry\./);
  });

  it.each([
    ['fewer than three stretches', sets([50, 51], [40, 41, 42]), 'three stretches'],
    ['two instruments', sets([50, 51, 52], [40, 41, 42], { sameInstrument: false }), 'one instrument'],
  ])('does not show the cause with %s', (_, input, reason) => {
    const contrast = compareSets(input);
    expect(contrast).toMatchObject({ outcome: 'cause-not-shown', interval: null, atMost: null });
    expect(contrast.sentence).toMatch(
      /^rain and dry differed by \d+(\.\d+)? W in these stretches; the cause is not shown\./,
    );
    expect(contrast.reason).toContain(reason);
  });

  it('does not show the cause of one set after the other', () => {
    const input = sets([50, 51, 52], [40, 41, 42]);
    const after = { ...input.second, stretches: at(10, 11, 12).map((s) => ({ ...s, meanWatts: 40 })) };
    expect(compareSets({ ...input, second: after })).toMatchObject({ outcome: 'cause-not-shown', difference: 11 });
  });
});

describe('interleaving', () => {
  it.each([
    ['in turn', [0, 2, 4], [1, 3, 5], true],
    ['in turn but for one pair', [0, 1, 4], [2, 3, 5], true],
    ['one after the other', [0, 1, 2], [3, 4, 5], false],
    ['one around the other', [0, 1, 5], [2, 3, 4], false],
    ['many beside few, few changes', [0, 1, 2, 3, 4, 6], [5, 7, 8], true],
    ['a pair', [0], [1], false],
  ])('%s: %j and %j', (_, first, second, interleaved) => {
    expect(testInterleaving(at(...first), at(...second)).interleaved).toBe(interleaved);
  });

  it('refuses stretches that overlap', () => {
    const found = testInterleaving(at(0, 2, 4), [{ fromSeconds: 1800, toSeconds: 5400 }, ...at(3, 5)]);
    expect(found).toEqual({ interleaved: false, reason: 'Two of the stretches overlap.' });
  });
});
