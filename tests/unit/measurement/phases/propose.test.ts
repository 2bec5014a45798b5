import { describe, expect, it } from 'vitest';
import { joinClose } from '@/lib/measurement/phases/join-close';
import { noiseOf } from '@/lib/measurement/phases/noise';
import { proposePhases } from '@/lib/measurement/phases/propose';
import { startUps } from '@/lib/measurement/phases/start-up';
import type { TraceKind } from '@/lib/measurement/traces/trace';
import { fridge } from '../reference';
import { evenTrace, levels, noiseFrom, traceOf } from '../traces/build-trace';

const spans = (proposal: ReturnType<typeof proposePhases>) =>
  proposal.phases.map(({ fromSeconds, toSeconds, kind }) => [fromSeconds, toSeconds, kind]);

describe('proposed phases', () => {
  it('divides the refrigerator of the reference at 60, 70, 190, 280, 290, 410, by the rule itself', () => {
    const proposal = proposePhases(evenTrace('samples', 1, fridge, { step: 0.01 }), { duty: 'continuous' });
    expect(spans(proposal)).toEqual([
      [0, 59, 'steady'],
      [60, 69, 'start-up'],
      [70, 189, 'steady'],
      [190, 279, 'steady'],
      [280, 289, 'start-up'],
      [290, 409, 'steady'],
      [410, 469, 'steady'],
    ]);
    expect(proposal).toMatchObject({ explained: null, advice: null });
  });

  it.each(['averages', 'changes'] as const)('lets phases of %s meet at the change itself', (kind: TraceKind) => {
    const found = proposePhases(evenTrace(kind, 1, fridge, { step: 0.01 }), { duty: 'continuous' });
    const shift = kind === 'averages' ? -1 : 0;
    expect(found.phases.slice(1).map((phase) => phase.fromSeconds - shift)).toEqual([60, 70, 190, 280, 290, 410]);
  });

  it('moves edges to the exact reading where a block holds many', () => {
    const noise = noiseFrom(3);
    const values = [...levels([2, 31_417]), ...levels([60, 50_003]), ...levels([45, 18_580])].map(
      (w) => w + 0.2 * noise(),
    );
    const { phases } = proposePhases(evenTrace('samples', 1, values, { step: 0.001 }), { duty: 'continuous' });
    expect(phases.map((phase) => [phase.fromSeconds, phase.toSeconds])).toEqual([
      [0, 31_416],
      [31_417, 81_419],
      [81_420, 99_999],
    ]);
  });

  it('sees a whole-watt logger’s steady level as one phase', () => {
    const noise = noiseFrom(5);
    const values = levels([43, 5000]).map((watts) => Math.round(watts + 0.6 * noise()));
    expect(proposePhases(evenTrace('samples', 1, values, { step: 1 }), { duty: 'continuous' }).phases).toHaveLength(1);
  });

  it('sees a held value of an hour among rows of seconds', () => {
    const points: [number, number][] = [[0, 2]];
    for (let t = 3600; t < 7200; t += 5) points.push([t, t % 10 === 0 ? 60 : 60.5]);
    points.push([7200, 2], [10_800, 2]);
    const { phases } = proposePhases(traceOf('changes', points, { step: 0.5 }), { duty: 'continuous' });
    expect(phases.map((phase) => [phase.fromSeconds, phase.toSeconds])).toEqual([
      [0, 3600],
      [3600, 7200],
      [7200, 10_800],
    ]);
  });

  it('gives gaps no length: the level after one is not a phase of the gap', () => {
    const points = [
      ...levels([10, 100]).map((w, i) => [i, w] as const),
      ...levels([50, 100]).map((w, i) => [5000 + i, w] as const),
      [6000, 50] as const,
      ...levels([50, 30]).map((w, i) => [7000 + i, w] as const),
    ];
    const { phases } = proposePhases(traceOf('samples', points), { duty: 'continuous' });
    expect(phases.map((phase) => [phase.fromSeconds, phase.toSeconds, phase.countedSeconds])).toEqual([
      [0, 99, 99],
      [5000, 7029, 128],
    ]);
  });

  it('doubles the penalty until twelve phases or fewer remain, and asks to cut the stretch where they explain little', () => {
    const noise = noiseFrom(11);
    const many = Array.from({ length: 60 }, () => levels([20 + Math.round((noise() + 1) * 60), 40])).flat();
    const proposal = proposePhases(evenTrace('samples', 1, many), { duty: 'continuous' });
    expect(proposal.phases.length).toBeLessThanOrEqual(12);
    expect(proposal.explained).toBeLessThan(0.9);
    expect(proposal.advice).toContain('less than 90 %');
  });

  it('says nothing of cutting where twelve phases explain enough', () => {
    const stairs = Array.from({ length: 30 }, (_, i) => levels([20 + 20 * i, 40])).flat();
    const proposal = proposePhases(evenTrace('samples', 1, stairs), { duty: 'continuous' });
    expect(proposal.phases.length).toBeLessThanOrEqual(12);
    expect(proposal.explained).toBeGreaterThan(0.9);
    expect(proposal.advice).toBeNull();
  });

  it('proposes within a stretch alone', () => {
    const trace = evenTrace('samples', 1, levels([5, 100], [50, 100], [5, 100]));
    const span = { fromSeconds: 120, toSeconds: 250 };
    expect(spans(proposePhases(trace, { duty: 'continuous', span }))).toEqual([
      [120, 199, 'steady'],
      [200, 250, 'steady'],
    ]);
  });

  it('has no phases where no time counts', () => {
    const trace = traceOf('samples', [
      [0, 5],
      [1, 5],
      [2, 5],
      [900, 5],
    ]);
    const proposal = proposePhases(trace, { duty: 'continuous', span: { fromSeconds: 100, toSeconds: 200 } });
    expect(proposal).toMatchObject({ phases: [], explained: null });
    expect(proposal.advice).toContain('no counted time');
  });

  it('takes a trace of nothing as one phase of nothing', () => {
    const { phases } = proposePhases(evenTrace('samples', 1, levels([0, 500])), { duty: 'continuous' });
    expect(phases).toMatchObject([{ fromSeconds: 0, toSeconds: 499, meanWatts: 0 }]);
  });
});

describe('phases of a thermostat', () => {
  const cycle = (count: number) => Array.from({ length: count }, () => levels([2, 240], [80, 120])).flat();

  it('proposes all its cycles as one phase', () => {
    const { phases } = proposePhases(evenTrace('samples', 10, cycle(8)), { duty: 'cyclic' });
    expect(phases).toMatchObject([{ kind: 'cycling', fromSeconds: 0, toSeconds: 28_790, exceptions: [] }]);
  });

  it('does not look for cycles in what is no thermostat', () => {
    const { phases } = proposePhases(evenTrace('samples', 10, cycle(5)), { duty: 'continuous' });
    expect(phases.every((phase) => phase.kind !== 'cycling')).toBe(true);
  });

  it('sets a long cooling down before the cycles apart, and finds them behind it', () => {
    const values = [...levels([80, 4000]), ...cycle(8)];
    const { phases } = proposePhases(evenTrace('samples', 10, values), { duty: 'cyclic' });
    expect(phases.map(({ kind, fromSeconds, toSeconds }) => [kind, fromSeconds, toSeconds])).toEqual([
      ['steady', 0, 39_990],
      ['cycling', 40_000, 68_790],
    ]);
  });

  it('sets what precedes and follows the cycles apart where it is longer than a cycle', () => {
    const values = [...levels([2, 900]), ...cycle(12), ...levels([2, 800])];
    const { phases } = proposePhases(evenTrace('samples', 10, values), { duty: 'cyclic' });
    expect(phases.map((phase) => phase.kind)).toEqual(['steady', 'cycling', 'steady', 'steady']);
    expect(phases[1]).toMatchObject({ fromSeconds: 9000 + 2400 });
  });

  it('names a defrost and a long cycle as exceptions', () => {
    const values = [
      ...cycle(10),
      ...levels([2, 240], [140, 30], [80, 90]),
      ...cycle(4),
      ...levels([2, 700], [80, 120]),
      ...cycle(3),
    ];
    const { phases } = proposePhases(evenTrace('samples', 10, values), { duty: 'cyclic' });
    expect(phases).toHaveLength(1);
    const reasons = phases[0]?.exceptions.map((exception) => exception.reason) ?? [];
    expect(reasons).toEqual([expect.stringContaining('draws more'), expect.stringContaining('twice as long')]);
    expect(phases[0]?.exceptions[0]).toMatchObject({ fromSeconds: 38_400, toSeconds: 38_690, meanWatts: 140 });
  });

  it('has steady phases where nothing cycles', () => {
    const { phases } = proposePhases(evenTrace('samples', 10, levels([2, 400], [80, 300])), { duty: 'cyclic' });
    expect(phases.map((phase) => phase.kind)).toEqual(['steady', 'steady']);
  });
});

describe('start-up', () => {
  const level = (meanWatts: number, seconds: number, isCycling = false) => ({ meanWatts, seconds, isCycling });

  it('has the example of its docstring', () => {
    expect(startUps([level(2, 60), level(120, 10), level(85, 120)], 0)).toEqual([false, true, false]);
  });

  it('is at most a tenth of the run that follows', () => {
    expect(startUps([level(2, 60), level(120, 13), level(85, 120)], 0)).toEqual([false, false, false]);
  });

  it('is at most fifteen minutes long', () => {
    expect(startUps([level(0, 60), level(90, 900), level(50, 90_000)], 0)).toEqual([false, true, false]);
    expect(startUps([level(0, 60), level(90, 901), level(50, 90_000)], 0)).toEqual([false, false, false]);
  });

  it('is proposed at the trace’s start when that is already above the off level', () => {
    expect(startUps([level(12, 60), level(8, 6000)], 0)).toEqual([true, false]);
  });

  it('is not proposed at the trace’s start when that is off', () => {
    expect(startUps([level(0.4, 60), level(40, 6000)], 0)).toEqual([false, false]);
  });

  it('follows only on the off level, not on another running level', () => {
    expect(startUps([level(0, 60), level(50, 6000), level(90, 60), level(45, 6000)], 0)).toEqual([
      false,
      false,
      false,
      false,
    ]);
  });

  it('joins the steps of a boot while together they are short enough', () => {
    expect(startUps([level(1, 60), level(60, 30), level(110, 60), level(40, 7200)], 0)).toEqual([
      false,
      true,
      true,
      false,
    ]);
  });

  it('ends the run at the next off level', () => {
    expect(startUps([level(1, 60), level(60, 30), level(40, 100), level(1, 9000)], 0)).toEqual([
      false,
      false,
      false,
      false,
    ]);
  });

  it('leaves cycles alone, and a trace of one level', () => {
    expect(startUps([level(1, 60), level(29, 60, true), level(80, 6000)], 0)).toEqual([false, false, false]);
    expect(startUps([level(40, 60)], 0)).toEqual([false]);
  });
});

describe('levels that are one', () => {
  const segment = (first: number, end: number, meanWatts: number) => ({
    first,
    end,
    meanWatts,
    weight: end - first,
  });

  it('has the example of its docstring', () => {
    expect(joinClose([segment(0, 5, 50), segment(5, 10, 51)], 0)).toEqual([segment(0, 10, 50.5)]);
  });

  it.each([
    ['two steps of the logger', 1, 10, 11.9, 12.1],
    ['0.3 W', 0, 2, 2.29, 2.31],
    ['5 % of the larger', 0, 95.1, 100, 100.2],
  ])('tells levels apart from %s on', (_, step, low, near, far) => {
    expect(joinClose([segment(0, 9, low), segment(9, 18, near)], step)).toHaveLength(1);
    expect(joinClose([segment(0, 9, low), segment(9, 18, far)], step)).toHaveLength(2);
  });

  it('joins the closest first and takes the mean anew, by length', () => {
    const found = joinClose([segment(0, 1, 100), segment(1, 2, 104.5), segment(2, 10, 108)], 0);
    expect(found).toEqual([segment(0, 1, 100), segment(1, 10, expect.closeTo(107.6111, 4))]);
  });
});

describe('noise of a series of blocks', () => {
  it('has the example of its docstring', () => {
    expect(noiseOf(Float64Array.of(1, 2, 1, 2), 0)).toBeCloseTo(1.4826 / Math.SQRT2, 9);
  });

  it('is at least q/√12 and half a percent of the 95th percentile', () => {
    expect(noiseOf(Float64Array.of(3, 3, 3, 3), 1)).toBeCloseTo(1 / Math.sqrt(12), 12);
    expect(noiseOf(Float64Array.of(300, 300, 300, 300), 1)).toBeCloseTo(1.5, 12);
    expect(noiseOf(Float64Array.of(0), 0)).toBe(0);
  });
});
