import 'server-only';
import { env } from '../env';
import { AppError } from '../errors';

const READING = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Refuses a write that our own pages didn't send. Our origin comes from the environment, never from the request:
 * Host and forwarding headers are whatever a stranger writes into them.
 */
export function refuseForeignWrites(request: Request): void {
  if (READING.has(request.method)) return;
  if (request.headers.get('origin') === env().publicOrigin) return;
  throw new AppError(
    'not-allowed',
    `Writes are taken from ${env().publicOrigin} only. Open the site there and try again.`,
  );
}

/** The address a request came from, as the server entry saw it; the entry strips this header from what comes in. */
export function clientAddress(request: Request): string {
  return request.headers.get('x-wattcairn-address') ?? 'unknown';
}

/** An address with a NUL in it names nothing, and the database would fail over it. */
export function refuseOddAddress(url: URL): void {
  if (/%00/.test(url.pathname + url.search)) {
    throw new AppError('bad-request', 'The address holds a character that none has. Follow a link, or type it anew.');
  }
}
