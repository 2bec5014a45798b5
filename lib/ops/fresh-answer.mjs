import http from 'node:http';
import { store } from '../platform/cache/handler.mjs';

/**
 * Next lets requests for one page share a rendering that is under way. One that came in after a commit could so be
 * answered with what was read before it. Whoever reads is therefore entered here, the cache marks those whose page
 * may have been rendered from before their arrival, and the server asks for these once more: what is rendered then
 * began after the request came in.
 * @param {http.ServerResponse} response
 * @returns {{ outdated: boolean }}
 */
export function watchReading(response) {
  const reader = { arrived: store.drops, outdated: false };
  store.readers.add(reader);
  response.once('close', () => store.readers.delete(reader));
  return reader;
}

/**
 * Asks this very server again and hands on what it says.
 * @param {http.IncomingMessage} request
 * @param {(status: number, headers: http.IncomingHttpHeaders, body: Buffer) => void} answer
 */
export function askAgain(request, answer) {
  const { localAddress, localPort } = request.socket;
  const headers = { ...request.headers, 'accept-encoding': 'identity', connection: 'close' };
  const again = http.request(
    { host: localAddress, port: localPort, method: request.method, path: request.url, headers },
    (response) => {
      /** @type {Buffer[]} */
      const parts = [];
      response.on('data', (part) => parts.push(part));
      response.on('end', () => {
        const { connection, 'keep-alive': keepAlive, 'transfer-encoding': encoding, ...kept } = response.headers;
        void [connection, keepAlive, encoding];
        answer(response.statusCode ?? 500, kept, Buffer.concat(parts));
      });
    },
  );
  again.on('error', () =>
    answer(503, { 'retry-after': '1' }, Buffer.from('The page changed meanwhile; load it again.')),
  );
  again.end();
}
