import { spawn } from 'node:child_process';

/** A failure with a sentence that says what to do; anything else that is thrown is a bug and keeps its stack. */
export class StartError extends Error {}

/** One line of progress. */
export function say(text) {
  process.stdout.write(`${text}\n`);
}

/**
 * Runs a program to its end.
 * @param {string} command
 * @param {string[]} args
 * @param {{ env?: Record<string, string | undefined>, cwd?: string, quiet?: boolean, input?: string }} options quiet
 * keeps what it prints for the error message.
 * @returns {Promise<string>} what it printed, when quiet.
 * @throws {StartError} when it ends with another code than 0.
 */
export function run(command, args, { env = process.env, cwd = process.cwd(), quiet = false, input } = {}) {
  return new Promise((resolve, reject) => {
    const stdin = input === undefined ? 'ignore' : 'pipe';
    const child = spawn(command, args, {
      env,
      cwd,
      stdio: quiet ? [stdin, 'pipe', 'pipe'] : [stdin, 'inherit', 'inherit'],
    });
    let output = '';
    child.stdout?.on('data', (chunk) => (output += chunk));
    child.stderr?.on('data', (chunk) => (output += chunk));
    child.on('error', (error) => reject(new StartError(`${command} can’t be run: ${error.message}`)));
    child.on('exit', (code, signal) => {
      if (code === 0) resolve(output);
      else reject(new StartError(`${command} ${args[0] ?? ''} ended with ${signal ?? code}.\n${output.trim()}`));
    });
    if (input !== undefined) child.stdin?.end(input);
  });
}
