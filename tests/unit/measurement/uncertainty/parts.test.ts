import { describe, expect, it } from 'vitest';
import { belowLimitUncertainty, betweenLimits, shareBelowLimit } from '@/lib/measurement/uncertainty/below-limit';
import { combineParts, scaleParts } from '@/lib/measurement/uncertainty/combine';
import { sumOfTerms, type UncertainValue } from '@/lib/measurement/uncertainty/combined-sum';
import { differenceByOneInstrument } from '@/lib/measurement/uncertainty/difference';
import { driftUncertainty } from '@/lib/measurement/uncertainty/drift';
import {
  cyclicRepeatability,
  repeatedReadings,
  spotRepeatability,
  steadyRepeatability,
} from '@/lib/measurement/uncertainty/repeatability';
import { instrumentUncertainty, resolutionUncertainty } from '@/lib/measurement/uncertainty/stated-accuracy';
import { counterStepUncertainty, meanResolution, powerKindOf } from '@/lib/measurement/uncertainty/trace-stretch';
import fromNumpy from '@/tests/reference/figures.json';
import { check } from '../reference';
import { evenTrace, levels } from '../traces/build-trace';
import { accuracyOf } from './accuracy';

const none = { gain: 0, offset: 0, resolution: 0, repeatability: 0, drift: 0, belowLimit: 0 };

describe('stated accuracy', () => {
  it.each(['dmm.kpu.32V', 'dmm.kpu.0.09V'])(
    'has the half-width that a university’s meter tutorial prints: %s',
    (id) => {
      const { inputs, expected } = check(id) as unknown as {
        inputs: { reading: number; pct: number; counts: number; lsd: number };
        expected: number;
      };
      const accuracy = accuracyOf({ percentOfReading: inputs.pct, counts: inputs.counts, resolutionWatts: inputs.lsd });
      const { gain, offset } = instrumentUncertainty(accuracy, inputs.reading);
      expect((gain + offset) * Math.sqrt(3)).toBeCloseTo(expected, 12);
      expect(gain + offset).toBeCloseTo(
        check(id === 'dmm.kpu.32V' ? 'dmm.u.32.0' : 'dmm.u.0.09').expected as number,
        12,
      );
    },
  );

  it('divides a rectangular half-width by √3 (JCGM 100:2008, 4.3.7)', () => {
    expect(instrumentUncertainty(accuracyOf({ percentOfReading: 1 }), 100).gain).toBeCloseTo(
      check('gum.rect.half').expected as number,
      15,
    );
  });

  it('counts the percent of the range whatever the reading, and a negative reading by its size', () => {
    const accuracy = accuracyOf({ percentOfReading: 2, percentOfRange: 0.5, rangeWatts: 1000 });
    const { gain, offset } = instrumentUncertainty(accuracy, -50);
    expect([gain * Math.sqrt(3), offset * Math.sqrt(3)]).toEqual([expect.closeTo(1, 12), expect.closeTo(5, 12)]);
  });

  it('takes half the least digit as the half-width of a reading: q/√12 (metrology slides)', () => {
    const { expected } = check('resolution.half_lsd');
    expect(resolutionUncertainty(0.1, accuracyOf())).toBeCloseTo((expected as number) / Math.sqrt(3), 15);
  });

  it('holds the display’s step in stated counts, but not a logger’s coarser one', () => {
    const accuracy = accuracyOf({ counts: 3, resolutionWatts: 0.1 });
    expect(resolutionUncertainty(0.1, accuracy)).toBe(0);
    expect(resolutionUncertainty(1, accuracy)).toBeCloseTo(1 / Math.sqrt(12), 15);
  });
});

describe('steps of a trace', () => {
  it('leaves q/√6 in a counter’s energy, for each stretch has two ends', () => {
    expect(counterStepUncertainty(1)).toBeCloseTo(0.408248, 6);
    const trace = evenTrace('counter', 60, [0, 1, 2], { step: 1 });
    expect(meanResolution(trace, accuracyOf(), 3600, 1)).toBeCloseTo(1 / Math.sqrt(6), 12);
    expect(meanResolution(trace, accuracyOf(), 7200, 2)).toBeCloseTo(Math.sqrt(2) / Math.sqrt(6) / 2, 12);
  });

  it('takes the coarser of the logger’s and the display’s step for samples, its own for averages', () => {
    const accuracy = accuracyOf({ resolutionWatts: 1 });
    expect(meanResolution(evenTrace('samples', 1, [1, 2]), accuracy, 60, 1)).toBeCloseTo(1 / Math.sqrt(12), 12);
    expect(meanResolution(evenTrace('averages', 1, [1, 2]), accuracy, 60, 1)).toBeCloseTo(0.1 / Math.sqrt(12), 12);
  });

  it('never takes apparent power for real', () => {
    const real = evenTrace('samples', 1, [1, 2]);
    expect(powerKindOf(real, { readsTruePower: true })).toBe('real');
    expect(powerKindOf(real, { readsTruePower: false })).toBe('apparent');
    expect(powerKindOf({ ...real, powerKind: 'apparent' }, { readsTruePower: true })).toBe('apparent');
  });
});

describe('repeatability', () => {
  it.each(fromNumpy.repeatability.map((entry, i) => [i, entry] as const))(
    'agrees with numpy on steady series %i: batches of ten, or thirds (figures.py)',
    (_, { values, uncertainty }) => {
      const weights = Float64Array.from(values, () => 2);
      expect(steadyRepeatability(Float64Array.from(values), weights)).toBeCloseTo(uncertainty, 12);
    },
  );

  it('is nothing of a constant, of one value and of none', () => {
    expect(steadyRepeatability(Float64Array.of(10, 10, 10), Float64Array.of(1, 1, 1))).toBe(0);
    expect(steadyRepeatability(Float64Array.of(10), Float64Array.of(1))).toBe(0);
    expect(steadyRepeatability(new Float64Array(0), new Float64Array(0))).toBe(0);
  });

  it('divides by time, not by rows: an hour of one row is a batch like any other', () => {
    const values = Float64Array.from([...levels([10, 30]), 20, 30]);
    const weights = Float64Array.from([...levels([1, 30]), 30, 30]);
    expect(steadyRepeatability(values, weights)).toBeCloseTo(20 / Math.sqrt(12), 12);
  });

  it('of whole cycles is s(E − P·T)/(T̄√n): a longer cycle that draws as much a second is no scatter', () => {
    const steady = [1, 2, 3].map((hours) => ({ wattHours: 28 * hours, seconds: 3600 * hours }));
    expect(cyclicRepeatability(steady)).toBeCloseTo(0, 12);
    const scattered = [27, 28, 29].map((wattHours) => ({ wattHours, seconds: 3600 }));
    expect(cyclicRepeatability(scattered)).toBeCloseTo(1 / Math.sqrt(3), 12);
  });

  it.each([
    [2, 12.7],
    [3, 4.3],
    [5, 2.8],
  ])('of %i repeated readings is widened by Student’s t: %d', (n, t) => {
    const values = Array.from({ length: n }, (_, i) => 40 + i);
    const mean = 40 + (n - 1) / 2;
    const s = Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (n - 1));
    expect((repeatedReadings(values) * 1.96) / (s / Math.sqrt(n))).toBeCloseTo(t, 1);
  });

  it('of repeated readings needs two', () => {
    expect(() => repeatedReadings([40])).toThrow(RangeError);
    expect(repeatedReadings([10, 12])).toBeCloseTo(6.4829, 3);
  });

  it('of a spot reading is (max − min)/√12', () => {
    expect(spotRepeatability([40, 46])).toBeCloseTo(Math.sqrt(3), 12);
  });
});

describe('drift', () => {
  it.each([
    [3599, 1],
    [3600, 0.5],
    [86_399, 0.5],
    [86_400, 0],
  ])('of 50 W recorded over %i s is %d W: 2 % below an hour, 1 % below a day', (seconds, wanted) => {
    expect(driftUncertainty(50, seconds)).toBeCloseTo(wanted, 12);
    expect(driftUncertainty(-50, seconds)).toBeCloseTo(wanted, 12);
  });
});

describe('below the instrument’s lower limit', () => {
  it('counts the share of time, and leaves f L/√3 between y and y + f L', () => {
    const stretch = { trace: evenTrace('averages', 1, levels([0, 50], [50, 50])), fromSeconds: 0, toSeconds: 99 };
    expect(shareBelowLimit([stretch], 1)).toBe(0.5);
    expect(shareBelowLimit([stretch], 0)).toBe(0);
    expect(shareBelowLimit([{ ...stretch, fromSeconds: 500, toSeconds: 600 }], 1)).toBe(0);
    const belowLimit = belowLimitUncertainty(0.5, 1);
    expect(belowLimit).toBeCloseTo(0.5 / Math.sqrt(3), 15);
    expect(betweenLimits({ value: 25, parts: { ...none, belowLimit } })).toEqual({
      low: 25,
      high: expect.closeTo(25.5, 12),
    });
    expect(betweenLimits({ value: 25, parts: none })).toBeNull();
  });
});

describe('parts together', () => {
  it('adds by root sum of squares, gain and offset of one instrument linearly', () => {
    expect(combineParts({ ...none, gain: 0.3, offset: 0.1, repeatability: 0.3 })).toBeCloseTo(0.5, 12);
    expect(combineParts({ ...none, resolution: 2, drift: 3, belowLimit: 6 })).toBeCloseTo(7, 12);
  });

  it('scales every part', () => {
    const ones = { gain: 1, offset: 1, resolution: 1, repeatability: 1, drift: 1, belowLimit: 1 };
    expect(Object.values(scaleParts(ones, 24))).toEqual([24, 24, 24, 24, 24, 24]);
  });
});

describe('sums and differences', () => {
  const line = (value: number, u: number, more: Partial<UncertainValue> = {}): UncertainValue => ({
    value,
    standardUncertainty: u,
    systematic: null,
    figureKey: null,
    instrumentKey: null,
    ...more,
  });
  const sum = (...lines: UncertainValue[]) => sumOfTerms(lines.map((of) => ({ of, factor: 1 })));

  it('adds different instruments by squares: 3 and 4 are 5', () => {
    expect(sum(line(10, 3, { instrumentKey: 'a' }), line(20, 4, { instrumentKey: 'b' }))).toEqual({
      value: 30,
      standardUncertainty: 5,
    });
  });

  it('adds one instrument’s lines linearly: 3 and 4 are 7', () => {
    expect(sum(line(10, 3, { instrumentKey: 'a' }), line(20, 4, { instrumentKey: 'a' })).standardUncertainty).toBe(7);
  });

  it('adds only the shared part linearly where that is known', () => {
    const lines = [
      line(10, 5, { instrumentKey: 'a', systematic: 3 }),
      line(20, 5, { instrumentKey: 'a', systematic: 3 }),
    ];
    expect(sum(...lines).standardUncertainty).toBeCloseTo(Math.hypot(6, 4, 4), 12);
  });

  it('adds lines on one figure linearly, whatever they share besides', () => {
    const figure = line(10, 5, { instrumentKey: 'a', systematic: 3, figureKey: 'f' });
    expect(sum(figure, figure).standardUncertainty).toBeCloseTo(10, 12);
    expect(sum(line(10, 5, { figureKey: 'g' }), line(10, 5, { figureKey: 'g' })).standardUncertainty).toBeCloseTo(
      10,
      12,
    );
  });

  it('cancels what one instrument shifts alike in a difference', () => {
    const [a, b] = [
      line(50, 1, { instrumentKey: 'a', systematic: 1 }),
      line(40, 1, { instrumentKey: 'a', systematic: 1 }),
    ];
    expect(
      sumOfTerms([
        { of: a, factor: 1 },
        { of: b, factor: -1 },
      ]),
    ).toEqual({ value: 10, standardUncertainty: 0 });
  });

  it('leaves of a gain error of a % the part a·|y₁ − y₂|, and nothing of the offset', () => {
    const of = (value: number) => ({ value, parts: { ...none, gain: value * 0.01, offset: 3 } });
    expect(differenceByOneInstrument(of(50), of(40))).toEqual({
      value: 10,
      gain: expect.closeTo(0.1, 12),
      standardUncertainty: expect.closeTo(0.1, 12),
    });
    const noisy = { value: 0, parts: { ...none, repeatability: 3 } };
    expect(differenceByOneInstrument(noisy, { value: 0, parts: { ...none, drift: 4 } }).standardUncertainty).toBe(5);
  });
});
