import { describe, expect, it } from 'vitest';
import { stretchFigures } from '@/lib/measurement/traces/figures';
import fromNumpy from '@/tests/reference/figures.json';
import type { TraceKind } from '@/lib/measurement/traces/trace';
import { evenTrace, levels, traceOf } from './build-trace';

describe('figures of a stretch', () => {
  it('has the example of its docstring: 10 W for 20 s is 0.0555… Wh', () => {
    expect(stretchFigures(evenTrace('samples', 10, [10, 10, 10]), 0, 20)?.energyWattHours).toBeCloseTo(20 / 360, 12);
  });

  it('sums interval averages times their interval (10 CFR 430 subpart B, appendix Y), the first one included', () => {
    const figures = stretchFigures(evenTrace('averages', 3600, [10, 20, 30]), 0, 7200);
    expect(figures).toMatchObject({ energyWattHours: 60, countedSeconds: 10_800, coverage: 1, averagingSeconds: 3600 });
  });

  it('weights by time: ten readings in ten seconds say no more than ten seconds', () => {
    const points = [...Array.from({ length: 11 }, (_, i) => [i, 100] as const), [70, 0] as const, [130, 0] as const];
    expect(stretchFigures(traceOf('changes', points), 0, 130)?.meanWatts).toBeCloseTo((100 * 70) / 130, 12);
  });

  it('counts neither time nor energy of a gap in samples, but says where it was', () => {
    const trace = traceOf('samples', [...Array.from({ length: 11 }, (_, i) => [i, 5] as const), [100, 5], [101, 5]]);
    const figures = stretchFigures(trace, 0, 101);
    expect(figures).toMatchObject({ countedSeconds: 11, gaps: [{ fromSeconds: 10, toSeconds: 100 }] });
    expect(figures?.coverage).toBeCloseTo(11 / 101, 12);
  });

  it('counts the last dt of an average that follows a gap', () => {
    const trace = traceOf('averages', [
      [60, 10],
      [120, 10],
      [180, 10],
      [600, 40],
      [660, 10],
    ]);
    const figures = stretchFigures(trace, 60, 660);
    expect(figures).toMatchObject({ countedSeconds: 300, gaps: [{ fromSeconds: 180, toSeconds: 540 }] });
    expect(figures?.energyWattHours).toBeCloseTo((80 * 60) / 3600, 12);
  });

  it('does the same with averages that begin at their time', () => {
    const points = [
      [0, 10],
      [60, 10],
      [120, 40],
      [600, 10],
    ] as const;
    const figures = stretchFigures(traceOf('averages', points, { stamp: 'start' }), 0, 600);
    expect(figures).toMatchObject({ countedSeconds: 240, gaps: [{ fromSeconds: 180, toSeconds: 600 }] });
    expect(figures?.energyWattHours).toBeCloseTo((70 * 60) / 3600, 12);
  });

  it('holds a change until the next, across any silence, and to the very edge of the stretch', () => {
    const trace = traceOf('changes', [
      [0, 2],
      [7200, 80],
      [10_800, 2],
    ]);
    expect(stretchFigures(trace, 0, 10_800)).toMatchObject({ energyWattHours: 84, coverage: 1, gaps: [] });
    expect(stretchFigures(trace, 1800, 3600)).toMatchObject({ energyWattHours: 1, maximumWatts: 2 });
  });

  it('takes the energy of a counter across a silence, but not a power that nobody saw', () => {
    const trace = traceOf(
      'counter',
      [
        [0, 0],
        [60, 1],
        [120, 2],
        [180, 3],
        [3780, 33],
        [3840, 34],
      ],
      { step: 1 },
    );
    const figures = stretchFigures(trace, 0, 3840);
    expect(figures).toMatchObject({ energyWattHours: 34, minimumWatts: 60, maximumWatts: 60, countedSeconds: 3840 });
    expect(figures?.gaps).toEqual([{ fromSeconds: 180, toSeconds: 3780 }]);
    expect(stretchFigures(trace, 200, 3000)?.meanWatts).toBeCloseTo(30, 9);
  });

  it('knows the power of a counter’s silence in which it rose by one step', () => {
    const trace = traceOf(
      'counter',
      [
        [0, 0],
        [60, 1],
        [120, 2],
        [1920, 3],
      ],
      { step: 1 },
    );
    expect(stretchFigures(trace, 0, 1920)).toMatchObject({ minimumWatts: 2, gaps: [] });
  });

  it('keeps negative power and says how long it lasted', () => {
    expect(stretchFigures(evenTrace('averages', 1, levels([-3, 30], [3, 10])), 0, 39)?.shareNegative).toBe(0.75);
  });

  it('takes the extremes from readings, not from what was interpolated at an edge', () => {
    const trace = evenTrace('samples', 10, [0, 100, 100, 0]);
    expect(stretchFigures(trace, 5, 25)).toMatchObject({ minimumWatts: 100, maximumWatts: 100, countedSeconds: 20 });
    expect(stretchFigures(trace, 2, 4)).toMatchObject({ minimumWatts: 20, maximumWatts: 40, readings: 0 });
  });

  it('lists the gap that an edge of the stretch falls into', () => {
    const trace = traceOf('samples', [
      [0, 5],
      [1, 5],
      [2, 5],
      [200, 5],
      [201, 5],
      [400, 5],
      [401, 5],
    ]);
    expect(stretchFigures(trace, 100, 300)).toMatchObject({
      countedSeconds: 1,
      gaps: [
        { fromSeconds: 100, toSeconds: 200 },
        { fromSeconds: 201, toSeconds: 300 },
      ],
    });
  });

  it.each([
    ['outside the trace', 100, 200],
    ['before the trace', -20, -10],
    ['of no length', 15, 15],
    ['backwards', 20, 10],
  ])('has no figures for a stretch %s', (_, from, to) => {
    expect(stretchFigures(evenTrace('samples', 10, [10, 10, 10]), from, to)).toBeNull();
  });

  it('has no figures for a stretch inside a gap', () => {
    const trace = traceOf('samples', [
      [0, 5],
      [1, 5],
      [2, 5],
      [200, 5],
      [201, 5],
    ]);
    expect(stretchFigures(trace, 50, 100)).toBeNull();
    expect(
      stretchFigures(
        traceOf('averages', [
          [60, 5],
          [120, 5],
          [180, 5],
          [900, 5],
        ]),
        300,
        600,
      ),
    ).toBeNull();
  });

  it.each(fromNumpy.traces.map((entry, i) => [i, entry.kind, entry] as const))(
    'agrees with numpy on uneven trace %i of %s (figures.py)',
    (_, kind, { times, values, figures: wanted }) => {
      const points = times.map((seconds, i) => [seconds, values[i] as number] as const);
      const figures = stretchFigures(
        traceOf(kind as TraceKind, points, { step: 1000 }),
        times[0] as number,
        times[times.length - 1] as number,
      );
      for (const [name, value] of Object.entries(wanted)) {
        expect(figures?.[name as keyof typeof wanted], name).toBeCloseTo(value, 9);
      }
    },
  );
});
