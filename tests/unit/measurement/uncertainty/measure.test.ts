import { describe, expect, it } from 'vitest';
import { measureCyclic } from '@/lib/measurement/uncertainty/measure-cyclic';
import { measureMaximum } from '@/lib/measurement/uncertainty/measure-maximum';
import { measureMeanPower } from '@/lib/measurement/uncertainty/measure-mean';
import { asEnergy, measureTypedMean, type TypedStretch } from '@/lib/measurement/uncertainty/measure-typed';
import { measureUseEnergy } from '@/lib/measurement/uncertainty/measure-uses';
import { poolMeans } from '@/lib/measurement/uncertainty/pool-means';
import type { MeasuredFigure } from '@/lib/measurement/uncertainty/types';
import { evenTrace, levels, traceOf } from '../traces/build-trace';
import { accuracyOf } from './accuracy';

const stretch = (watts: number[], dt = 1, more = {}) => ({
  trace: evenTrace('averages', dt, watts, { step: 0, ...more }),
  fromSeconds: 0,
  toSeconds: 1e9,
});

describe('mean power of stretches', () => {
  it('is summed energy over summed time, with each part of its uncertainty apart', () => {
    const accuracy = accuracyOf({ percentOfReading: 1, counts: 1, resolutionWatts: 0.1 });
    const figure = measureMeanPower([stretch(levels([40, 3600])), stretch(levels([50, 10_800]))], accuracy);
    expect(figure).toMatchObject({
      value: 47.5,
      countedSeconds: 14_400,
      coverage: 1,
      censoredAt: null,
      powerKind: 'real',
    });
    expect(figure?.parts.gain).toBeCloseTo(0.475 / Math.sqrt(3), 9);
    expect(figure?.parts.offset).toBeCloseTo(0.1 / Math.sqrt(3), 9);
    expect(figure?.parts.drift).toBeCloseTo(0.475, 9);
    expect(figure?.parts.resolution).toBe(0);
  });

  it('is censored below the lower limit: at most the limit, neither zero nor the limit itself', () => {
    const figure = measureMeanPower([stretch(levels([0.2, 100]))], accuracyOf({ lowerLimitWatts: 0.5 }));
    expect(figure).toMatchObject({ value: expect.closeTo(0.2, 9), censoredAt: 0.5 });
    expect(figure?.parts.belowLimit).toBeCloseTo(0.5 / Math.sqrt(3), 9);
  });

  it('leaves f L/√3 open where it is below the limit for a part of the time', () => {
    const figure = measureMeanPower([stretch(levels([0, 100], [50, 300]))], accuracyOf({ lowerLimitWatts: 2 }));
    expect(figure?.censoredAt).toBeNull();
    expect(figure?.parts.belowLimit).toBeCloseTo(0.5 / Math.sqrt(3), 9);
  });

  it('keeps apparent power apart, and says how much of the time counted', () => {
    const trace = traceOf('samples', [...levels([5, 11]).map((w, i) => [i, w] as const), [109, 5], [110, 5]]);
    const figure = measureMeanPower([{ trace, fromSeconds: 0, toSeconds: 110 }], accuracyOf({ readsTruePower: false }));
    expect(figure).toMatchObject({ powerKind: 'apparent', coverage: 0.1 });
  });

  it('is none where no time counts', () => {
    expect(measureMeanPower([{ ...stretch([1, 2]), fromSeconds: 50, toSeconds: 60 }], accuracyOf())).toBeNull();
    expect(measureMeanPower([], accuracyOf())).toBeNull();
  });
});

describe('highest ten-second mean', () => {
  it('is that of the quickest stretches, named with its interval', () => {
    const figure = measureMaximum([stretch(levels([10, 60], [90, 10], [10, 60]))], accuracyOf({ percentOfReading: 1 }));
    expect(figure).toMatchObject({ value: expect.closeTo(90, 9), averagingSeconds: 10, quantity: 'maximum-power' });
    expect(figure?.standardUncertainty).toBeCloseTo(0.9 / Math.sqrt(3), 9);
  });

  it('is none of a logger slower than five seconds, nor of long averages written often', () => {
    expect(measureMaximum([stretch(levels([10, 60]), 6)], accuracyOf())).toBeNull();
    expect(measureMaximum([stretch(levels([10, 60]), 1, { averagingSeconds: 60 })], accuracyOf())).toBeNull();
    expect(measureMaximum([stretch([1, 1, 1])], accuracyOf())).toBeNull();
  });

  it('takes the highest of several', () => {
    const figure = measureMaximum(
      [stretch(levels([10, 60])), stretch(levels([30, 60])), stretch(levels([20, 60]))],
      accuracyOf(),
    );
    expect(figure?.value).toBeCloseTo(30, 9);
  });
});

describe('energy of a use', () => {
  it('is the mean over whole uses, and repeats as Student’s t says', () => {
    const uses = [590, 600, 610].map((watts) => stretch(levels([watts, 3600])));
    const figure = measureUseEnergy(uses, accuracyOf());
    expect(figure?.value).toBeCloseTo(600, 6);
    expect(figure?.parts.repeatability).toBeCloseTo((4.302653 / 1.959964) * (10 / Math.sqrt(3)), 4);
    expect(figure).toMatchObject({ quantity: 'use-energy', countedSeconds: 10_800 });
  });

  it('knows nothing of how a single use repeats, but of what lay below the limit', () => {
    const figure = measureUseEnergy([stretch(levels([0, 1800], [1000, 1800]))], accuracyOf({ lowerLimitWatts: 2 }));
    expect(figure?.parts).toMatchObject({ repeatability: 0, belowLimit: expect.closeTo(1 / Math.sqrt(3), 9) });
    expect(figure?.parts.drift).toBeCloseTo(5, 6);
  });

  it('reads a counter at both ends of each use', () => {
    const trace = evenTrace('counter', 60, [0, 10, 20, 30], { step: 1 });
    const figure = measureUseEnergy([{ trace, fromSeconds: 0, toSeconds: 180 }], accuracyOf());
    expect(figure).toMatchObject({ value: 30, parts: { resolution: expect.closeTo(1 / Math.sqrt(6), 12) } });
  });

  it('is none where one of the uses is not whole', () => {
    expect(
      measureUseEnergy([stretch([5, 5]), { ...stretch([5, 5]), fromSeconds: 50, toSeconds: 60 }], accuracyOf()),
    ).toBeNull();
    expect(measureUseEnergy([], accuracyOf())).toBeNull();
  });
});

describe('a thermostat', () => {
  const cycles = (ons: number[]) => ons.flatMap((on) => levels([1, 240], [on, 120]));

  it('has an energy of a day from whole cycles, and its two parts', () => {
    const figure = measureCyclic(stretch(cycles([80, 80, 80, 80, 80]), 10), accuracyOf({ percentOfReading: 1 }));
    if (!figure.accepted) throw new Error(figure.reason);
    expect(figure.dayEnergy).toMatchObject({ quantity: 'day-energy', value: expect.closeTo(656, 6) });
    expect(figure.dayEnergy.parts.gain).toBeCloseTo(6.56 / Math.sqrt(3), 6);
    expect(figure.dayEnergy.parts.repeatability).toBeCloseTo(0, 9);
    expect([figure.running.value, figure.between.value]).toEqual([expect.closeTo(80, 9), expect.closeTo(1, 9)]);
  });

  it('scatters as its cycles do', () => {
    const figure = measureCyclic(stretch(cycles([80, 78, 82, 79, 81, 80]), 10), accuracyOf());
    expect(figure.accepted && figure.dayEnergy.parts.repeatability).toBeGreaterThan(1);
    expect(figure.accepted && figure.running.parts.repeatability).toBeCloseTo(Math.sqrt(2.5 / 5), 6);
    expect(figure.accepted && figure.between.parts.repeatability).toBeCloseTo(0, 9);
  });

  it('leaves open what an instrument can’t see between cycles, and censors that part', () => {
    const figure = measureCyclic(stretch(cycles([80, 80, 80, 80, 80]), 10), accuracyOf({ lowerLimitWatts: 3 }));
    if (!figure.accepted) throw new Error(figure.reason);
    expect(figure.dayEnergy.parts.belowLimit).toBeCloseTo((24 * 2) / Math.sqrt(3), 6);
    expect(figure.dayEnergy.censoredAt).toBeNull();
    expect(figure.between.censoredAt).toBe(3);
  });

  it('has none where its cycles are refused, and says why', () => {
    expect(measureCyclic(stretch(levels([50, 500])), accuracyOf())).toMatchObject({
      accepted: false,
      reason: expect.any(String),
    });
  });
});

describe('typed readings', () => {
  const typed = (more: Partial<TypedStretch>): TypedStretch => ({
    durationSeconds: 86_400,
    meanWatts: null,
    minimumWatts: null,
    maximumWatts: null,
    energyWattHours: null,
    uses: null,
    ...more,
  });

  it('divides a day’s energy by its hours: 1056 Wh are 44 W (common practice, no source)', () => {
    const figure = measureTypedMean(typed({ energyWattHours: 1056 }), accuracyOf({ resolutionWattHours: 10 }));
    expect(figure).toMatchObject({
      value: 44,
      parts: { drift: 0, resolution: expect.closeTo(10 / Math.sqrt(6) / 24, 12) },
    });
  });

  it('takes (max − min)/√12 of a spot reading', () => {
    const reading = typed({ meanWatts: 43, minimumWatts: 40, maximumWatts: 46, durationSeconds: 60 });
    expect(measureTypedMean(reading, accuracyOf({ resolutionWatts: 1 }))?.parts).toMatchObject({
      repeatability: expect.closeTo(Math.sqrt(3), 12),
      resolution: expect.closeTo(1 / Math.sqrt(12), 12),
      drift: expect.closeTo(0.86, 12),
    });
  });

  it('does not take a stated minimum and maximum for the scatter of an energy', () => {
    const reading = typed({ energyWattHours: 1056, minimumWatts: 0, maximumWatts: 90 });
    expect(measureTypedMean(reading, accuracyOf())?.parts.repeatability).toBe(0);
  });

  it('is censored below the limit, apparent where the meter reads no true power, and none without a reading', () => {
    expect(
      measureTypedMean(typed({ meanWatts: 0 }), accuracyOf({ lowerLimitWatts: 0.5, readsTruePower: false })),
    ).toMatchObject({
      censoredAt: 0.5,
      powerKind: 'apparent',
    });
    expect(measureTypedMean(typed({}), accuracyOf())).toBeNull();
  });

  it('becomes an energy of so many hours, limit and parts alike', () => {
    const figure = measureTypedMean(
      typed({ meanWatts: 0.1, durationSeconds: 3600 }),
      accuracyOf({ lowerLimitWatts: 0.5 }),
    ) as MeasuredFigure;
    const day = asEnergy(figure, 24, 'day-energy');
    expect(day).toMatchObject({ quantity: 'day-energy', value: expect.closeTo(2.4, 12), censoredAt: 12 });
    expect(day.standardUncertainty).toBeCloseTo(figure.standardUncertainty * 24, 12);
    expect(asEnergy({ ...figure, censoredAt: null }, 24, 'day-energy').censoredAt).toBeNull();
  });
});

describe('pooled stretches', () => {
  const of = (value: number, hours: number, more: Partial<MeasuredFigure> = {}): MeasuredFigure => ({
    quantity: 'mean-power',
    powerKind: 'real',
    value,
    standardUncertainty: 1,
    parts: { gain: value * 0.01, offset: 0.2, resolution: 0.1, repeatability: 0.4, drift: 9, belowLimit: 0 },
    censoredAt: null,
    averagingSeconds: hours * 3600,
    coverage: null,
    countedSeconds: hours * 3600,
    ...more,
  });

  it('is summed energy over summed time: 40 W over 1 h and 50 W over 3 h are 47.5 W', () => {
    const figure = poolMeans([of(40, 1), of(50, 3)]);
    expect(figure.value).toBe(47.5);
    expect(figure.parts).toMatchObject({
      gain: expect.closeTo(0.475, 12),
      offset: expect.closeTo(0.2, 12),
      resolution: expect.closeTo(0.1, 12),
      repeatability: expect.closeTo(Math.hypot(0.1, 0.3), 12),
      drift: expect.closeTo(0.475, 12),
    });
  });

  it('is censored only where every stretch is, at the highest limit; coverage is the lowest', () => {
    expect(poolMeans([of(0.1, 1, { censoredAt: 0.5 }), of(0.2, 1, { censoredAt: 1 })]).censoredAt).toBe(1);
    expect(poolMeans([of(0.1, 1, { censoredAt: 0.5 }), of(9, 1)]).censoredAt).toBeNull();
    expect(poolMeans([of(1, 1, { coverage: 0.95 }), of(9, 1, { coverage: 0.8 }), of(9, 1)]).coverage).toBe(0.8);
  });

  it('leaves a single one as it is', () => {
    const one = of(40, 1);
    expect(poolMeans([one])).toBe(one);
  });
});
