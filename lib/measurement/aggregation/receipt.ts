import { byText } from './voices';
import type { Pool } from './pooling';
import type { PublishedFigure } from './types';

/** Whose figure a receipt is about. */
export interface ReceiptScope {
  kind: 'device' | 'category';
  id: string;
  pool: Pool;
}

/**
 * The text that a published figure's receipt hash is taken of: the figure, its inputs and what it is a figure of, as
 * canonical JSON. Whoever recomputes the figure from the same reports gets the same text, and so the same hash.
 *
 * @throws {RangeError} where a number is NaN or infinite.
 * @example receiptText({ kind: 'device', id: '7', pool }, figure) // '{"figure":{"atMost":false,…'
 */
export function receiptText(scope: ReceiptScope, figure: PublishedFigure): string {
  return canonicalJson({ figure, scope });
}

/**
 * JSON with the keys of every object in order of their code units and no spaces.
 *
 * Source: RFC 8785, JSON Canonicalization Scheme (numbers and text as ECMAScript writes them).
 * @param value of plain objects, lists, text, numbers, booleans and null; a key whose value is undefined is left out.
 * @throws {RangeError} where a number is NaN or infinite.
 * @example canonicalJson({ b: 1, a: [true, null] }) // '{"a":[true,null],"b":1}'
 */
export function canonicalJson(value: unknown): string {
  if (typeof value === 'number' && !Number.isFinite(value)) throw new RangeError('A receipt holds finite numbers.');
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
  if (typeof value !== 'object' || value === null) return JSON.stringify(value);
  const entries = Object.entries(value)
    .filter(([, item]) => item !== undefined)
    .sort(([a], [b]) => byText(a, b))
    .map(([key, item]) => `${JSON.stringify(key)}:${canonicalJson(item)}`);
  return `{${entries.join(',')}}`;
}
