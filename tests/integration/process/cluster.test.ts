import { spawn } from 'node:child_process';
import { existsSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { afterAll, describe, expect, it } from 'vitest';
import { APPLICATION, OWNER } from '@/lib/ops/cluster.mjs';
import { ask, ScratchCluster } from './scratch-cluster';

const scratch = new ScratchCluster();

afterAll(() => scratch.destroy(), 60_000);

describe('the private cluster', () => {
  // In the order in which initdb and PostgreSQL make them.
  it.each([
    ['.half-made', ''],
    ['.half-made', 'PG_VERSION'],
    ['.half-made', 'global/pg_control'],
    ['', 'PG_VERSION'],
    ['', 'postmaster.pid'],
  ])(
    'comes up though the start before it was killed when cluster%s/%s was there',
    async (kind, file) => {
      if (kind) rmSync(scratch.folder, { recursive: true, force: true });
      expect(await scratch.startAndKillAt(kind, file)).toBe(true);
      const { url, stop } = await scratch.start();
      expect(await ask(url(APPLICATION), 'select 1 as one')).toEqual([{ one: 1 }]);
      expect(await ask(url(OWNER), 'select current_user as me')).toEqual([{ me: OWNER }]);
      await stop();
    },
    60_000,
  );

  it('is adopted while it runs, on the port it had', async () => {
    const first = await scratch.start();
    const second = await scratch.start();
    expect(second.adopted).toBe(true);
    expect(second.port).toBe(first.port);
  });

  it('belongs to nobody privileged, and to nobody else', async () => {
    await scratch.start();
    const owner = statSync(scratch.folder);
    expect(owner.uid).not.toBe(0);
    expect(owner.mode & 0o077).toBe(0);
    expect(statSync(path.join(scratch.root, '.data', 'cluster.json')).mode & 0o077).toBe(0);
  });

  it('listens on loopback alone', async () => {
    const { port } = await scratch.start();
    const hex = port.toString(16).toUpperCase().padStart(4, '0');
    // As the kernel lists them: the address's bytes backwards, 0A for listening.
    const sockets = ['/proc/net/tcp', '/proc/net/tcp6'].flatMap((file) =>
      existsSync(file) ? readFileSync(file, 'utf8').split('\n') : [],
    );
    const listening = sockets.map((line) => line.trim().split(/\s+/)).filter(([, , , state]) => state === '0A');
    const ours = listening.map(([, local = '']) => local).filter((local) => local.endsWith(`:${hex}`));
    expect(ours).toEqual([`0100007F:${hex}`]);
  });

  it('lets nobody in without the password', async () => {
    const { url, superuser } = await scratch.start();
    for (const role of [OWNER, APPLICATION, superuser]) {
      const wrong = url(role, 'postgres').replace(/:[^:@]+@/, ':wrong@');
      await expect(ask(wrong, 'select 1')).rejects.toThrow(/password authentication failed/);
    }
  });

  it('gives the application no right to make or drop anything', async () => {
    const { url } = await scratch.start();
    for (const statement of ['create table t ()', 'create schema s', 'create role r', 'create database d']) {
      await expect(ask(url(APPLICATION), statement), statement).rejects.toThrow(/permission denied/);
    }
    await expect(ask(url(OWNER), 'create role r superuser')).rejects.toThrow(/permission denied|must be superuser/);
  });

  it('keeps what it has said it keeps: fsync, synchronous commits, full pages, checksums', async () => {
    const { url } = await scratch.start();
    for (const setting of ['fsync', 'synchronous_commit', 'full_page_writes', 'data_checksums']) {
      expect(await ask(url(APPLICATION), `show ${setting}`)).toEqual([{ [setting]: 'on' }]);
    }
  });

  it('comes up after its own processes were killed, with what was committed', async () => {
    const { url } = await scratch.start();
    await ask(url(OWNER), 'create table kept (n int)');
    await ask(url(OWNER), 'insert into kept values (42)');
    // It doesn't look up while it computes, so it outlives its server and stands in the next one's way.
    const busy = ask(url(OWNER), `select count(md5(n::text)) from generate_series(1, 4000000) n`).catch(() => null);
    await pause(200);
    process.kill(Number(readFileSync(path.join(scratch.folder, 'postmaster.pid'), 'utf8').split('\n')[0]), 'SIGKILL');
    const again = await scratch.start();
    expect(await ask(again.url(OWNER), 'select n from kept')).toEqual([{ n: 42 }]);
    await busy;
  }, 60_000);

  it('comes up though the number in its pid file is another program’s by now', async () => {
    const { stop } = await scratch.start();
    const file = path.join(scratch.folder, 'postmaster.pid');
    const left = readFileSync(file, 'utf8').split('\n');
    await stop();
    // Of the same user: PostgreSQL takes another user's for no server by itself.
    const other = spawn('sleep', ['60'], { uid: statSync(scratch.folder).uid });
    writeFileSync(file, [other.pid, ...left.slice(1)].join('\n'));
    const { url } = await scratch.start();
    expect(await ask(url(APPLICATION), 'select 1 as one')).toEqual([{ one: 1 }]);
    expect(other.signalCode, 'the other program was let be').toBeNull();
    other.kill();
  }, 60_000);

  it('is put aside, not deleted, when the passwords went with the folder it belonged to', async () => {
    await scratch.start();
    rmSync(path.join(scratch.root, '.data', 'cluster.json'));
    const { url } = await scratch.start();
    await expect(ask(url(OWNER), 'select n from kept')).rejects.toThrow(/does not exist/);
    const aside = readdirSync(path.dirname(scratch.folder)).find((name) => name.startsWith('cluster.aside-'));
    expect(existsSync(path.join(path.dirname(scratch.folder), aside ?? 'none', 'PG_VERSION'))).toBe(true);
  }, 60_000);
});
