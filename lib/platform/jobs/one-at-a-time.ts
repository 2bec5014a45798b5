import 'server-only';
import { AppError } from '../errors';

/** Runs what it is given, one after the other; what would have to wait too long is refused at once. */
export type Turns = <T>(run: () => Promise<T>) => Promise<T>;

/**
 * A queue for work that fills a processor or much memory, so that a few members at once don't take the machine from
 * everybody else.
 *
 * @param mostWaiting how many may stand in line behind the one that runs.
 * @throws {AppError} unavailable from the returned function where the line is full.
 */
export function oneAtATime(mostWaiting: number): Turns {
  let last: Promise<unknown> = Promise.resolve();
  let inLine = 0;
  return (run) => {
    if (inLine > mostWaiting) {
      const message = 'Many files are being worked on just now. Yours is still with you: send it again in a minute.';
      return Promise.reject(new AppError('unavailable', message, { retryAfterSeconds: 60 }));
    }
    inLine += 1;
    const mine = last.then(run).finally(() => (inLine -= 1));
    last = mine.catch(() => undefined);
    return mine;
  };
}
