import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { publishCategoryFigure, type DeviceFigure } from '@/lib/measurement/aggregation/publish-category';
import type { PublishedFigure } from '@/lib/measurement/aggregation/types';
import { RULE_VERSION } from '@/lib/measurement/rule-version';
import { quantileType7, sortedCopy } from '@/lib/measurement/statistics/quantile-type-7';

const counts = { devices: 2, contributors: 3, instruments: 2, reports: 5 };
const device = (deviceId: string, median: number, traits: Partial<DeviceFigure> = {}): DeviceFigure => ({
  deviceId,
  median,
  medianLow: median,
  setAside: 0,
  ...traits,
});
const pile = (...medians: number[]) => medians.map((median, i) => device(`d${i + 10}`, median));

function published(devices: readonly DeviceFigure[]): PublishedFigure {
  const result = publishCategoryFigure(devices, counts);
  if (!result) throw new Error('There is no device.');
  return result;
}

describe('a category’s published figure', () => {
  it('has one voice a device, with the counts behind them and no uncertainty of its own', () => {
    expect(published([device('b', 12, { setAside: 1 }), device('a', 8, { setAside: 2 })])).toEqual({
      n: 2,
      median: 10,
      medianLow: 10,
      minimum: 8,
      maximum: 12,
      lowerQuartile: null,
      upperQuartile: null,
      interval: null,
      tenthPercentile: null,
      ninetiethPercentile: null,
      atMost: false,
      atMostOf: [],
      standardUncertainty: null,
      degreesOfFreedom: null,
      flagged: 0,
      setAside: 3,
      counts,
      voices: [
        { voiceId: 'a', value: 8, censored: false, flagged: false },
        { voiceId: 'b', value: 12, censored: false, flagged: false },
      ],
      inputs: [
        { figureId: 'a', voiceId: 'a', value: 8, counted: true, flagged: false, reason: null },
        { figureId: 'b', voiceId: 'b', value: 12, counted: true, flagged: false, reason: null },
      ],
      ruleVersion: RULE_VERSION,
    });
  });

  it('of no device is none; of one it is that device’s', () => {
    expect(publishCategoryFigure([], counts)).toBeNull();
    expect(published(pile(8))).toMatchObject({ n: 1, median: 8, flagged: 0 });
  });

  it('has the 10th and 90th percentile from ten devices', () => {
    expect(published(pile(1, 2, 3, 4, 5, 6, 7, 8, 9))).toMatchObject({ tenthPercentile: null });
    const ten = published(pile(1, 2, 3, 4, 5, 6, 7, 8, 9, 10));
    expect(ten).toMatchObject({ tenthPercentile: 1.9, ninetiethPercentile: 9.1, interval: { low: 2, high: 9 } });
  });

  it('reads a device that is "at most" something at 0 and at its limit', () => {
    const result = published([device('a', 2, { medianLow: 0 }), device('b', 6)]);
    expect(result).toMatchObject({ median: 4, medianLow: 3, atMost: true, minimum: 2, maximum: 6 });
    expect(result.voices[0]).toEqual({ voiceId: 'a', value: 2, censored: true, flagged: false });
  });

  it('flags a device more than a factor of five from the median, and by its score from five devices', () => {
    expect(published(pile(10, 10, 51)).voices.map((voice) => voice.flagged)).toEqual([false, false, true]);
    expect(published(pile(10, 10, 50)).flagged).toBe(0);
    const byScore = published(pile(10, 10, 10, 10, 15));
    expect(byScore).toMatchObject({ flagged: 1 });
    expect(byScore.inputs.map((input) => input.flagged)).toEqual([false, false, false, false, true]);
  });

  it('throws where a device comes twice', () => {
    expect(() => published([device('a', 1), device('b', 2), device('a', 3)])).toThrow(
      new RangeError('A device has one voice in its category.'),
    );
  });

  it('does not depend on the order of the devices, and has the quantiles of their medians', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: 0.1, max: 3000, noNaN: true }), { minLength: 1 }), (medians) => {
        const devices = pile(...medians);
        const result = published(devices);
        expect(published([...devices].reverse())).toEqual(result);
        expect(result.median).toBe(quantileType7(sortedCopy(medians), 0.5));
        expect(result.maximum).toBe(Math.max(...medians));
      }),
    );
  });
});
