import { existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import net from 'node:net';
import path from 'node:path';
import { StartError } from './console.mjs';

/**
 * One `npm start` a folder: a second would stop the first one's cluster when it ends. The file of one that was killed
 * names a process that is no more, or another program's.
 * @param {string} root
 * @param {string} origin
 * @returns {() => void} gives the turn back.
 * @throws {StartError} while another runs.
 */
export function takeTurn(root, origin) {
  const other = runningStart(root);
  if (other) {
    throw new StartError(
      `Wattcairn runs from this folder already, as process ${other.pid}, at ${other.origin}. End it there with Ctrl-C (or kill ${other.pid}), then start again.`,
    );
  }
  const file = turnFile(root);
  mkdirSync(path.dirname(file), { recursive: true, mode: 0o700 });
  writeFileSync(`${file}.new`, JSON.stringify({ pid: process.pid, started: startOf(process.pid), origin }));
  renameSync(`${file}.new`, file);
  return () => rmSync(file, { force: true });
}

/**
 * The start that runs from this folder, or null.
 * @param {string} root
 * @returns {{ pid: number, origin: string } | null}
 */
export function runningStart(root) {
  const file = turnFile(root);
  if (!existsSync(file)) return null;
  try {
    const { pid, started, origin } = JSON.parse(readFileSync(file, 'utf8'));
    return pid !== process.pid && startOf(pid) === started ? { pid, origin } : null;
  } catch {
    return null;
  }
}

/** @throws {StartError} where another program has the port; found out before anything slow is begun. */
export async function claimPort(port, host = '127.0.0.1') {
  await new Promise((resolve, reject) => {
    const probe = net.createServer();
    probe.once('error', () =>
      reject(new StartError(`Port ${port} is taken. Start with another: PORT=${Number(port) + 1} npm start`)),
    );
    probe.listen(Number(port), host, () => probe.close(resolve));
  });
}

/**
 * Calls back when npm, or the shell it put between us, is gone: whoever killed it meant us.
 * @param {() => void} end
 */
export function watchCallers(end) {
  const callers = [process.ppid, parentOf(process.ppid)];
  if (process.env.npm_lifecycle_event === undefined) return;
  setInterval(() => {
    if (process.ppid !== callers[0] || parentOf(process.ppid) !== callers[1]) end();
  }, 1000).unref();
}

const turnFile = (root) => path.join(root, '.data', 'running.json');

/** When a process began, in the kernel's ticks: its number alone comes back for another one. Empty where there is none. */
function startOf(pid) {
  const [state = 'X', ...rest] = statOf(pid);
  // One that has ended stays in the list until its parent has heard of it.
  return state === 'Z' || state === 'X' ? '' : (rest[18] ?? '');
}

const parentOf = (pid) => Number(statOf(pid)[1] ?? 0);

/** The fields of /proc/PID/stat behind the program's name, which may hold blanks. */
function statOf(pid) {
  try {
    const text = readFileSync(`/proc/${pid}/stat`, 'utf8');
    return text.slice(text.lastIndexOf(')') + 2).split(' ');
  } catch {
    return [];
  }
}
