import { describe, expect, it } from 'vitest';
import { defaultSettings, settingProblems, SUPPLY_INPUTS } from '@/lib/measurement/supply/inputs';
import { inverterNeed } from '@/lib/measurement/supply/inverter';
import { steadyLoad, typicalAndCautious, type SupplyLoad } from '@/lib/measurement/supply/loads';
import { nightShare } from '@/lib/measurement/supply/night';
import { sizeSupply, type SupplySizing } from '@/lib/measurement/supply/size-supply';
import { check } from '../reference';

const expected = (id: string) => check(id).expected as number;

function sizeOf(sizing: SupplySizing) {
  if (!sizing.ok) throw new Error(sizing.problems[0]?.message);
  return sizing;
}

describe('the worked example of a public stand-alone sizing worksheet', () => {
  const { inputs } = check('pv.br.energy') as unknown as { inputs: { loads_W_h: [number, number][]; eta_inv: number } };
  const loads = inputs.loads_W_h.map(([watts, hours], i) => steadyLoad(`load ${i}`, watts, hours));
  const settings = {
    ...defaultSettings(),
    inverterEfficiency: inputs.eta_inv,
    systemVolts: 24,
    autonomyDays: 7,
    depthOfDischarge: 0.8,
    dischargeEfficiency: 1,
  };
  const { typical, cautious } = sizeOf(sizeSupply(loads, settings));

  it('needs 7465 Wh or 311 Ah a day', () => {
    expect(Math.round(typical.dayWattHours)).toBe(expected('pv.br.energy'));
    expect(Math.round(typical.dayAmpHours)).toBe(expected('pv.br.ah'));
  });

  it('draws 3985 W at once, 4688 W from the battery', () => {
    expect(typical.simultaneousWatts).toBe(expected('pv.br.max_ac'));
    expect(Math.round(typical.simultaneousWatts / inputs.eta_inv)).toBe(expected('pv.br.max_dc'));
  });

  it('takes a battery of 2722 Ah, from the unrounded Ah', () => {
    expect(Math.round(typical.battery.ampHours)).toBe(2722);
    expect(Math.abs(typical.battery.ampHours - expected('pv.br.battery_ah'))).toBeLessThan(0.5);
    expect(Math.ceil(typical.battery.ampHours / 478)).toBe(expected('pv.br.parallel'));
  });

  it('is the same cautiously, where nothing is known of a spread', () => {
    expect(cautious).toEqual(typical);
  });
});

describe('what a supply carries', () => {
  const fridge: SupplyLoad = {
    name: 'refrigerator',
    runningWatts: { typical: 80, cautious: 95 },
    startWatts: { typical: 600, cautious: 800 },
    dayWattHours: { typical: 700, cautious: 960 },
    hoursPerDay: 8,
    window: null,
    behindInverter: true,
  };
  const pump: SupplyLoad = {
    ...steadyLoad('pump', 500, 1),
    startWatts: { typical: 1000, cautious: 1000 },
    behindInverter: false,
  };

  it('counts the inverter’s loss once and its own draw all day, and neither for what the battery feeds', () => {
    const settings = { ...defaultSettings(), inverterEfficiency: 0.8, inverterOwnWatts: 10 };
    expect(sizeOf(sizeSupply([fridge, pump], settings)).typical.dayWattHours).toBeCloseTo(700 / 0.8 + 500 + 240, 9);
    expect(sizeOf(sizeSupply([pump], settings)).typical.dayWattHours).toBe(500);
  });

  it('adds the largest start-up to the rest running, typical and cautious', () => {
    const { typical, cautious } = sizeOf(sizeSupply([fridge, pump], defaultSettings()));
    expect([typical.surgeWatts, cautious.surgeWatts]).toEqual([1100, 1300]);
    expect(typical.inverter).toEqual({ continuousWatts: 80, withMarginWatts: 100, surgeWatts: 600 });
  });

  it('divides the battery by depth, efficiency and temperature, and the array by sun and performance', () => {
    const settings = {
      ...defaultSettings(),
      inverterEfficiency: 1,
      autonomyDays: 2,
      depthOfDischarge: 0.5,
      dischargeEfficiency: 0.9,
      temperatureFactor: 0.8,
      peakSunHours: 2.5,
      performanceRatio: 0.7,
    };
    const { typical } = sizeOf(sizeSupply([fridge], settings));
    expect(typical.battery.wattHours).toBeCloseTo((700 * 2) / (0.5 * 0.9 * 0.8), 9);
    expect(typical.arrayWatts).toBeCloseTo(700 / (2.5 * 0.7), 9);
  });

  it('tells the night’s part from when each draws', () => {
    const settings = { ...defaultSettings(), inverterEfficiency: 1, nightFromHour: 18, nightToHour: 6 };
    const kettle = { ...steadyLoad('kettle', 2000, 0.5), window: { fromHour: 7, toHour: 9 } };
    expect(sizeOf(sizeSupply([fridge, kettle], settings)).typical.nightWattHours).toBeCloseTo(350, 9);
  });

  it('is nothing without loads', () => {
    expect(sizeOf(sizeSupply([], defaultSettings())).typical).toMatchObject({ dayWattHours: 0, surgeWatts: 0 });
  });

  it('says which input is out of its range', () => {
    const sizing = sizeSupply([fridge], { ...defaultSettings(), temperatureFactor: 1.2, systemVolts: NaN });
    expect(sizing).toMatchObject({ ok: false });
    expect(!sizing.ok && sizing.problems.map((problem) => problem.name)).toEqual(['systemVolts', 'temperatureFactor']);
  });
});

describe('inverter', () => {
  it('takes 125 % of what runs three hours or more: 24 A for three hours are 30 A (NEC, restated)', () => {
    const { inputs } = check('nec.125.min_rating') as unknown as { inputs: { I_cont: number } };
    const need = inverterNeed([{ runningWatts: inputs.I_cont, startWatts: null, hoursPerDay: 3 }]);
    expect(need.withMarginWatts).toBe(expected('nec.125.min_rating'));
    expect(inverterNeed([{ runningWatts: 24, startWatts: null, hoursPerDay: 2.9 }]).withMarginWatts).toBe(24);
  });

  it('does not surge below what runs', () => {
    expect(inverterNeed([{ runningWatts: 100, startWatts: 60, hoursPerDay: 1 }]).surgeWatts).toBe(100);
  });
});

describe('loads and hours', () => {
  const pile = { n: 3, median: 42, minimum: 40, maximum: 47, lowerQuartile: null, upperQuartile: null };

  it('takes the upper quartile for cautious, the maximum below four voices', () => {
    expect(typicalAndCautious(pile)).toEqual({ typical: 42, cautious: 47 });
    expect(typicalAndCautious({ ...pile, n: 5, lowerQuartile: 41, upperQuartile: 44 })).toEqual({
      typical: 42,
      cautious: 44,
    });
  });

  it.each([
    ['all day', null, { fromHour: 18, toHour: 6 }, 0.5],
    ['over midnight', { fromHour: 22, toHour: 2 }, { fromHour: 18, toHour: 24 }, 0.5],
    ['wholly in the night', { fromHour: 20, toHour: 23 }, { fromHour: 18, toHour: 8 }, 1],
    ['wholly by day', { fromHour: 9, toHour: 17 }, { fromHour: 18, toHour: 8 }, 0],
    ['a night of the whole day', { fromHour: 9, toHour: 17 }, { fromHour: 6, toHour: 6 }, 1],
  ])('shares hours with the night: %s', (_, window, night, share) => {
    expect(nightShare(window, night)).toBeCloseTo(share, 12);
  });

  it('states each input’s default, where it comes from, and its range; the defaults are within', () => {
    expect(settingProblems(defaultSettings())).toEqual([]);
    for (const input of Object.values(SUPPLY_INPUTS)) expect(input.from.length).toBeGreaterThan(5);
  });
});
