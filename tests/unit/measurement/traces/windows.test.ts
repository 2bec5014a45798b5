import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { highestMean } from '@/lib/measurement/traces/highest-mean';
import { traceLevels, traceWindow } from '@/lib/measurement/traces/levels';
import { firstAbove, firstAtLeast } from '@/lib/measurement/traces/search-sorted';
import { averagingOf, gapLimitSeconds, medianStepSeconds } from '@/lib/measurement/traces/step';
import { countStretch } from '@/lib/measurement/traces/steps';
import { evenTrace, levels, traceOf } from './build-trace';

describe('highest mean of a window', () => {
  it('has the example of its docstring', () => {
    expect(highestMean(evenTrace('samples', 1, levels([10, 61])), 0, 60, 10)).toBeCloseTo(10, 12);
  });

  it('cuts a held value to exactly the window: 5 s of 3000 W after 1000 s of 50 W are 1525 W over 10 s', () => {
    const trace = traceOf('changes', [
      [0, 50],
      [1000, 3000],
      [1005, 50],
      [2000, 50],
    ]);
    expect(highestMean(trace, 0, 2000, 10)).toBeCloseTo(1525, 9);
  });

  it('never reaches across a gap', () => {
    const trace = traceOf('averages', [
      [1, 10],
      [2, 10],
      [3, 10],
      [4, 10],
      [104, 100],
      [105, 100],
      [106, 100],
    ]);
    expect(highestMean(trace, 0, 106, 4)).toBeCloseTo(10, 12);
    expect(highestMean(trace, 0, 106, 3)).toBeCloseTo(100, 12);
  });

  it('is nothing where no stretch without a gap is that long', () => {
    expect(highestMean(evenTrace('samples', 1, [1, 2, 3]), 0, 2, 10)).toBeNull();
    expect(highestMean(evenTrace('samples', 1, [1, 2, 3]), 50, 60, 1)).toBeNull();
  });

  it('equals every window of whole readings, tried one by one', () => {
    const values = fc.array(fc.integer({ min: 0, max: 500 }), { minLength: 6, maxLength: 40 });
    fc.assert(
      fc.property(values, fc.integer({ min: 1, max: 6 }), (watts, length) => {
        const trace = evenTrace('averages', 1, watts);
        const sums = watts.slice(0, watts.length - length + 1).map((_, i) => {
          return watts.slice(i, i + length).reduce((sum, value) => sum + value, 0) / length;
        });
        expect(highestMean(trace, 0, watts.length - 1, length)).toBeCloseTo(Math.max(...sums), 9);
      }),
    );
  });
});

describe('levels for drawing', () => {
  it('keeps every extreme, whatever the number of blocks', () => {
    const trace = evenTrace('samples', 1, [...levels([10, 500]), 900, ...levels([10, 499]), -4]);
    for (const blocks of [1, 7, 100, 5000]) {
      const level = traceWindow(trace, 0, 1000, blocks);
      expect(level.from.length).toBe(Math.min(blocks, 1001));
      expect([Math.max(...level.maximum), Math.min(...level.minimum)]).toEqual([900, -4]);
      expect(level.mean.every((mean, i) => mean >= level.minimum[i]! && mean <= level.maximum[i]!)).toBe(true);
    }
  });

  it('draws a lone sample between gaps as it was read', () => {
    const trace = traceOf('samples', [
      [0, 1],
      [1, 1],
      [2, 1],
      [500, 7],
      [1000, 1],
      [1001, 1],
    ]);
    expect(traceWindow(trace, 400, 600, 10)).toEqual({ from: [500], minimum: [7], maximum: [7], mean: [7] });
  });

  it('is empty beside the trace', () => {
    expect(traceWindow(evenTrace('samples', 1, [1, 2]), 10, 20, 5).from).toEqual([]);
  });

  it('has one level of a short trace and two of a long one', () => {
    expect(traceLevels(evenTrace('samples', 1, levels([1, 150]))).map((level) => level.from.length)).toEqual([150]);
    const long = traceLevels(evenTrace('samples', 1, levels([1, 4000])));
    expect(long.map((level) => level.from.length)).toEqual([200, 1600]);
  });
});

describe('steps of a trace', () => {
  it('takes dt as the median interval, and gaps from it by kind', () => {
    const points = [
      [0, 1],
      [10, 1],
      [20, 1],
      [80, 1],
    ] as const;
    expect(medianStepSeconds(traceOf('samples', points))).toBe(10);
    expect(gapLimitSeconds(traceOf('samples', points))).toBe(100);
    expect(gapLimitSeconds(evenTrace('samples', 1, [1, 1, 1]))).toBe(60);
    expect(gapLimitSeconds(traceOf('averages', points))).toBe(25);
    expect(gapLimitSeconds(traceOf('changes', points))).toBe(Infinity);
    expect(gapLimitSeconds(traceOf('counter', points))).toBe(Infinity);
  });

  it('names the averaging interval: none of samples and changes, its own of averages, dt of a counter', () => {
    expect(averagingOf(evenTrace('samples', 5, [1, 1]))).toBe(0);
    expect(averagingOf(evenTrace('averages', 5, [1, 1]))).toBe(5);
    expect(averagingOf(evenTrace('averages', 5, [1, 1], { averagingSeconds: 60 }))).toBe(60);
    expect(averagingOf(evenTrace('counter', 5, [1, 1]))).toBe(5);
  });

  it('counts from an edge between two samples on, as its docstring shows', () => {
    expect(Array.from(countStretch(evenTrace('samples', 10, [10, 10, 10]), 5, 20)?.seconds ?? [])).toEqual([5, 10, 0]);
  });

  it('finds places in a rising column', () => {
    expect(firstAtLeast(Float64Array.of(1, 2, 2, 3), 2)).toBe(1);
    expect(firstAbove(Float64Array.of(1, 2, 2, 3), 2)).toBe(3);
    expect(firstAtLeast(Float64Array.of(1, 2), 9)).toBe(2);
  });
});
