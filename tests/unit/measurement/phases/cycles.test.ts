import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { absorbShort, type Run } from '@/lib/measurement/phases/absorb-short';
import { findCycles } from '@/lib/measurement/phases/cycles';
import { findOnOffRuns } from '@/lib/measurement/phases/on-off-runs';
import { otsuThreshold } from '@/lib/measurement/phases/otsu';
import { runningMedian5 } from '@/lib/measurement/phases/running-median';
import { traceStepWatts } from '@/lib/measurement/phases/trace-step-watts';
import { evenTrace, levels, noiseFrom, traceOf } from '../traces/build-trace';

const cycle = (count: number, on = 80, off = 2) =>
  Array.from({ length: count }, () => levels([off, 240], [on, 120])).flat();

const reasonOf = (finding: ReturnType<typeof findCycles>) => (finding.accepted ? 'accepted' : finding.reason);

describe('cycles', () => {
  it('finds whole cycles only: eight times off and on hold seven from switching-on to switching-on', () => {
    const finding = findCycles(evenTrace('averages', 10, cycle(8)), 0, 28_790);
    if (!finding.accepted) throw new Error(finding.reason);
    expect(finding.cycles).toHaveLength(7);
    expect(finding.cycles[0]).toMatchObject({ seconds: 3600, onSeconds: 1200 });
    expect(finding.dutyCycle).toBeCloseTo(1 / 3, 12);
    expect(finding.meanWatts).toBeCloseTo((80 * 120 + 2 * 240) / 360, 12);
    expect(finding.dayWattHours).toBeCloseTo(28 * 24, 9);
    expect(finding.cyclesPerDay).toBeCloseTo(24, 12);
    expect(finding.wattHoursPerCycle).toEqual({ mean: expect.closeTo(28, 9), standardDeviation: expect.closeTo(0, 9) });
    expect(finding.running.meanWatts).toBeCloseTo(80, 9);
    expect(finding.between.meanWatts).toBeCloseTo(2, 9);
  });

  it.each(['samples', 'averages', 'changes'] as const)('gives cycles of %s the time between their edges', (kind) => {
    const finding = findCycles(evenTrace(kind, 20, cycle(6)), 0, 60_000);
    if (!finding.accepted) throw new Error(finding.reason);
    for (const { fromSeconds, toSeconds, seconds } of finding.cycles) expect(seconds).toBe(toSeconds - fromSeconds);
  });

  it('finds them in a log of changes that has one row a level, and in one whose running level flickers', () => {
    const bare = Array.from({ length: 14 }, (_, i) => [i * 1800, i % 2 === 0 ? 2 : 80] as const);
    expect(findCycles(traceOf('changes', bare), 0, 1e6)).toMatchObject({ accepted: true, dutyCycle: 0.5 });
    const flicker = bare.flatMap(([t, watts]) =>
      watts === 2 ? [[t, 2] as const] : Array.from({ length: 600 }, (_, k) => [t + 3 * k, 80 + (k % 2)] as const),
    );
    expect(findCycles(traceOf('changes', flicker), 0, 1e6)).toMatchObject({ accepted: true, dutyCycle: 0.5 });
  });

  it('finds them in a counter', () => {
    let wattHours = 0;
    const points = cycle(8).map((watts, i) => [i * 10, (wattHours += watts / 360)] as const);
    const finding = findCycles(traceOf('counter', points, { step: 0.001 }), 0, 1e6);
    expect(finding).toMatchObject({ accepted: true, dayWattHours: expect.closeTo(672, 6) });
  });

  it('keeps spread of energy and of cycles a day', () => {
    const values = [240, 300, 240, 180, 240, 240].flatMap((off) => levels([2, off], [80, 120]));
    const finding = findCycles(evenTrace('samples', 10, values), 0, 1e6);
    if (!finding.accepted) throw new Error(finding.reason);
    expect(finding.secondsPerCycle.standardDeviation).toBeGreaterThan(300);
    expect(finding.cyclesPerDaySpread).toBeGreaterThan(2);
  });

  it('leaves out a cycle with a gap in it, or whose switching-on a gap hides', () => {
    const points = cycle(9).map((watts, i) => [i * 10 + (i >= 2000 ? 3600 : 0), watts] as const);
    const finding = findCycles(traceOf('averages', points), 0, 1e6);
    expect(finding.accepted && finding.cycles.length).toBe(7);
    const hidden = cycle(9).map((watts, i) => [i * 10 + (i >= 240 + 720 ? 3600 : 0), watts] as const);
    const found = findCycles(traceOf('averages', hidden), 0, 1e6);
    expect(found.accepted && found.cycles.length).toBe(6);
  });

  it.each([
    ['too few readings', evenTrace('samples', 10, [2, 80]), 'too few readings'],
    ['a power that never changes', evenTrace('samples', 10, levels([43, 500])), 'never changes'],
    ['levels less than 2 W apart', evenTrace('samples', 10, cycle(8, 3.9, 2)), 'too close together'],
    [
      'levels less than four steps apart',
      evenTrace('samples', 10, cycle(8, 40, 20), { step: 6 }),
      'too close together',
    ],
    ['levels less than a fifth of on apart', evenTrace('samples', 10, cycle(8, 100, 81)), 'too close together'],
    ['two whole cycles', evenTrace('samples', 10, cycle(3)), 'holds 2'],
    ['cycles in less than half of it', evenTrace('samples', 10, [...levels([2, 2000]), ...cycle(5)]), 'less than half'],
    [
      'cycles of very different lengths',
      evenTrace(
        'samples',
        10,
        [60, 60, 1500, 60, 60, 2000, 60].flatMap((off) => levels([2, off], [80, 30])),
      ),
      'differ too much',
    ],
    [
      'what is nearly always off',
      evenTrace('samples', 10, Array.from({ length: 6 }, () => levels([2, 600], [80, 8])).flat()),
      'nearly always',
    ],
  ])('refuses %s, and says why', (_, trace, reason) => {
    expect(reasonOf(findCycles(trace, 0, 1e6))).toContain(reason);
  });

  it('is not misled by spikes and short flickers', () => {
    const noise = noiseFrom(9);
    const values = cycle(8).map((watts, i) => (i % 97 === 0 ? 900 * Math.abs(noise()) : watts));
    const finding = findCycles(evenTrace('samples', 10, values), 0, 1e6);
    expect(finding.accepted && finding.cycles.length).toBe(7);
  });
});

describe('runs of on and off', () => {
  it('has the example of its docstring', () => {
    const found = findOnOffRuns(Float64Array.of(2, 2, 80, 80), Float64Array.of(60, 60, 60, 60), 30);
    expect(found).toMatchObject({ onWatts: 80, offWatts: 2, runs: [{ on: false }, { on: true }] });
  });

  it('needs half of the difference to switch, not a flicker about the middle', () => {
    const watts = Float64Array.of(0, 0, 100, 100, 45, 55, 30, 100, 100, 20, 0, 0);
    const found = findOnOffRuns(
      watts,
      watts.map(() => 60),
      30,
    );
    expect(found?.runs.map((run) => [run.on, run.first, run.end])).toEqual([
      [false, 0, 2],
      [true, 2, 9],
      [false, 9, 12],
    ]);
  });

  it('has none of one level', () => {
    expect(findOnOffRuns(Float64Array.of(5, 5), Float64Array.of(1, 1), 1)).toBeNull();
  });

  /** The rule as it is written: look for the shortest, join it, look again. */
  function oneByOne(runs: Run[], least: number): Run[] {
    const kept = runs.map((run) => ({ ...run }));
    for (;;) {
      const short = kept.filter((run) => run.seconds < least).sort((a, b) => a.seconds - b.seconds)[0];
      if (!short || kept.length < 2) return kept;
      const at = kept.indexOf(short);
      const [from, to] = [Math.max(0, at - 1), Math.min(kept.length, at + 2)];
      const joined = kept.slice(from, to);
      kept.splice(from, to - from, {
        on: !short.on,
        first: joined[0]!.first,
        end: joined[joined.length - 1]!.end,
        seconds: joined.reduce((sum, run) => sum + run.seconds, 0),
      });
    }
  }

  it('absorbs short runs as the rule says, one by one', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 1, max: 30 }), { minLength: 1, maxLength: 40 }),
        fc.boolean(),
        (lengths, isOn) => {
          let at = 0;
          const runs = lengths.map((seconds, i) => ({
            on: (i % 2 === 0) === isOn,
            first: at,
            end: (at += seconds),
            seconds,
          }));
          expect(absorbShort(runs, 15)).toEqual(oneByOne(runs, 15));
        },
      ),
    );
  });

  it('has the example of its docstring: five seconds off within a run were none', () => {
    const run = (on: boolean, first: number, end: number) => ({ on, first, end, seconds: end - first });
    expect(absorbShort([run(true, 0, 100), run(false, 100, 105), run(true, 105, 205)], 30)).toEqual([
      run(true, 0, 205),
    ]);
  });
});

describe('parts of the search', () => {
  it('parts two groups where Otsu does: by trying every edge', () => {
    expect(otsuThreshold([0, 0, 10, 10], [1, 1, 1, 1])).toBe(10 / 256);
    const noise = noiseFrom(4);
    const values = Array.from({ length: 400 }, (_, i) => (i % 3 === 0 ? 80 : 3) + 2 * noise());
    const weights = values.map(() => 1 + Math.abs(noise()));
    const threshold = otsuThreshold(values, weights) ?? 0;
    expect(threshold).toBeGreaterThan(5);
    expect(threshold).toBeLessThan(78);
  });

  it('weighs the groups by time', () => {
    const values = [0, 50, 100];
    expect(otsuThreshold(values, [100, 1, 100])).toBe(100 / 256);
    expect(otsuThreshold(values, [1, 100, 100])).toBeGreaterThan(50);
  });

  it('has no threshold of one value, or where nothing else counts', () => {
    expect(otsuThreshold([5, 5], [1, 1])).toBeNull();
    expect(otsuThreshold([5, 9], [1, 0])).toBeNull();
  });

  it('takes the median of five, by sorting them', () => {
    expect(Array.from(runningMedian5(Float64Array.of(1, 1, 9, 1, 1)))).toEqual([1, 1, 1, 1, 1]);
    fc.assert(
      fc.property(fc.array(fc.integer(), { minLength: 1, maxLength: 30 }), (values) => {
        const wanted = values.map((value, i) =>
          i < 2 || i >= values.length - 2 ? value : values.slice(i - 2, i + 3).sort((a, b) => a - b)[2],
        );
        expect(Array.from(runningMedian5(Float64Array.from(values)))).toEqual(wanted);
      }),
    );
  });

  it('reads a counter’s step as power over its interval', () => {
    expect(traceStepWatts(evenTrace('counter', 60, [0, 1, 2], { step: 1 }))).toBe(60);
    expect(traceStepWatts(evenTrace('samples', 60, [0, 1, 2], { step: 1 }))).toBe(1);
  });
});
