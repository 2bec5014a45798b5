import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { publishDeviceFigure } from '@/lib/measurement/aggregation/publish-device';
import { receiptText } from '@/lib/measurement/aggregation/receipt';
import { RULE_VERSION } from '@/lib/measurement/rule-version';
import { median } from '@/lib/measurement/statistics/median';
import { figure, figures, published } from './figures';

const settings = { unitSpread: 0.05, categoryMedian: null };

describe('a device’s published figure', () => {
  it('of one figure is that figure: one unit, with its uncertainty and the spread of units', () => {
    const only = figure({ figureId: 'f1', contributorId: 'ina', value: 43, standardUncertainty: 0.5 });
    expect(publishDeviceFigure([only], settings)).toEqual({
      n: 1,
      median: 43,
      medianLow: 43,
      minimum: 43,
      maximum: 43,
      lowerQuartile: null,
      upperQuartile: null,
      interval: null,
      tenthPercentile: null,
      ninetiethPercentile: null,
      atMost: false,
      atMostOf: [],
      standardUncertainty: Math.sqrt(0.5 ** 2 + (0.05 * 43) ** 2),
      degreesOfFreedom: 4,
      flagged: 0,
      setAside: 0,
      counts: { devices: 1, contributors: 1, instruments: 1, reports: 1 },
      voices: [{ voiceId: 'ina', value: 43, censored: false, flagged: false }],
      inputs: [{ figureId: 'f1', voiceId: 'ina', value: 43, counted: true, flagged: false, reason: null }],
      ruleVersion: RULE_VERSION,
    });
  });

  it('of no figures is none, nor where all are set aside', () => {
    expect(publishDeviceFigure([], settings)).toBeNull();
    expect(publishDeviceFigure([figure({ setAside: { reason: 'wrong mode' } })], settings)).toBeNull();
  });

  it('counts a contributor once, by the median of their reports', () => {
    const ina = [40, 41, 90].map((value) => figure({ contributorId: 'ina', value, instrumentModel: 'alpha' }));
    const result = published([...ina, figure({ contributorId: 'orla', value: 50, instrumentModel: 'alpha' })]);
    expect(result).toMatchObject({ n: 2, median: 45.5, minimum: 41, maximum: 50 });
    expect(result.counts).toEqual({ devices: 1, contributors: 2, instruments: 1, reports: 4 });
  });

  it('counts the accounts of a household as contributors, but as one voice', () => {
    const result = published([
      figure({ householdId: 'mill', value: 40 }),
      figure({ householdId: 'mill', value: 44 }),
      figure({ value: 60 }),
    ]);
    expect(result).toMatchObject({ n: 2, median: 51, counts: { contributors: 3 } });
  });

  it('lists a figure that was set aside with its reason, under its contributor’s voice, and does not count it', () => {
    const kept = figure({ contributorId: 'ina', householdId: 'mill', value: 40 });
    const other = figure({ contributorId: 'orla', householdId: 'mill', value: 42 });
    const dropped = figure({ contributorId: 'orla', value: 400, setAside: { reason: 'measured two devices' } });
    const lone = figure({ contributorId: 'tam', value: 90, censoredAt: 95, setAside: { reason: 'no photo' } });
    const result = published([dropped, other, kept, lone]);
    expect(result).toMatchObject({ n: 1, median: 41, setAside: 2, counts: { contributors: 2, reports: 2 } });
    expect(result.inputs.map(({ figureId, ...rest }) => [figureId, rest])).toEqual([
      [kept.figureId, { voiceId: 'ina', value: 40, counted: true, flagged: false, reason: null }],
      [other.figureId, { voiceId: 'ina', value: 42, counted: true, flagged: false, reason: null }],
      [
        dropped.figureId,
        { voiceId: 'ina', value: 400, counted: false, flagged: false, reason: 'Set aside: measured two devices' },
      ],
      [lone.figureId, { voiceId: 'tam', value: 95, counted: false, flagged: false, reason: 'Set aside: no photo' }],
    ]);
  });

  it('does not let a figure that was set aside tie two voices together', () => {
    const result = published([
      figure({ contributorId: 'ina', unitId: '7', setAside: { reason: 'another unit' } }),
      figure({ contributorId: 'ina', unitId: '8' }),
      figure({ contributorId: 'orla', unitId: '7' }),
    ]);
    expect(result.n).toBe(2);
  });

  it('lets a report’s latest verified revision count alone, and says so of the earlier one', () => {
    const earlier = figure({ figureId: 'a', reportId: 'r', revisionId: '9', contributorId: 'ina', value: 30 });
    const later = figure({ figureId: 'b', reportId: 'r', revisionId: '10', contributorId: 'ina', value: 43 });
    const result = published([later, earlier]);
    expect(result).toMatchObject({ n: 1, median: 43, setAside: 0, counts: { reports: 1 } });
    expect(result.inputs[0]).toEqual({
      figureId: 'a',
      voiceId: 'ina',
      value: 30,
      counted: false,
      flagged: false,
      reason: 'A later revision of this report counts.',
    });
  });

  it('lets no earlier revision speak in place of a latest one that was set aside', () => {
    const earlier = figure({ reportId: 'r', revisionId: '9' });
    const later = figure({ reportId: 'r', revisionId: '10', setAside: { reason: 'wrong mode' } });
    expect(publishDeviceFigure([earlier, later], settings)).toBeNull();
  });

  it('flags a voice and each of its figures, and still counts it', () => {
    const odd = figure({ contributorId: 'zeno', value: 430 });
    const result = published([...figures(40, 41, 42, 43), odd]);
    expect(result).toMatchObject({ n: 5, maximum: 430, flagged: 1, setAside: 0 });
    expect(result.voices.filter((voice) => voice.flagged).map((voice) => voice.voiceId)).toEqual(['zeno']);
    expect(result.inputs.filter((input) => input.flagged).map((input) => input.figureId)).toEqual([odd.figureId]);
    expect(result.inputs.every((input) => input.counted)).toBe(true);
  });

  it('flags a lone figure against its category', () => {
    expect(published([figure({ value: 43 })], 8)).toMatchObject({ n: 1, flagged: 1 });
    expect(published([figure({ value: 43 })], 9)).toMatchObject({ flagged: 0 });
  });

  it('has no 10th and 90th percentile, however many voices', () => {
    expect(published(figures(...Array.from({ length: 12 }, (_, i) => 40 + i)))).toMatchObject({
      n: 12,
      tenthPercentile: null,
      ninetiethPercentile: null,
    });
  });

  it('throws where the figures are of two devices, and where a value is NaN', () => {
    const message = 'A device’s figure pools figures of that device alone.';
    expect(() => published([figure(), figure({ deviceId: 'other' })])).toThrow(new RangeError(message));
    expect(() => published([figure({ value: Number.NaN })])).toThrow(RangeError);
  });
});

describe('figures below an instrument’s limit', () => {
  it('are neither zero nor the limit: the median is "at most"', () => {
    const result = published([figure({ value: 0.2, censoredAt: 0.5 })]);
    expect(result).toMatchObject({ median: 0.5, medianLow: 0, atMost: true });
    expect(result.voices).toMatchObject([{ value: 0.5, censored: true, flagged: false }]);
  });

  it('leave nothing open where they can’t move the median, of a voice or of the device', () => {
    const ina = [0.4, 0.6, 0.7].map((value, i) =>
      figure({ contributorId: 'ina', value, censoredAt: i === 0 ? 0.5 : null }),
    );
    const result = published(ina);
    expect(result).toMatchObject({ median: 0.6, medianLow: 0.6, atMost: false, atMostOf: [] });
    expect(result.voices).toMatchObject([{ value: 0.6, censored: false }]);
  });

  it('state the larger of the two uncertainties', () => {
    const low = published([figure({ value: 0, standardUncertainty: 0 }), ...zeroU(2, 2)]).standardUncertainty;
    const high = published(zeroU(1, 2, 2)).standardUncertainty;
    const open = published([figure({ value: 0.3, censoredAt: 1, standardUncertainty: 0 }), ...zeroU(2, 2)]);
    expect(low).toBeGreaterThan(high ?? 0);
    expect(open.standardUncertainty).toBe(low);
    const wide = published([figure({ value: 0.3, censoredAt: 9, standardUncertainty: 0 }), ...zeroU(2, 2)]);
    expect(wide.standardUncertainty).toBe(published(zeroU(9, 2, 2)).standardUncertainty);
  });

  function zeroU(...values: number[]) {
    return values.map((value) => figure({ value, standardUncertainty: 0 }));
  }
});

const anyFigure = fc.record({
  contributorId: fc.constantFrom('a', 'b', 'c', 'd', 'e', 'f', 'g'),
  householdId: fc.option(fc.constantFrom('x', 'y'), { freq: 1, nil: null }),
  unitId: fc.option(fc.constantFrom('1', '2', '3'), { freq: 1, nil: null }),
  reportId: fc.constantFrom('r1', 'r2', 'r3', 'r4', 'r5', 'r6', 'r7', 'r8'),
  revisionId: fc.constantFrom('9', '10'),
  instrumentModel: fc.constantFrom('alpha', 'beta'),
  value: fc.double({ min: 0.01, max: 1000, noNaN: true }),
  standardUncertainty: fc.double({ min: 0, max: 5, noNaN: true }),
  censoredAt: fc.option(fc.double({ min: 0.01, max: 1000, noNaN: true }), { freq: 1, nil: null }),
  setAside: fc.option(fc.constant({ reason: 'wrong mode' }), { freq: 1, nil: null }),
});
const scope = {
  kind: 'device',
  id: '7',
  pool: { variantId: null, modeId: 5, quantity: 'mean-power', powerKind: 'real', supplyStratum: 'ac-230' },
} as const;

describe('whatever the figures', () => {
  it('their order changes nothing, to the last digit', () => {
    fc.assert(
      fc.property(fc.array(anyFigure, { minLength: 1, maxLength: 20 }), fc.infiniteStream(fc.nat()), (list, dice) => {
        const input = list.map((traits) => figure(traits));
        const shuffled = input
          .map((item) => ({ item, rank: dice.next().value as number }))
          .sort((a, b) => a.rank - b.rank)
          .map(({ item }) => item);
        const [one, other] = [input, shuffled].map((order) => publishDeviceFigure(order, settings));
        expect(other).toEqual(one);
        if (one && other) expect(receiptText(scope, other)).toBe(receiptText(scope, one));
      }),
    );
  });

  it('every one is listed once, and those that count are those of the voices', () => {
    fc.assert(
      fc.property(fc.array(anyFigure, { minLength: 1, maxLength: 20 }), (list) => {
        const input = list.map((traits) => figure(traits));
        const result = publishDeviceFigure(input, settings);
        if (!result) return;
        expect(result.inputs.map((item) => item.figureId)).toEqual(input.map((item) => item.figureId).sort());
        expect(result.voices).toHaveLength(result.n);
        expect(new Set(result.inputs.filter((item) => item.counted).map((item) => item.voiceId)).size).toBe(result.n);
        expect(result.inputs.every((item) => item.counted === (item.reason === null))).toBe(true);
      }),
    );
  });

  it('a contributor’s tenth report never moves the median by more than their one voice', () => {
    const watts = fc.double({ min: 0.1, max: 5000, noNaN: true });
    fc.assert(
      fc.property(
        fc.array(watts, { minLength: 1, maxLength: 12 }),
        fc.array(watts, { minLength: 9, maxLength: 9 }),
        watts,
        (others, nine, tenth) => {
          const crowd = figures(...others);
          const own = nine.map((value) => figure({ contributorId: 'ina', value }));
          const before = published([...crowd, ...own]);
          const after = published([...crowd, ...own, figure({ contributorId: 'ina', value: tenth })]);
          expect(after.n).toBe(before.n);
          const voiceOf = (result: typeof after) => result.voices.find((voice) => voice.voiceId === 'ina')?.value ?? 0;
          expect(after.median).toBe(median([...others, voiceOf(after)]));
          expect(before.median).toBe(median([...others, voiceOf(before)]));
          expect(Math.abs(after.median - before.median)).toBeLessThanOrEqual(
            Math.abs(voiceOf(after) - voiceOf(before)) * (1 + 1e-12) + 1e-9,
          );
        },
      ),
    );
  });
});
