import net from 'node:net';
import { beforeAll } from 'vitest';

// A test that reaches beyond this machine would pass here and fail on a plane: it is refused, with the address named.
const connect = net.Socket.prototype.connect;
const isLocal = (host: string | undefined) =>
  host === undefined || host === 'localhost' || host === '::1' || host.startsWith('127.');

beforeAll(() => {
  net.Socket.prototype.connect = function refuseOutside(this: net.Socket, ...args: unknown[]) {
    const first = Array.isArray(args[0]) ? args[0][0] : args[0];
    const host =
      typeof first === 'object' && first !== null ? (first as { host?: string }).host : (args[1] as string | undefined);
    if (typeof host === 'string' && !isLocal(host)) throw new Error(`A test tried to reach ${host}.`);
    return Reflect.apply(connect, this, args);
  } as typeof connect;
});
