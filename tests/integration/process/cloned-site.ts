import { type ChildProcess, execFileSync, spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { once } from 'node:events';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';

/** A clean clone in somebody's home, started as they would: with npm start and nothing before it. */
export class ClonedSite {
  private readonly home: string;
  private readonly user: string | null;
  private npm: ChildProcess | null = null;
  private output = '';
  readonly root: string;
  readonly origin: string;

  constructor(home: string, user: string | null, port: number) {
    this.home = home;
    this.user = user;
    this.root = path.join(mkdtempSync(path.join(home, 'wattcairn-')), 'clone');
    this.origin = `http://127.0.0.1:${port}`;
    execFileSync('git', ['clone', '--quiet', process.cwd(), this.root]);
    if (user) execFileSync('chown', ['-R', user, path.dirname(this.root)]);
  }

  start(): void {
    const [command, args] = this.asTheUser('npm', 'start');
    const options = { cwd: this.root, env: this.env };
    this.output = '';
    const npm = spawn(command, args, { ...options, detached: true, stdio: ['ignore', 'pipe', 'pipe'] });
    for (const stream of [npm.stdout, npm.stderr]) stream.on('data', (part) => (this.output += String(part)));
    this.npm = npm;
  }

  /** Until this was printed; false where it ended before. */
  async untilSaid(text: string): Promise<boolean> {
    while (!this.output.includes(text)) {
      if (!this.npm || this.npm.exitCode !== null || this.npm.signalCode !== null) return false;
      await pause(20);
    }
    return true;
  }

  /** With everything it started (as a crash of the machine), or npm's own child alone (as the kernel short of memory). */
  async kill(what: 'everything' | 'start'): Promise<void> {
    const npm = this.npm;
    if (!npm?.pid) return;
    const ended = npm.exitCode === null && npm.signalCode === null ? once(npm, 'exit') : null;
    if (what === 'everything') process.kill(-npm.pid, 'SIGKILL');
    else {
      const { pid } = JSON.parse(readFileSync(path.join(this.root, '.data', 'running.json'), 'utf8')) as {
        pid: number;
      };
      process.kill(pid, 'SIGKILL');
    }
    await ended;
  }

  /** As Ctrl-C does: the whole group hears it. */
  async interrupt(): Promise<void> {
    const npm = this.npm;
    if (!npm?.pid) return;
    const ended = once(npm, 'exit');
    process.kill(-npm.pid, 'SIGINT');
    await ended;
    while (this.processes().length > 0) await pause(50);
  }

  /** What runs of it, npm aside. */
  processes(): string[] {
    const lines = execFileSync('ps', ['-eo', 'args'], { encoding: 'utf8' }).split('\n');
    return lines.filter((line) => line.includes(`${this.root}/`) || line.includes(this.clusterFolder));
  }

  private get clusterFolder(): string {
    return `/var/lib/wattcairn/${createHash('sha256').update(this.root).digest('hex').slice(0, 12)}`;
  }

  run(script: string, ...args: string[]): string {
    const [command, rest] = this.asTheUser('npm', 'run', '--silent', script, '--', ...args);
    return execFileSync(command, rest, { cwd: this.root, env: this.env, encoding: 'utf8' });
  }

  private asTheUser(...command: string[]): [string, string[]] {
    const [program = '', ...args] = this.user ? ['runuser', '-u', this.user, '--', ...command] : command;
    return [program, args];
  }

  /** As a fresh terminal has it: nothing of the npm, the test runner or the database that this runs under. */
  private get env(): NodeJS.ProcessEnv {
    const ours = /^(npm_|INIT_CWD$|NODE_ENV$|NODE_OPTIONS$|VITEST|TEST$|DATABASE_|NEXT_|TZ$)/i;
    const kept = Object.entries(process.env).filter(([name]) => !ours.test(name));
    const fresh = { ...Object.fromEntries(kept), HOME: this.home, PORT: new URL(this.origin).port };
    // The framework's types ask for a NODE_ENV, which a fresh terminal has not.
    return fresh as unknown as NodeJS.ProcessEnv;
  }

  get said(): string {
    return this.output;
  }

  destroy(): void {
    rmSync(path.dirname(this.root), { recursive: true, force: true });
    rmSync(this.clusterFolder, { recursive: true, force: true });
  }
}
