import { describe, expect, it } from 'vitest';
import type { Trace } from '@/lib/measurement/traces/trace';
import { computeFigures, type ComputationInput } from '@/lib/reports/rules/compute-figures';
import type { Phase } from '@/lib/reports/schema';
import { freezerWatts, tracedPhase, typedPhase } from '../../factories/reports';

const accuracy = {
  percentOfReading: 1,
  percentOfRange: 0,
  rangeWatts: null,
  counts: 0,
  resolutionWatts: 0.1,
  resolutionWattHours: 1,
  lowerLimitWatts: 0.5,
  readsTruePower: true,
};

function aTrace(seconds: number, wattsAt: (second: number) => number, traits: Partial<Trace> = {}, every = 10): Trace {
  const n = Math.floor(seconds / every) + 1;
  return {
    kind: 'samples',
    timeSeconds: Float64Array.from({ length: n }, (_, i) => i * every),
    values: Float64Array.from({ length: n }, (_, i) => wattsAt(i * every)),
    powerKind: 'real',
    averagingSeconds: null,
    stamp: 'end',
    step: 0.1,
    ...traits,
  };
}

function compute(phases: Phase[], traces: Record<string, Trace> = {}, traits: Partial<ComputationInput> = {}) {
  return computeFigures({
    duty: 'continuous',
    supplyClass: 'ac-230',
    phases,
    accuracy,
    traceOf: (publicId) => traces[publicId] as Trace,
    assumesVolts: () => false,
    ...traits,
  });
}

const named = ({ figures }: ReturnType<typeof compute>) =>
  figures.map(({ modeCode, quantity, powerKind, value }) => [
    modeCode,
    quantity,
    powerKind,
    Math.round(value * 100) / 100,
  ]);

describe('several phases of one mode', () => {
  it('are one figure: summed energy over summed time', () => {
    const trace = aTrace(7200, (second) => (second < 3600 ? 40 : 50));
    const phases = [tracedPhase('idle', 'a', 0, 3500), tracedPhase('idle', 'a', 3700, 4200)];
    const [figure, ...rest] = compute(phases, { a: trace }).figures;
    expect(rest).toEqual([]);
    expect(figure).toMatchObject({ modeCode: 'idle', countedSeconds: 4000 });
    expect(figure?.value).toBeCloseTo((3500 * 40 + 500 * 50) / 4000, 9);
  });

  it('read off a display and recorded are one figure too', () => {
    const phases = [tracedPhase('idle', 'a', 0, 3600), typedPhase('idle', 50, { durationSeconds: 10_800 })];
    expect(named(compute(phases, { a: aTrace(3600, () => 40) }))).toEqual([['idle', 'mean-power', 'real', 47.5]]);
  });

  it('in W and in VA are never one figure', () => {
    const traces = { w: aTrace(3600, () => 40), va: aTrace(3600, () => 60, { powerKind: 'apparent' }) };
    const phases = [tracedPhase('idle', 'w', 0, 3600), tracedPhase('idle', 'va', 0, 3600)];
    expect(named(compute(phases, traces))).toEqual([
      ['idle', 'mean-power', 'real', 40],
      ['idle', 'mean-power', 'apparent', 60],
    ]);
  });

  it('with energy and with power off a display are weighted by time', () => {
    const phases = [
      typedPhase('idle', 0, { meanWatts: null, energyWattHours: 120, durationSeconds: 7200 }),
      typedPhase('idle', 40, { durationSeconds: 3600 }),
    ];
    expect(named(compute(phases))).toEqual([['idle', 'mean-power', 'real', 53.33]]);
  });
});

describe('a maximum', () => {
  it('is the highest ten-second mean of a quick log, with that interval beside it', () => {
    const quick = aTrace(600, (second) => (second >= 300 && second < 320 ? 90 : 40), {}, 1);
    const maximum = compute([tracedPhase('busy', 'a', 0, 600)], { a: quick }).figures[1];
    expect(maximum).toMatchObject({ quantity: 'maximum-power', value: 90, averagingSeconds: 10 });
  });

  it('is none of a log slower than five seconds', () => {
    expect(compute([tracedPhase('busy', 'a', 0, 600)], { a: aTrace(600, () => 40, {}, 6) }).figures).toHaveLength(1);
  });
});

describe('the energy of a day', () => {
  it('is that of whole cycles for a thermostat, with the power of its two parts', () => {
    const result = compute(
      [tracedPhase('cycling', 'a', 0, 86_400)],
      { a: aTrace(86_400, freezerWatts) },
      { duty: 'cyclic' },
    );
    expect(result.figures.map(({ modeCode, quantity }) => [modeCode, quantity])).toEqual([
      [null, 'day-energy'],
      ['running', 'mean-power'],
      ['between-cycles', 'mean-power'],
    ]);
    expect(result.wholeCycles).toBe(22);
    expect(result.figures[0]?.value).toBeCloseTo(24 * (78.345 / 3 + (2 * 1.6) / 3), -1);
  });

  it('is refused with the reason where there are no cycles, never guessed', () => {
    const steady = compute(
      [tracedPhase('cycling', 'a', 0, 86_400)],
      { a: aTrace(86_400, () => 40) },
      { duty: 'cyclic' },
    );
    expect(steady.figures).toEqual([]);
    expect(steady.refusals).toMatchObject([{ modeCode: 'cycling', reason: expect.stringMatching(/never changes/) }]);
  });

  it('of a thermostat is read off a display from a day on', () => {
    const typed = (durationSeconds: number) =>
      compute(
        [typedPhase('cycling', 0, { meanWatts: null, energyWattHours: 650, durationSeconds })],
        {},
        { duty: 'cyclic' },
      );
    expect(named(typed(86_400))).toEqual([[null, 'day-energy', 'real', 650]]);
    expect(typed(12 * 3600).refusals[0]?.reason).toMatch(/a day or more/);
  });

  it('of what draws all day is a day’s of the mode that was measured for a day', () => {
    const day = (seconds: number) =>
      named(compute([tracedPhase('idle', 'a', 0, seconds)], { a: aTrace(seconds, () => 8) }));
    expect(day(86_400)).toEqual([
      ['idle', 'mean-power', 'real', 8],
      [null, 'day-energy', 'real', 192],
    ]);
    expect(day(20 * 3600)).toEqual([['idle', 'mean-power', 'real', 8]]);
  });

  it('is none from a few minutes of a use', () => {
    const result = compute(
      [tracedPhase('active', 'a', 0, 86_400)],
      { a: aTrace(86_400, () => 60) },
      { duty: 'per-use' },
    );
    expect(named(result)).toEqual([['active', 'mean-power', 'real', 60]]);
  });

  it('of cycles counts before what is marked beside them', () => {
    const phases = [tracedPhase('running', 'a', 0, 1000), tracedPhase('cycling', 'a', 0, 86_400)];
    const { figures, refusals } = compute(phases, { a: aTrace(86_400, freezerWatts) }, { duty: 'cyclic' });
    expect(figures.filter(({ modeCode }) => modeCode === 'running')).toHaveLength(1);
    expect(figures.find(({ modeCode }) => modeCode === 'running')?.countedSeconds).toBeGreaterThan(20_000);
    expect(refusals).toMatchObject([{ modeCode: 'running' }]);
  });
});

describe('the energy of a use', () => {
  const perUse = (phases: Phase[], traces: Record<string, Trace> = {}) => compute(phases, traces, { duty: 'per-use' });

  it('is the mean of the uses, each of them whole', () => {
    const trace = aTrace(7200, (second) => (second < 3600 ? 600 : 660));
    const phases = [tracedPhase('programme', 'a', 0, 3590), tracedPhase('programme', 'a', 3600, 7190)];
    const [figure] = perUse(phases, { a: trace }).figures;
    expect(figure).toMatchObject({ modeCode: null, quantity: 'use-energy' });
    expect(figure?.value).toBeCloseTo((630 * 3590) / 3600, 6);
  });

  it('of several uses in one stretch is its energy over their number', () => {
    const phases = [tracedPhase('programme', 'a', 0, 3600, { uses: 3 })];
    expect(named(perUse(phases, { a: aTrace(3600, () => 600) }))).toEqual([[null, 'use-energy', 'real', 200]]);
  });

  it('off a display is its energy over the uses', () => {
    const phases = [
      typedPhase('programme', 0, { meanWatts: null, energyWattHours: 1240, durationSeconds: 7200, uses: 2 }),
    ];
    expect(named(perUse(phases))).toEqual([[null, 'use-energy', 'real', 620]]);
  });

  it('recorded counts, and what was typed beside it is named as not counting', () => {
    const phases = [tracedPhase('programme', 'a', 0, 3600), typedPhase('programme', 500)];
    const { figures, refusals } = perUse(phases, { a: aTrace(3600, () => 600) });
    expect(figures).toHaveLength(1);
    expect(refusals).toMatchObject([{ reason: expect.stringMatching(/The recording counts/) }]);
  });
});

describe('the supply', () => {
  const currentLog = { a: aTrace(3600, () => 24, { powerKind: 'apparent' }) };
  const idle = [tracedPhase('idle', 'a', 0, 3600)];

  it('DC makes real power of amperes times volts, by whatever instrument', () => {
    const blind = { ...accuracy, readsTruePower: false };
    const kinds = (supplyClass: 'dc' | 'ac-230') =>
      compute(idle, currentLog, { supplyClass, accuracy: blind }).figures.map((figure) => figure.powerKind);
    expect(kinds('dc')).toEqual(['real']);
    expect(kinds('ac-230')).toEqual(['apparent']);
  });

  it('of an assumed voltage widens the gain by ten percent, rectangular, and leaves a display’s watts alone', () => {
    const gains = (assumed: boolean) =>
      compute([...idle, typedPhase('busy', 24)], currentLog, { assumesVolts: () => assumed }).figures.map(
        (figure) => figure.parts.gain,
      );
    // JCGM 100:2008, 4.3.7: half-width over √3.
    expect(gains(false)).toEqual([0.24 / Math.sqrt(3), 0.24 / Math.sqrt(3)]);
    const [recorded, typed] = gains(true);
    expect(recorded).toBeCloseTo((Math.hypot(1, 10) / 100) * (24 / Math.sqrt(3)), 12);
    expect(typed).toBe(0.24 / Math.sqrt(3));
  });
});

describe('what yields no figure', () => {
  it('is a phase without counted time, with the reason', () => {
    const timeSeconds = Float64Array.from([0, 10, 20, 30, 9000, 9010, 9020]);
    const gap = aTrace(0, () => 8, { timeSeconds, values: new Float64Array(7).fill(8) });
    const { figures, refusals } = compute([tracedPhase('idle', 'a', 2000, 4000)], { a: gap });
    expect(figures).toEqual([]);
    expect(refusals).toMatchObject([{ modeCode: 'idle', reason: expect.stringMatching(/no counted time/) }]);
  });

  it('is a number beyond all numbers', () => {
    const { figures, refusals } = compute([tracedPhase('idle', 'a', 0, 3600)], { a: aTrace(3600, () => 1e308) });
    expect(figures).toEqual([]);
    expect(refusals[0]?.reason).toMatch(/Check the unit/);
  });

  it('is below what the instrument sees: "at most", with the reading kept', () => {
    const [figure] = compute([typedPhase('standby', 0.2)]).figures;
    expect(figure).toMatchObject({ value: 0.2, censoredAt: 0.5 });
  });
});
