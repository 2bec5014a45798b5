import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { once } from 'node:events';
import { existsSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import pg from 'pg';
import { startCluster } from '@/lib/ops/cluster.mjs';

const source = path.resolve('lib/ops/cluster.mjs');

/** A folder that stands for a project, with a cluster of its own that a test may ruin. */
export class ScratchCluster {
  readonly root = mkdtempSync(path.join(os.tmpdir(), 'wattcairn-process-'));

  /** Where the cluster's files are: see startCluster. */
  get folder(): string {
    const hash = createHash('sha256').update(this.root).digest('hex').slice(0, 12);
    return process.getuid?.() === 0 ? `/var/lib/wattcairn/${hash}/cluster` : path.join(this.root, '.data', 'cluster');
  }

  start() {
    return startCluster({ root: this.root });
  }

  /**
   * Starts it in a process that is killed as soon as a folder of this kind ('.half-made', or '' for the final one)
   * holds a file; says whether it came to that.
   */
  async startAndKillAt(kind: string, file: string): Promise<boolean> {
    const program = `import { startCluster } from ${JSON.stringify(source)};
      await startCluster({ root: ${JSON.stringify(this.root)} }); process.exit(0);`;
    const child = spawn(process.execPath, ['--input-type=module', '-e', program], {
      stdio: ['ignore', 'ignore', 'inherit'],
    });
    const beside = path.dirname(this.folder);
    const known = this.foldersBeside();
    const watched = setInterval(() => {
      const made = this.foldersBeside().filter((name) =>
        kind ? name.startsWith(`cluster${kind}`) : name === 'cluster',
      );
      const ofThisStart = kind ? made.filter((name) => !known.includes(name)) : made;
      if (ofThisStart.some((name) => existsSync(path.join(beside, name, file)))) child.kill('SIGKILL');
    }, 1);
    await once(child, 'exit');
    clearInterval(watched);
    return child.signalCode === 'SIGKILL';
  }

  private foldersBeside(): string[] {
    const beside = path.dirname(this.folder);
    return existsSync(beside) ? readdirSync(beside) : [];
  }

  async destroy(): Promise<void> {
    const { stop } = await this.start();
    await stop();
    rmSync(this.root, { recursive: true, force: true });
    if (!this.folder.startsWith(this.root)) rmSync(path.dirname(this.folder), { recursive: true, force: true });
  }
}

/** One statement on a connection of its own. */
export async function ask(url: string, statement: string): Promise<Record<string, unknown>[]> {
  const client = new pg.Client(url);
  // A server that is killed says so on the idle connection too, beside the statement's own failure.
  client.on('error', () => {});
  await client.connect();
  try {
    return (await client.query<Record<string, unknown>>(statement)).rows;
  } finally {
    await client.end();
  }
}
