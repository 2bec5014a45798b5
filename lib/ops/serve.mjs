import http from 'node:http';
import compression from 'compression';
import next from 'next';
import { governResponse, standingHeaders } from './response-policy.mjs';

/**
 * The server: a thin entry around Next that binds loopback, believes no forwarding header, refuses methods that pages
 * have no answer to, and sets what every answer carries. It ends when its parent goes away.
 */
const development = process.argv.includes('--dev');
const root = process.cwd();
const port = Number(process.env.PORT ?? '3000');
const host = process.env.HOST ?? '127.0.0.1';
const origin = new URL(process.env.PUBLIC_ORIGIN ?? `http://127.0.0.1:${port}`);
const trustProxy = process.env.TRUST_PROXY === '1';

const READING = new Set(['GET', 'HEAD']);
const METHODS = new Set(['GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE', 'OPTIONS']);
/** What a proxy, or a stranger who plays one, says of a request; and what the framework tells itself. */
const NOT_BELIEVED =
  /^(x-forwarded-|forwarded$|x-real-ip$|x-wattcairn-|x-middleware-|x-invoke-|x-matched-path$|x-original-url$|x-rewrite-url$)/;

const app = next({ dev: development, dir: root, hostname: host, port });
await app.prepare();
const handle = app.getRequestHandler();
const compress = compression();
const headers = Object.entries(standingHeaders({ https: origin.protocol === 'https:' }));

const server = http.createServer((request, response) => {
  const address = clientAddress(request);
  for (const name of Object.keys(request.headers)) if (NOT_BELIEVED.test(name)) delete request.headers[name];
  request.headers['x-wattcairn-address'] = address;
  for (const [name, value] of headers)
    if (!development || name !== 'content-security-policy') response.setHeader(name, value);
  const path = request.url ?? '/';
  if (path === '/health') return void response.end('ok');
  const allowed = path.startsWith('/api/') ? METHODS : READING;
  if (!allowed.has(request.method ?? '')) {
    response.statusCode = 405;
    response.setHeader('allow', [...allowed].join(', '));
    response.setHeader('content-type', 'text/plain; charset=utf-8');
    return void response.end('This address doesn’t take that method.\n');
  }
  // Writes are taken from the public origin only, so a reader who typed another name of this machine is sent there.
  if (isOtherNameOfThisMachine(request.headers.host) && READING.has(request.method ?? '')) {
    response.statusCode = 307;
    response.setHeader('location', origin.origin + path);
    return void response.end();
  }
  if (development) return void handle(request, response);
  compress(request, response, () => {
    governResponse(request, response);
    void handle(request, response);
  });
});

if (!development) server.on('upgrade', (_request, socket) => socket.destroy());

server.on('error', (error) => {
  const taken = 'code' in error && error.code === 'EADDRINUSE';
  process.stderr.write(taken ? `Port ${port} is taken. Start with another: PORT=3001 npm start\n` : `${error.stack}\n`);
  process.exit(1);
});
server.listen(port, host, () => process.send?.('listening'));

// The start command holds the other end of this channel: when it is killed, so is the server.
process.on('disconnect', () => process.exit(0));
for (const signal of ['SIGINT', 'SIGTERM']) {
  process.on(signal, () => {
    server.close(() => process.exit(0));
    server.closeAllConnections();
  });
}

/** @param {http.IncomingMessage} request */
function clientAddress(request) {
  const direct = request.socket.remoteAddress ?? 'unknown';
  if (!trustProxy) return direct;
  // The proxy appends the address that it saw: the last one is its word, the others are the client's.
  const forwarded = String(request.headers['x-forwarded-for'] ?? '')
    .split(',')
    .at(-1)
    ?.trim();
  return forwarded || direct;
}

/** @param {string | undefined} requested */
function isOtherNameOfThisMachine(requested) {
  if (requested === undefined || requested === origin.host) return false;
  return [`localhost:${port}`, `127.0.0.1:${port}`, `[::1]:${port}`].includes(requested);
}
