import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { moveEdge, pan, zoom } from '@/components/charts/trace-window';

const whole = { from: 1000, to: 11_000 };

describe('a window on a trace', () => {
  test('never leaves the trace, however it is moved', () => {
    const step = fc.oneof(
      fc.record({ kind: fc.constant('pan' as const), by: fc.double({ min: -3, max: 3, noNaN: true }) }),
      fc.record({ kind: fc.constant('zoom' as const), by: fc.double({ min: 0.1, max: 10, noNaN: true }) }),
    );
    fc.assert(
      fc.property(fc.array(step, { maxLength: 30 }), (steps) => {
        let window = whole;
        for (const { kind, by } of steps) {
          window = kind === 'pan' ? pan(window, by, whole) : zoom(window, by, window.from + 3, whole);
          expect(window.from).toBeGreaterThanOrEqual(whole.from - 1e-6);
          expect(window.to).toBeLessThanOrEqual(whole.to + 1e-6);
          expect(window.to - window.from).toBeGreaterThanOrEqual(5 - 1e-6);
        }
      }),
    );
  });

  test('zooms around a moment, which stays where it is', () => {
    expect(zoom({ from: 2000, to: 4000 }, 0.5, 2500, whole)).toEqual({ from: 2250, to: 3250 });
  });

  test('keeps its length at the trace’s end', () => {
    expect(pan({ from: 9000, to: 11_000 }, 0.5, whole)).toEqual({ from: 9000, to: 11_000 });
  });
});

describe('the edge of a phase', () => {
  const phases = [
    { id: 'a', name: 'start-up', from: 1000, to: 2000 },
    { id: 'b', name: 'cycling', from: 2500, to: 8000 },
    { id: 'c', name: 'standby', from: 8000, to: 9000 },
  ];

  test('moves to where it is put', () => {
    expect(moveEdge(phases, 'b', 'from', 3000, whole)).toEqual({ from: 3000, to: 8000 });
  });

  test('takes nothing from a neighbour', () => {
    expect(moveEdge(phases, 'b', 'from', 1500, whole)).toEqual({ from: 2000, to: 8000 });
    expect(moveEdge(phases, 'b', 'to', 8500, whole)).toEqual({ from: 2500, to: 8000 });
  });

  test('stays in the trace', () => {
    expect(moveEdge(phases, 'c', 'to', 99_999, whole)).toEqual({ from: 8000, to: 11_000 });
    expect(moveEdge(phases, 'a', 'from', 0, whole)).toEqual({ from: 1000, to: 2000 });
  });

  test('leaves the phase at least its shortest length', () => {
    expect(moveEdge(phases, 'b', 'to', 100, whole, 60)).toEqual({ from: 2500, to: 2560 });
  });

  test('of a phase that is not there moves nothing', () => {
    expect(moveEdge(phases, 'z', 'to', 100, whole)).toBeNull();
  });
});
