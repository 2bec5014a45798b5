import 'server-only';
import pino from 'pino';
import { currentContext } from './context';
import { env } from './env';

const key = Symbol.for('wattcairn.log');
const holder = globalThis as unknown as Record<symbol, pino.Logger | undefined>;

/** The structured log, one JSON object a line (so that no name can forge a line), with the request's id. */
export function log(): pino.Logger {
  return (holder[key] ??= pino({
    level: env().logLevel,
    base: null,
    timestamp: pino.stdTimeFunctions.isoTime,
    mixin: () => {
      const context = currentContext();
      return context ? { requestId: context.requestId } : {};
    },
    redact: ['password', 'token', '*.password', '*.token', 'cookie', 'authorization'],
  }));
}
