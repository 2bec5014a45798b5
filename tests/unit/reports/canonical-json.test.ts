import { describe, expect, it } from 'vitest';
import { canonicalJson } from '@/lib/reports/rules/canonical-json';

describe('canonical JSON', () => {
  it('is the documented example', () => {
    expect(canonicalJson({ b: 1, a: [true, null] })).toBe('{"a":[true,null],"b":1}');
  });

  it('is the same whatever the order of keys, at every depth', () => {
    const one = { z: { b: [1, { y: 2, x: 3 }], a: 'ä' }, a: null };
    const other = { a: null, z: { a: 'ä', b: [1, { x: 3, y: 2 }] } };
    expect(canonicalJson(one)).toBe(canonicalJson(other));
  });

  it('leaves out what is undefined, and keeps the order of a list', () => {
    expect(canonicalJson({ a: undefined, b: [2, undefined, 1] })).toBe('{"b":[2,null,1]}');
  });

  it.each([0, -0, 1e21, 0.1, 1.0, 'a"\\\n\u2028', '', false])('reads back as the same value: %j', (value) => {
    expect(JSON.parse(canonicalJson(value))).toEqual(value === 0 ? 0 : value);
  });

  it('is what JSON has for an empty object and an empty list', () => {
    expect(canonicalJson({ a: {}, b: [] })).toBe('{"a":{},"b":[]}');
  });
});
