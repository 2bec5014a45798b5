import { describe, expect, it } from 'vitest';
import { communitySpread, type Pile } from '@/lib/measurement/energy/community-spread';
import { dayEnergy, type DayEnergy, type DayPattern } from '@/lib/measurement/energy/day-energy';
import { hoursOfDay } from '@/lib/measurement/energy/hours-of-day';
import { householdDay } from '@/lib/measurement/energy/household-day';
import { pauseSaving, type Pause } from '@/lib/measurement/energy/pause';
import { startExtraEnergy } from '@/lib/measurement/energy/start-extra';
import type { UncertainValue } from '@/lib/measurement/uncertainty/combined-sum';
import { check } from '../reference';

const of = (value: number, more: Partial<UncertainValue> = {}): UncertainValue => ({
  value,
  standardUncertainty: 0,
  systematic: null,
  figureKey: null,
  instrumentKey: null,
  ...more,
});

const pattern = (more: Partial<DayPattern>): DayPattern => ({
  duty: 'continuous',
  measuredDay: null,
  modes: [],
  rest: null,
  uses: null,
  starts: null,
  ...more,
});

const mode = (modeCode: string, watts: number, hours: number) => ({ modeCode, watts: of(watts), hours });

function energyOf(day: DayEnergy): Extract<DayEnergy, { ok: true }> {
  if (!day.ok) throw new Error(day.reason);
  return day;
}

describe('energy of a day', () => {
  it('of 44 W all day is 1056 Wh (common practice, no source)', () => {
    expect(energyOf(dayEnergy(pattern({ modes: [mode('idle', 44, 24)] }))).wattHours).toBe(1056);
  });

  it.each(['doe.pc.kwh', 'doe.fan.kwh'])('times days is what the US DOE’s Energy Saver prints: %s', (id) => {
    const { inputs, expected, tolerance } = check(id) as unknown as {
      inputs: { W: number; h: number; days: number };
      expected: number;
      tolerance: number;
    };
    const day = energyOf(dayEnergy(pattern({ modes: [mode('active', inputs.W, inputs.h)] })));
    expect(Math.abs((day.wattHours * inputs.days) / 1000 - expected)).toBeLessThanOrEqual(tolerance);
    expect(day.unknownHours).toBe(24 - inputs.h);
  });

  it('of a refrigerator adds its defrosts: 0.024 (30 W + 150 Wh/20 h) kWh (EU 2019/2019, Annex III, formula)', () => {
    const { inputs, expected } = check('eu.fridge.ET') as unknown as {
      inputs: { Pss_W: number; dEdf_Wh: number; tdf_h: number };
      expected: number;
    };
    const starts = { perDay: 24 / inputs.tdf_h, extraWattHours: of(inputs.dEdf_Wh) };
    const day = energyOf(dayEnergy(pattern({ modes: [mode('steady', inputs.Pss_W, 24)], starts })));
    expect(day.wattHours / 1000).toBeCloseTo(expected, 12);
  });

  it('adds modes, uses and starts, and fills the rest of 24 hours with the off mode', () => {
    const day = energyOf(
      dayEnergy(
        pattern({
          duty: 'per-use',
          modes: [mode('left-on', 2, 3)],
          rest: of(0.5),
          uses: { perDay: 2, hoursEach: 1.5, wattHours: of(600) },
          starts: { perDay: 2, extraWattHours: of(4.5) },
        }),
      ),
    );
    expect(day.wattHours).toBeCloseTo(2 * 3 + 0.5 * 18 + 1200 + 9, 12);
    expect(day.hours).toEqual([
      { modeCode: 'left-on', hours: 3 },
      { modeCode: null, hours: 18 },
    ]);
    expect(day.unknownHours).toBe(0);
  });

  it('takes hours in use from the other modes: a standby of 24 h is 22 h beside two hours of use', () => {
    const uses = { perDay: 1, hoursEach: 2, wattHours: of(500) };
    expect(energyOf(dayEnergy(pattern({ modes: [mode('standby', 1, 24)], uses }))).wattHours).toBeCloseTo(522, 12);
  });

  it('of a thermostat is its measured one, never watts times hours', () => {
    const cyclic = { duty: 'cyclic' as const, modes: [mode('running', 80, 24)] };
    expect(dayEnergy(pattern(cyclic))).toMatchObject({ ok: false, reason: expect.stringContaining('whole cycles') });
    expect(energyOf(dayEnergy(pattern({ ...cyclic, measuredDay: of(672) }))).wattHours).toBe(672);
  });

  it.each([
    ['25 hours', { modes: [mode('idle', 5, 20), mode('busy', 9, 5)] }, 'sum to 25'],
    ['uses of 26 hours', { uses: { perDay: 13, hoursEach: 2, wattHours: of(1) } }, 'take 26'],
    ['negative hours', { modes: [mode('idle', 5, -1)] }, '0 or more'],
    ['negative uses', { uses: { perDay: -1, hoursEach: -2, wattHours: of(1) } }, '0 or more'],
    ['starts that are no number', { starts: { perDay: NaN, extraWattHours: of(1) } }, '0 or more'],
  ])('refuses %s', (_, more, reason) => {
    expect(dayEnergy(pattern(more))).toMatchObject({ ok: false, reason: expect.stringContaining(reason) });
  });

  it('sums three thirds of a day to a day', () => {
    const third = 24 / 3 + 1e-12;
    expect(
      hoursOfDay(
        [1, 2, 3].map((n) => ({ modeCode: `${n}`, hours: third })),
        0,
      ),
    ).toMatchObject({ ok: true, restHours: 0 });
  });

  it('of a household adds lines on one meter linearly and of two meters by squares', () => {
    const line = (u: number, instrumentKey: string) =>
      energyOf(dayEnergy(pattern({ duty: 'cyclic', measuredDay: of(100, { standardUncertainty: u, instrumentKey }) })));
    expect(householdDay([line(3, 'a'), line(4, 'a')])).toEqual({ wattHours: 200, standardUncertainty: 7 });
    expect(householdDay([line(3, 'a'), line(4, 'b')])).toEqual({ wattHours: 200, standardUncertainty: 5 });
    expect(householdDay([])).toEqual({ wattHours: 0, standardUncertainty: 0 });
  });
});

describe('a line on other households’ devices', () => {
  const pile = (more: Partial<Pile>): Pile => ({
    n: 1,
    median: 40,
    lowerQuartile: null,
    upperQuartile: null,
    minimum: 40,
    maximum: 40,
    ...more,
  });

  it.each([
    ['the unit-to-unit spread of one unit', pile({}), 2],
    ['the range of two, over 2/√π', pile({ n: 2, minimum: 30, maximum: 50 }), 20 / (2 / Math.sqrt(Math.PI))],
    ['the range of three, over 3/√π', pile({ n: 3, minimum: 30, maximum: 50 }), 20 / (3 / Math.sqrt(Math.PI))],
    ['the quartiles from four on', pile({ n: 9, lowerQuartile: 30, upperQuartile: 50 }), 20 / 1.3489795],
    ['never less than units differ', pile({ n: 9, lowerQuartile: 40, upperQuartile: 40 }), 2],
  ])('carries %s', (_, published, wanted) => {
    expect(communitySpread(published, 0.05)).toBeCloseTo(wanted, 6);
  });
});

describe('a pause', () => {
  const pause = (more: Partial<Pause>): Pause => ({
    duty: 'continuous',
    watts: of(44),
    offWatts: of(0),
    startExtra: of(0),
    hours: 11,
    measured: null,
    ...more,
  });

  it('of eleven hours at 44 W saves 484 Wh with nothing drawn when off (common practice, no source)', () => {
    expect(pauseSaving(pause({}))).toMatchObject({ ok: true, savedWattHours: 484, breakEvenHours: 0 });
  });

  it('pays from 6.3 minutes where ten minutes of start-up at 70 W precede 43 W (common practice, no source)', () => {
    const extra = startExtraEnergy(70 / 6, 600, 43);
    expect(extra).toBeCloseTo(4.5, 12);
    const saving = pauseSaving(pause({ watts: of(43), startExtra: of(extra) }));
    expect(saving.ok && saving.breakEvenHours! * 60).toBeCloseTo(6.3, 1);
    expect(saving.ok && saving.savedWattHours).toBeCloseTo(43 * 11 - 4.5, 9);
  });

  it('costs more than it saves where it is too short', () => {
    const saving = pauseSaving(pause({ startExtra: of(50), hours: 1 }));
    expect(saving).toMatchObject({ savedWattHours: -6 });
  });

  it('cancels of one meter what shifts both readings alike', () => {
    const shared = { standardUncertainty: 0.5, systematic: 0.5, instrumentKey: 'meter' };
    expect(pauseSaving(pause({ watts: of(44, shared), offWatts: of(1, shared) }))).toMatchObject({
      standardUncertainty: 0,
    });
    const apart = { standardUncertainty: 0.5 };
    const saving = pauseSaving(pause({ watts: of(44, apart), offWatts: of(1, apart) }));
    expect(saving.ok && saving.standardUncertainty).toBeCloseTo(11 * Math.hypot(0.5, 0.5), 12);
  });

  it('of a thermostat needs the recovery measured: the heat comes back', () => {
    expect(pauseSaving(pause({ duty: 'cyclic' }))).toMatchObject({
      ok: false,
      reason: expect.stringContaining('makes up'),
    });
    const measured = { seconds: 12 * 3600, wattHours: of(500) };
    expect(pauseSaving(pause({ duty: 'cyclic', measured }))).toMatchObject({
      savedWattHours: 28,
      breakEvenHours: null,
    });
    expect(pauseSaving(pause({ duty: 'cyclic', measured: { ...measured, seconds: 0 } })).ok).toBe(false);
  });

  it('saves nothing where off draws as much, and has a length', () => {
    expect(pauseSaving(pause({ offWatts: of(44) }))).toMatchObject({
      ok: false,
      reason: expect.stringContaining('no less'),
    });
    expect(pauseSaving(pause({ hours: 0 })).ok).toBe(false);
  });
});
