import { execFileSync } from 'node:child_process';
import os from 'node:os';
import { setTimeout as pause } from 'node:timers/promises';
import { afterAll, describe, expect, it } from 'vitest';
import { freePort } from '@/lib/ops/cluster.mjs';
import { ClonedSite } from './cloned-site';

const UP = 'Ctrl-C ends it.';
const STEPS = [
  'Installing the locked dependencies',
  'Making a private PostgreSQL cluster',
  'Starting PostgreSQL',
  'Bringing the database up to date',
  'Seeding the demonstration',
  'Building the application',
  UP,
];

const root = process.getuid?.() === 0;
const stranger = `wattcairn-${process.pid}`;
if (root) execFileSync('useradd', ['--create-home', stranger]);
afterAll(() => {
  if (root) execFileSync('userdel', ['--remove', stranger], { stdio: 'ignore' });
});

const people: [string, string, string | null][] = [['the home of who runs this', os.homedir(), null]];
if (root) people.push(['an ordinary user’s home', `/home/${stranger}`, stranger]);

describe.each(people)('npm start in a clean clone in %s', (_where, home, user) => {
  let site: ClonedSite | null = null;
  afterAll(async () => {
    await site?.interrupt().catch(() => {});
    site?.destroy();
  }, 120_000);

  it('reaches the site though it was killed in each of its steps', async () => {
    site = new ClonedSite(home, user, await freePort());
    for (const step of STEPS) {
      for (const what of ['start', 'everything'] as const) {
        site.start();
        // A step that an earlier round got through isn't taken again: then the whole start is what is tried.
        await Promise.race([site.untilSaid(step), site.untilSaid(UP)]);
        await pause(500);
        await site.kill(what);
      }
    }
    site.start();
    expect(await site.untilSaid(UP), site.said).toBe(true);
    expect((await fetch(site.origin)).status).toBe(200);
  }, 900_000);

  it('has the whole demonstration, its figures equal to a recomputation', () => {
    expect(site?.run('recompute', '--check')).toMatch(/equal a recomputation/);
  }, 60_000);

  it('leaves nothing running after Ctrl-C, and starts again within seconds', async () => {
    if (!site) throw new Error('There is no site.');
    await site.interrupt();
    expect(site.processes()).toEqual([]);
    const began = Date.now();
    site.start();
    expect(await site.untilSaid(UP), site.said).toBe(true);
    expect(Date.now() - began).toBeLessThan(15_000);
  }, 60_000);

  it('refuses to run twice from one folder, and says how to go on', async () => {
    if (!site) throw new Error('There is no site.');
    expect(() => site?.run('start')).toThrow(/runs from this folder already/);
    expect((await fetch(site.origin)).status).toBe(200);
  }, 60_000);
});
