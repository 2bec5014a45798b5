import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { canonicalJson, receiptText } from '@/lib/measurement/aggregation/receipt';
import { figures, published } from './figures';

const scope = {
  kind: 'device',
  id: '7',
  pool: { variantId: null, modeId: 5, quantity: 'mean-power', powerKind: 'real', supplyStratum: 'ac-230' },
} as const;

describe('canonical JSON', () => {
  it('is the worked example’s', () => {
    expect(canonicalJson({ b: 1, a: [true, null] })).toBe('{"a":[true,null],"b":1}');
  });

  it('orders keys by code units, at every depth, and writes numbers as ECMAScript does (RFC 8785, from memory)', () => {
    const input = { '\u20ac': 'Euro', '\r': 1e30, '1': [4.5, { z: 2e-3, a: 1e-27 }], é: 333333333.33333329 };
    expect(canonicalJson(input)).toBe('{"\\r":1e+30,"1":[4.5,{"a":1e-27,"z":0.002}],"é":333333333.3333333,"€":"Euro"}');
  });

  it('leaves out what is undefined, and reads back as the same value', () => {
    expect(canonicalJson({ a: undefined, b: 'x' })).toBe('{"b":"x"}');
    fc.assert(
      fc.property(fc.jsonValue({ noUnicodeString: false }), (value) => {
        const text = canonicalJson(value);
        expect(JSON.stringify(JSON.parse(text))).toBe(JSON.stringify(JSON.parse(canonicalJson(JSON.parse(text)))));
      }),
    );
  });

  it.each([Number.NaN, Infinity])('throws on %s', (odd) => {
    expect(() => canonicalJson({ a: [odd] })).toThrow(new RangeError('A receipt holds finite numbers.'));
  });
});

describe('a receipt', () => {
  it('is the same text, and so the same hash, whatever the order of the figures', () => {
    const input = figures(40, 41, 44, 47, 52);
    const hash = (text: string) => createHash('sha256').update(text).digest('hex');
    const one = receiptText(scope, published(input));
    const other = receiptText(scope, published([...input].reverse()));
    expect(hash(other)).toBe(hash(one));
    expect(one.startsWith('{"figure":{"atMost":false,')).toBe(true);
  });

  it('changes with any figure, and with what it is a figure of', () => {
    const input = figures(40, 41, 44);
    const text = receiptText(scope, published(input));
    expect(receiptText({ ...scope, id: '8' }, published(input))).not.toBe(text);
    const moved = input.map((item, i) => (i === 0 ? { ...item, value: 40.1 } : item));
    expect(receiptText(scope, published(moved))).not.toBe(text);
  });
});
