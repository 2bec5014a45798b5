import { describe, expect, it } from 'vitest';
import { readJson, readQuery } from '@/lib/platform/http/body';

const post = (body: BodyInit, type = 'application/json') =>
  new Request('http://127.0.0.1/x', { method: 'POST', body, headers: { 'content-type': type } });

describe('readJson', () => {
  it('reads JSON, with a charset too', async () => {
    expect(await readJson(post('{"a":[1,null]}', 'application/json; charset=utf-8'))).toEqual({ a: [1, null] });
  });

  it('refuses another kind, so that a form of another site can’t write', async () => {
    await expect(readJson(post('{"a":1}', 'text/plain'))).rejects.toMatchObject({ code: 'unsupported-kind' });
  });

  it('stops at a megabyte, whatever the length header says', async () => {
    await expect(readJson(post(`"${'x'.repeat(1_000_001)}"`))).rejects.toMatchObject({ code: 'too-large' });
  });

  it('says that a body is no JSON', async () => {
    await expect(readJson(post('{"a":'))).rejects.toMatchObject({ code: 'bad-request' });
    await expect(readJson(post(new Uint8Array([0x22, 0xff, 0x22])))).rejects.toMatchObject({ code: 'bad-request' });
  });

  it('lets __proto__ change nothing', async () => {
    await readJson(post('{"__proto__":{"polluted":true}}'));
    expect(({} as { polluted?: boolean }).polluted).toBeUndefined();
  });
});

describe('readQuery', () => {
  it('makes a repeated parameter an array, which no schema for a single value takes', () => {
    expect({ ...readQuery(new URL('http://x/?id=1&id=2&q=a')) }).toEqual({ id: ['1', '2'], q: 'a' });
  });
});
