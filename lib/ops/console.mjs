import { spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import path from 'node:path';

/** A failure with a sentence that says what to do; anything else that is thrown is a bug and keeps its stack. */
export class StartError extends Error {}

/** Ctrl-C, or the end of the terminal: no failure, and nothing to explain. */
export class Interrupted extends Error {}

/** One line of progress. */
export function say(text) {
  process.stdout.write(`${text}\n`);
}

/** Says why a command ended, and makes it end so. */
export function explain(error) {
  if (error instanceof Interrupted) return;
  process.stderr.write(error instanceof StartError ? `\n${error.message}\n` : `\n${error.stack}\n`);
  process.exitCode = 1;
}

const SETPRIV = '/usr/bin/setpriv';
const running = new Set();
let interrupted = false;

/** From now on Ctrl-C ends the program that runs and then, by an Interrupted, the step; what was begun is tidied up. */
export function endOnSignals() {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
    process.on(signal, () => {
      interrupted = true;
      for (const child of running) child.kill('SIGTERM');
    });
  }
}

/** @throws {Interrupted} once a signal came. */
export function goOnUnlessInterrupted() {
  if (interrupted) throw new Interrupted();
}

/**
 * A command that the kernel ends when we are killed, so that the next start doesn't meet what this one left running.
 * @param {string} command
 * @param {string[]} args
 * @returns {[string, string[]]}
 */
export function boundToUs(command, args) {
  return existsSync(SETPRIV) ? [SETPRIV, ['--pdeathsig', 'KILL', '--', command, ...args]] : [command, args];
}

/**
 * Runs a program to its end.
 * @param {string} command
 * @param {string[]} args
 * @param {{ env?: Record<string, string | undefined>, cwd?: string, quiet?: boolean, input?: string, outlives?: boolean, tidies?: boolean }} options
 * quiet keeps what it prints for the error message; outlives lets it finish when we are killed, as a package manager
 * must; tidies lets it run after Ctrl-C.
 * @returns {Promise<string>} what it printed, when quiet.
 * @throws {StartError} when it ends with another code than 0.
 * @throws {Interrupted} when a signal came.
 */
export async function run(
  command,
  args,
  { env = process.env, cwd = process.cwd(), quiet = false, input, outlives = false, tidies = false } = {},
) {
  if (!tidies) goOnUnlessInterrupted();
  const stdin = input === undefined ? 'ignore' : 'pipe';
  const [program, rest] = outlives ? [command, args] : boundToUs(command, args);
  const child = spawn(program, rest, {
    env,
    cwd,
    stdio: quiet ? [stdin, 'pipe', 'pipe'] : [stdin, 'inherit', 'inherit'],
  });
  if (!tidies) running.add(child);
  try {
    return await untilDone(child, nameOf(command, args), { input, tidies });
  } finally {
    running.delete(child);
  }
}

function untilDone(child, name, { input, tidies }) {
  return new Promise((resolve, reject) => {
    let output = '';
    child.stdout?.on('data', (chunk) => (output += chunk));
    child.stderr?.on('data', (chunk) => (output += chunk));
    child.on('error', (error) => reject(new StartError(`${name} can’t be run: ${error.message}`)));
    child.on('exit', (code, signal) => {
      if (interrupted && !tidies) reject(new Interrupted());
      else if (code === 0) resolve(output);
      else reject(new StartError(`${name} ended with ${signal ?? code}.\n${output.trim()}`));
    });
    if (input !== undefined) child.stdin?.end(input);
  });
}

/** As a person would say it: the program that Node runs, not Node. */
function nameOf(command, args) {
  const file = args.find((argument) => /\.(ts|mjs|js)$/.test(argument));
  return [path.basename(command), file ? path.basename(file) : args[0]].filter(Boolean).join(' ');
}

/** Node with what our TypeScript programs need. */
export const TYPESCRIPT = ['--conditions=react-server', '--import', 'tsx'];
