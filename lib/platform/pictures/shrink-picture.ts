import 'server-only';
import { execFile } from 'node:child_process';
import path from 'node:path';
import { AppError } from '../errors';
import { log } from '../log';

export interface ShrunkSize {
  width: number;
  height: number;
  bytes: number;
}

const MOST_MEMORY_KB = 2_000_000;
const MOST_MS = 30_000;

let line: Promise<unknown> = Promise.resolve();

/**
 * Two sizes of a picture, made in a child process under limits of memory and time, one picture at a time. V8's own
 * limit doesn't bound what a decoder takes, so the shell's does.
 *
 * @throws {AppError} unsupported-kind where the picture can't be decoded within them.
 */
export function shrinkPicture(
  input: string,
  large: string,
  small: string,
): Promise<{ large: ShrunkSize; small: ShrunkSize }> {
  const mine = line.then(() => runWorker(input, large, small));
  line = mine.catch(() => undefined);
  return mine;
}

function runWorker(input: string, large: string, small: string): Promise<{ large: ShrunkSize; small: ShrunkSize }> {
  const worker = path.join(process.cwd(), 'lib/platform/pictures/shrink-worker.mjs');
  const script = `ulimit -v ${MOST_MEMORY_KB}; exec "$0" "$@"`;
  return new Promise((resolve, reject) => {
    execFile(
      'bash',
      ['-c', script, process.execPath, worker, input, large, small],
      // Nothing of the server's environment is the decoder's business.
      { timeout: MOST_MS, killSignal: 'SIGKILL', env: { NODE_ENV: 'production' }, maxBuffer: 100_000 },
      (error, stdout) => {
        if (error) {
          log().warn({ reason: error.message.slice(0, 300) }, 'a picture could not be decoded');
          const message =
            'The picture can’t be decoded; it may be cut off or too large. Save it again as JPEG and choose that file.';
          return reject(new AppError('unsupported-kind', message));
        }
        resolve(JSON.parse(stdout) as { large: ShrunkSize; small: ShrunkSize });
      },
    );
  });
}
