import { describe, expect, it } from 'vitest';
import type { Trace } from '@/lib/measurement/traces/trace';
import { decodeSeries, encodeSeries } from '@/lib/reports/rules/trace-series';

function aTrace(values: number[], traits: Partial<Trace> = {}): Trace {
  return {
    kind: 'samples',
    timeSeconds: Float64Array.from(values, (_, i) => 1_790_000_000.25 + i),
    values: Float64Array.from(values),
    powerKind: 'real',
    averagingSeconds: null,
    stamp: 'end',
    step: 0.1,
    ...traits,
  };
}

function throughFile(trace: Trace): Trace {
  const { timeSeconds: _time, values: _values, ...meta } = trace;
  return decodeSeries(encodeSeries(trace), meta);
}

const WIDE = 16 + 16;
const NARROW = 16 + 12;

describe('the column file of a trace', () => {
  it.each<[string, number[], number]>([
    ['tenths of a watt', [0, 0.1, 43.2, 1999.9, -3.4], 0.1],
    ['whole watts', [0, 3, 65_535], 1],
    ['milliwatts', [0.001, 0.002, 12.345], 0.001],
    ['readings without a step', [5, 5, 5], 0],
    ['readings whose digits float32 would lose', [0.123456789, 1234567.891], 1e-9],
    ['readings whose step divides nothing', [1 / 3, 2 / 3, 1], 1 / 3],
    ['tiny and huge ones', [5e-324, 1.7e12], 1e-300],
  ])('gives back %s to the last digit', (_what, values, step) => {
    const trace = aTrace(values, { step });
    expect(throughFile(trace)).toEqual(trace);
  });

  it('is narrow only where that keeps the digits, and never for a counter', () => {
    const sizeOf = (trace: Trace) => encodeSeries(trace).byteLength;
    expect(sizeOf(aTrace([43.2]))).toBe(NARROW);
    expect(sizeOf(aTrace([0.123456789], { step: 1e-9 }))).toBe(WIDE);
    expect(sizeOf(aTrace([43.2], { kind: 'counter' }))).toBe(WIDE);
  });

  it.each([0, 3, 15, 16, 27])('cut to %i bytes is no series', (bytes) => {
    const whole = encodeSeries(aTrace([1, 2]));
    const { timeSeconds: _time, values: _values, ...meta } = aTrace([]);
    expect(() => decodeSeries(whole.subarray(0, bytes), meta)).toThrow('no series');
  });

  it('is read wherever it begins in a larger buffer', () => {
    const trace = aTrace([1.5, 2.5]);
    const { timeSeconds: _time, values: _values, ...meta } = trace;
    const encoded = encodeSeries(trace);
    const shifted = new Uint8Array(encoded.byteLength + 3);
    shifted.set(encoded, 3);
    expect(decodeSeries(shifted.subarray(3), meta)).toEqual(trace);
  });
});
