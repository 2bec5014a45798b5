import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { stretchFigures } from '@/lib/measurement/traces/figures';
import type { Trace, TraceKind } from '@/lib/measurement/traces/trace';
import { traceOf } from './build-trace';

const kinds: TraceKind[] = ['samples', 'averages', 'changes', 'counter'];

/** Uneven times with an occasional gap, and watts in tenths (a counter's are summed). */
const traces = fc
  .record({
    kind: fc.constantFrom(...kinds),
    stamp: fc.constantFrom('end' as const, 'start' as const),
    rows: fc.array(fc.tuple(fc.constantFrom(5, 10, 10, 10, 20, 500), fc.integer({ min: 0, max: 30_000 })), {
      minLength: 3,
      maxLength: 60,
    }),
  })
  .map(({ kind, stamp, rows }) => {
    let seconds = 0;
    let wattHours = 0;
    const points = rows.map(([step, tenths]) => {
      seconds += step;
      wattHours += tenths / 1000;
      return [seconds, kind === 'counter' ? wattHours : tenths / 10] as const;
    });
    return traceOf(kind, points, { stamp });
  });

const share = fc.double({ min: 0.001, max: 0.999, noNaN: true });
const ends = (trace: Trace) =>
  [trace.timeSeconds[0], trace.timeSeconds[trace.timeSeconds.length - 1]] as [number, number];

describe('figures of a stretch, whatever the trace', () => {
  it('adds up: time and energy of two parts are those of the whole, wherever it is divided', () => {
    fc.assert(
      fc.property(traces, share, (trace, at) => {
        const [from, to] = ends(trace);
        const middle = from + at * (to - from);
        const [whole, left, right] = [
          [from, to],
          [from, middle],
          [middle, to],
        ].map(([a, b]) => {
          const figures = stretchFigures(trace, a as number, b as number);
          return { energy: figures?.energyWattHours ?? 0, seconds: figures?.countedSeconds ?? 0 };
        }) as { energy: number; seconds: number }[];
        expect(left!.energy + right!.energy).toBeCloseTo(whole!.energy, 7);
        expect(left!.seconds + right!.seconds).toBeCloseTo(whole!.seconds, 7);
      }),
    );
  });

  it('gives a constant trace its constant, as mean, extremes and percentiles', () => {
    fc.assert(
      fc.property(traces, fc.double({ min: 0.1, max: 5000, noNaN: true }), (trace, watts) => {
        const values = trace.timeSeconds.map((s) => (trace.kind === 'counter' ? (watts * s) / 3600 : watts));
        const figures = stretchFigures({ ...trace, values, step: 1e9 }, ...ends(trace));
        for (const name of ['meanWatts', 'minimumWatts', 'maximumWatts', 'p05Watts', 'p50Watts', 'p95Watts'] as const) {
          if (figures) expect(Math.abs(figures[name] / watts - 1), name).toBeLessThan(1e-9);
        }
      }),
    );
  });

  it('does not depend on the unit: kilowatts give a thousandth, minutes a sixtieth of the time', () => {
    fc.assert(
      fc.property(traces, (trace) => {
        const inWatts = stretchFigures(trace, ...ends(trace));
        const inKilowatts = stretchFigures(
          { ...trace, values: trace.values.map((v) => v / 1000), step: trace.step / 1000 },
          ...ends(trace),
        );
        expect(inKilowatts?.meanWatts ?? 0).toBeCloseTo((inWatts?.meanWatts ?? 0) / 1000, 9);
        expect(inKilowatts?.p95Watts ?? 0).toBeCloseTo((inWatts?.p95Watts ?? 0) / 1000, 9);
      }),
    );
  });

  it('keeps the order: minimum ≤ p5 ≤ median ≤ p95 ≤ maximum, and coverage between 0 and 1', () => {
    fc.assert(
      fc.property(traces, share, share, (trace, a, b) => {
        const [from, to] = ends(trace);
        const [left, right] = [Math.min(a, b), Math.max(a, b)].map((at) => from + at * (to - from)) as [number, number];
        const figures = stretchFigures(trace, left, right);
        if (!figures) return;
        expect(figures.p05Watts).toBeLessThanOrEqual(figures.p50Watts);
        expect(figures.p50Watts).toBeLessThanOrEqual(figures.p95Watts);
        expect(figures.coverage).toBeGreaterThan(0);
        expect(figures.coverage).toBeLessThanOrEqual(1);
      }),
    );
  });
});
