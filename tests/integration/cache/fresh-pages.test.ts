import { setTimeout as pause } from 'node:timers/promises';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { FixtureSite } from './fixture-site';

const site = new FixtureSite();

beforeAll(async () => {
  site.put({});
  await site.build();
}, 120_000);

beforeEach(async () => {
  await site.kill();
  site.put({ kettle: { watts: 5 } });
  await site.start();
});

afterAll(() => site.destroy());

describe('a kept page', () => {
  it('is rendered once for all its readers', async () => {
    const first = await (await site.get('/device/kettle')).text();
    expect(await (await site.get('/device/kettle')).text()).toBe(first);
  });

  it('shows, right after the answer to each of fifty commits, what was committed', async () => {
    for (let watts = 10; watts < 60; watts += 1) {
      await site.commit('kettle', watts);
      const seen = await Promise.all([
        site.watts('/device/kettle'),
        site.watts('/list'),
        site.watts('/device/kettle', { rsc: '1' }),
      ]);
      expect(seen).toEqual([watts, watts, watts]);
    }
  });

  it('never lives longer than its rendering when a commit came between its reading and its end', async () => {
    const release = site.hold();
    const early = site.watts('/device/kettle');
    await site.untilRead('kettle');
    await site.commit('kettle', 6);
    release();
    expect(await early).toBe(5);
    expect(await site.watts('/device/kettle')).toBe(6);
    expect(await site.watts('/list')).toBe(6);
  });

  it('is rendered anew for who asks after a commit while a rendering from before it is still under way', async () => {
    const release = site.hold();
    const early = site.watts('/device/kettle');
    await site.untilRead('kettle');
    await site.commit('kettle', 6);
    const late = [site.watts('/device/kettle'), site.watts('/device/kettle', { rsc: '1' })];
    await pause(200);
    release();
    expect(await early).toBe(5);
    expect(await Promise.all(late)).toEqual([6, 6]);
  });

  it('is not called unchanged for a browser that kept the page from before a commit', async () => {
    const etag = (await site.get('/device/kettle')).headers.get('etag') ?? '';
    const asBrowsersDo = { 'if-none-match': etag, 'cache-control': 'max-age=0' };
    expect((await site.get('/device/kettle', asBrowsersDo)).status).toBe(304);
    await site.commit('kettle', 6);
    expect((await site.get('/device/kettle', asBrowsersDo)).status).toBe(200);
  });

  it('is gone after a kill right behind the commit', async () => {
    expect(await site.watts('/device/kettle')).toBe(5);
    await site.commit('kettle', 6);
    await site.kill();
    await site.start();
    expect(await site.watts('/device/kettle')).toBe(6);
  });

  it('is gone after a kill between the commit and the dropping of its tag', async () => {
    expect(await site.watts('/device/kettle')).toBe(5);
    site.put({ kettle: { watts: 6 } });
    await site.kill();
    await site.start();
    expect(await site.watts('/device/kettle')).toBe(6);
  });

  it('may be held by no shared cache without asking', async () => {
    const response = await site.get('/device/kettle');
    expect(response.headers.get('cache-control')).toBe('no-cache');
    expect(response.headers.get('etag')).toBeTruthy();
  });
});

describe('an address that leads nowhere', () => {
  it('leads to the device as soon as it is made', async () => {
    expect(await site.watts('/device/toaster')).toBe(404);
    expect(await site.watts('/device/toaster')).toBe(404);
    await site.commit('toaster', 800);
    expect(await site.watts('/device/toaster')).toBe(800);
  });

  it('leads to the device for who asks after it was made, though a search from before finds nothing', async () => {
    const release = site.hold();
    const early = site.watts('/device/toaster');
    await site.untilRead('toaster');
    await site.commit('toaster', 800);
    const late = site.watts('/device/toaster');
    await pause(200);
    release();
    expect(await early).toBe(404);
    expect(await late).toBe(800);
  });

  it('costs neither memory nor disk, a thousand times over', async () => {
    const ask = async (from: number) => {
      for (let n = from; n < from + 1000; n += 20) {
        await Promise.all(
          Array.from({ length: 20 }, (_, i) => site.get(`/device/nothing-${n + i}`).then((r) => r.text())),
        );
      }
    };
    // The first thousand warm up what the process keeps for all addresses together.
    await ask(0);
    const before = { ...(await site.memory()), disk: site.bytesOnDisk() };
    await ask(1000);
    const after = { ...(await site.memory()), disk: site.bytesOnDisk() };
    expect(after.disk).toBe(before.disk);
    expect(after.lifetimes).toBe(before.lifetimes);
    expect(after.heapBytes - before.heapBytes).toBeLessThan(8_000_000);
  }, 120_000);
});
