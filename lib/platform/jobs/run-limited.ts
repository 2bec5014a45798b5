import 'server-only';
import { spawn } from 'node:child_process';

export interface LimitedRun {
  /** A program of ours and its arguments, for this very Node. */
  args: string[];
  /** What it gets to read. */
  input?: string;
  /**
   * Address space, where memory is a decoder's to take: V8's own limit doesn't bound that, so the shell's does. Left out
   * for a program in TypeScript, whose loader reserves ten gigabytes of addresses that it never fills.
   */
  mostAddressKb?: number;
  mostMs: number;
}

const MOST_OUTPUT = 8_000_000;

/**
 * Runs a program of ours in a process of its own, under limits of time and memory: what strangers send is decoded
 * there, and a bomb ends that process alone.
 *
 * @returns what it printed.
 * @throws {Error} where it failed or was stopped, with the end of what it complained of.
 */
export function runLimited({ args, input, mostAddressKb, mostMs }: LimitedRun): Promise<string> {
  const limit = mostAddressKb === undefined ? '' : `ulimit -v ${mostAddressKb};`;
  const script = `${limit} exec "$0" "$@"`;
  return new Promise((resolve, reject) => {
    const child = spawn('bash', ['-c', script, process.execPath, ...args], {
      cwd: process.cwd(),
      // Nothing of the server's environment is that process's business.
      env: { NODE_ENV: 'production', PATH: '/usr/local/bin:/usr/bin:/bin' },
      timeout: mostMs,
      killSignal: 'SIGKILL',
    });
    let printed = '';
    let complained = '';
    child.stdout.setEncoding('utf8').on('data', (text: string) => {
      printed += text;
      if (printed.length > MOST_OUTPUT) child.kill('SIGKILL');
    });
    child.stderr.setEncoding('utf8').on('data', (text: string) => (complained = (complained + text).slice(-2000)));
    child.on('error', reject);
    child.on('close', (code, signal) => {
      if (code === 0) resolve(printed);
      else reject(new Error(`it ended with ${signal ?? code}: ${complained.trim().slice(-500)}`));
    });
    // A child that died before it read everything closes the pipe; its exit tells the rest.
    child.stdin.on('error', () => undefined);
    child.stdin.end(input ?? '');
  });
}
