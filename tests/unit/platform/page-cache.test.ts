import { beforeEach, describe, expect, it } from 'vitest';
import MemoryCache, { store } from '@/lib/platform/cache/handler.mjs';

const page = (html: string, tags = 'device:1') => ({ kind: 'APP_PAGE', html, headers: { 'x-next-cache-tags': tags } });
/** Next makes one a request. */
const request = () => new MemoryCache();

beforeEach(() => {
  store.entries.clear();
  store.droppedAt.clear();
  Object.assign(store, { bytes: 0, forgottenUntil: 0 });
});

describe('the page cache', () => {
  it('gives back what was kept, to other requests too', async () => {
    await request().set('/a', page('one'), { cacheControl: { revalidate: false } });
    expect(await request().get('/a')).toMatchObject({ value: { html: 'one' }, cacheControl: { revalidate: false } });
  });

  it('stays within its bound and lets go of what was not read for longest', async () => {
    const megabytes = (n: number) => page('x'.repeat(n * 512 * 1024));
    for (let n = 0; n < 24; n += 1) await request().set(`/${n}`, megabytes(7), {});
    expect(await request().get('/0')).not.toBeNull();
    for (let n = 24; n < 40; n += 1) {
      await request().set(`/${n}`, megabytes(7), {});
      await request().get('/0');
    }
    expect(store.bytes).toBeLessThanOrEqual(192 * 1024 * 1024);
    expect(store.bytes).toBe([...store.entries.values()].reduce((sum, entry) => sum + entry.bytes, 0));
    expect(await request().get('/0')).not.toBeNull();
    expect(await request().get('/1')).toBeNull();
  });

  it('keeps no page that would fill an eighth of it', async () => {
    await request().set('/huge', page('x'.repeat(16 * 1024 * 1024)), {});
    expect(await request().get('/huge')).toBeNull();
  });

  it('refuses what was begun before its tag was dropped, and keeps what was begun after', async () => {
    const early = request();
    await request().revalidateTag(['device:1']);
    await early.set('/a', page('old'), {});
    expect(await request().get('/a')).toBeNull();
    await request().set('/a', page('new'), {});
    expect(await request().get('/a')).not.toBeNull();
  });

  it('keeps what was begun before another tag was dropped', async () => {
    const early = request();
    await request().revalidateTag('device:2');
    await early.set('/a', page('one'), {});
    expect(await request().get('/a')).not.toBeNull();
  });

  it('refuses data begun before the tag of its call was dropped', async () => {
    const early = request();
    await request().revalidateTag('device:1');
    await early.set('key', { kind: 'FETCH', data: { body: '1' } }, { fetchCache: true, tags: ['device:1'] });
    expect(await request().get('key', { tags: ['device:1'] })).toBeNull();
  });

  it('remembers a bounded number of dropped tags, and keeps nothing begun before those it forgot', async () => {
    const early = request();
    for (let n = 0; n < 20_050; n += 1) await request().revalidateTag(`device:${n}`);
    expect(store.droppedAt.size).toBe(20_000);
    await early.set('/a', page('old', 'device:3'), {});
    expect(await request().get('/a')).toBeNull();
  });

  it('keeps no answer that says that something failed or was not found, and forgets the one before it', async () => {
    for (const status of [404, 500]) {
      await request().set('/a', page('one'), {});
      await request().set('/a', { ...page('nothing'), status }, {});
      expect(await request().get('/a')).toBeNull();
    }
    await request().set('/a', page('one'), {});
    await request().set('/a', null, {});
    expect(await request().get('/a')).toBeNull();
  });
});
