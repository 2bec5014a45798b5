import { type ChildProcess, execFile, spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync, mkdtempSync, readFileSync, rmSync, statSync, readdirSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { promisify } from 'node:util';
import { freePort } from '@/lib/ops/cluster.mjs';

const project = process.cwd();
const folder = path.join(project, 'tests/fixtures/cache-app');

/**
 * A small site with a page kept by our cache, built by Next and served by our own server, over a file that stands for
 * the database: so a test can hold a rendering between its reading and its end.
 */
export class FixtureSite {
  private readonly scratch = mkdtempSync(path.join(os.tmpdir(), 'wattcairn-cache-'));
  private readonly data = path.join(this.scratch, 'data.json');
  private readonly dist = `.next-${path.basename(this.scratch)}`;
  private server: ChildProcess | null = null;
  private port = 0;

  private get env() {
    return { ...process.env, NODE_ENV: 'production', NEXT_DIST_DIR: this.dist, DATA_FILE: this.data } as const;
  }

  async build(): Promise<void> {
    const next = path.join(project, 'node_modules/next/dist/bin/next');
    await promisify(execFile)(process.execPath, [next, 'build'], { cwd: folder, env: this.env });
  }

  async start(): Promise<void> {
    this.port = await freePort();
    const env = { ...this.env, PORT: String(this.port), PUBLIC_ORIGIN: this.origin };
    const args = ['--expose-gc', path.join(project, 'lib/ops/serve.mjs')];
    this.server = spawn(process.execPath, args, { cwd: folder, env, stdio: ['ignore', 'ignore', 'inherit', 'ipc'] });
    await once(this.server, 'message');
  }

  /** As a power cut would: nothing is tidied up. */
  async kill(): Promise<void> {
    const server = this.server;
    if (!server || server.exitCode !== null) return;
    this.server = null;
    server.kill('SIGKILL');
    await once(server, 'exit');
  }

  async destroy(): Promise<void> {
    await this.kill();
    rmSync(this.scratch, { recursive: true, force: true });
    rmSync(path.join(folder, this.dist), { recursive: true, force: true });
  }

  get origin(): string {
    return `http://127.0.0.1:${this.port}`;
  }

  /** What stands in the database, put there behind the site's back. */
  put(devices: Record<string, { watts: number }>): void {
    writeFileSync(this.data, JSON.stringify(devices));
  }

  get(address: string, headers: Record<string, string> = {}): Promise<Response> {
    return fetch(this.origin + address, { headers });
  }

  /** The watts that a page shows, or its status where it shows none. */
  async watts(address: string, headers: Record<string, string> = {}): Promise<number> {
    const response = await this.get(address, headers);
    const shown = /(\d+) W\b/.exec(await response.text());
    return shown ? Number(shown[1]) : response.status;
  }

  async commit(slug: string, watts: number): Promise<void> {
    const body = JSON.stringify({ slug, watts });
    const response = await fetch(`${this.origin}/api/commit`, { method: 'POST', body });
    if (response.status !== 204) throw new Error(`The commit was answered with ${response.status}.`);
  }

  /** From now on a rendering that has read waits; answers a way to let them all go on. */
  hold(): () => void {
    rmSync(`${this.data}.read`, { force: true });
    writeFileSync(`${this.data}.hold`, '');
    return () => rmSync(`${this.data}.hold`, { force: true });
  }

  async untilRead(slug: string): Promise<void> {
    const mark = `${this.data}.read`;
    while (!existsSync(mark) || readFileSync(mark, 'utf8') !== slug) await pause(5);
  }

  async memory(): Promise<{ heapBytes: number; entries: number; bytes: number; lifetimes: number }> {
    return (await (await this.get('/api/memory')).json()) as Awaited<ReturnType<FixtureSite['memory']>>;
  }

  bytesOnDisk(): number {
    const entries = readdirSync(path.join(folder, this.dist), { recursive: true, withFileTypes: true });
    const files = entries.filter((entry) => entry.isFile());
    return files.reduce((sum, file) => sum + statSync(path.join(file.parentPath, file.name)).size, 0);
  }
}
