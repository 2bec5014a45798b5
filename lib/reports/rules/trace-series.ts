import type { Trace } from '@/lib/measurement/traces/trace';

const MAGIC = 0x57435431;

/**
 * The compact column file of a trace: a magic word, the number of readings, the width of a value, then the times and
 * the values.
 */
export function encodeSeries(trace: Trace): Uint8Array {
  const n = trace.timeSeconds.length;
  const narrow = trace.kind !== 'counter' && keepsDigits(trace.values, trace.step);
  const bytes = new Uint8Array(16 + 8 * n + (narrow ? 4 : 8) * n);
  const head = new DataView(bytes.buffer);
  head.setUint32(0, MAGIC);
  head.setUint32(4, n);
  head.setUint32(8, narrow ? 4 : 8);
  bytes.set(new Uint8Array(trace.timeSeconds.slice().buffer), 16);
  const values = narrow ? Float32Array.from(trace.values) : trace.values.slice();
  bytes.set(new Uint8Array(values.buffer), 16 + 8 * n);
  return bytes;
}

/** @throws {Error} where the bytes are no series of ours, or shorter than they say. */
export function decodeSeries(bytes: Uint8Array, meta: Omit<Trace, 'timeSeconds' | 'values'>): Trace {
  const head = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const n = bytes.byteLength >= 16 && head.getUint32(0) === MAGIC ? head.getUint32(4) : -1;
  const width = n >= 0 ? head.getUint32(8) : 8;
  if (n < 0 || bytes.byteLength !== 16 + (8 + width) * n) throw new Error('These bytes are no series.');
  // A copy begins at an aligned address, which the columns need.
  const copy = bytes.slice().buffer;
  const timeSeconds = new Float64Array(copy, 16, n);
  if (width === 8) return { ...meta, timeSeconds, values: new Float64Array(copy, 16 + 8 * n, n) };
  const narrow = new Float32Array(copy, 16 + 8 * n, n);
  return { ...meta, timeSeconds, values: roundToStep(narrow, meta.step) };
}

/** Whether every reading comes back to the last digit from float32 and the logger's step. */
function keepsDigits(values: Float64Array, step: number): boolean {
  const back = roundToStep(Float32Array.from(values), step);
  return values.every((value, i) => value === back[i]);
}

/** A reading is a whole number of steps: what float32 blurred is put back on it. */
function roundToStep(values: Float32Array, step: number): Float64Array {
  if (step === 0) return Float64Array.from(values);
  const factor = 10 ** Math.min(12, Math.max(0, Math.ceil(-Math.log10(step) - 1e-6)));
  return Float64Array.from(values, (value) => Math.round(value * factor) / factor);
}
