import { createHash } from 'node:crypto';
import { askAgain, watchReading } from './fresh-answer.mjs';

/**
 * Headers that every answer carries. A route may say something narrower for itself (a photo is sandboxed).
 * @param {{ https: boolean }} options
 */
export function standingHeaders({ https }) {
  return {
    'content-security-policy': contentPolicy([]),
    'cross-origin-opener-policy': 'same-origin',
    'cross-origin-resource-policy': 'same-origin',
    'permissions-policy': 'camera=(self), geolocation=(), microphone=(), payment=()',
    'referrer-policy': 'strict-origin-when-cross-origin',
    'x-content-type-options': 'nosniff',
    'x-frame-options': 'DENY',
    ...(https ? { 'strict-transport-security': 'max-age=31536000; includeSubDomains' } : {}),
  };
}

/** @param {string[]} scriptHashes of the inline scripts that may run. */
export function contentPolicy(scriptHashes) {
  const inline = scriptHashes.map((hash) => ` 'sha256-${hash}'`).join('');
  return [
    "default-src 'self'",
    `script-src 'self'${inline}`,
    // Charts set sizes and positions in style attributes; no style comes from members' text.
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' blob: data:",
    "font-src 'self'",
    "connect-src 'self'",
    "worker-src 'self' blob:",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');
}

/**
 * The framework puts what a page needs to come alive into inline scripts, another text in each page. A nonce would make
 * every page dynamic, so the hashes of those scripts go into the header, of those alone: a script of any other shape,
 * however it came into the page, doesn't run. The last shape is our own: the theme, set before the first paint.
 */
const OURS = [
  /^\(?self\.__next_f/,
  /^\(globalThis\["TURBOPACK"\]/,
  /^\$R[A-Z]/,
  /^requestAnimationFrame\(function\(\)\{\$R/,
  /^try\{const t=localStorage\.getItem\('wattcairn-theme'\)/,
];

/** @param {string} html */
export function inlineScriptHashes(html) {
  const hashes = new Set();
  for (const [, attributes, text] of html.matchAll(/<script([^>]*)>([\s\S]*?)<\/script>/g)) {
    if (/\ssrc=/.test(attributes) || /type="application\/(ld\+)?json"/.test(attributes)) continue;
    if (OURS.some((shape) => shape.test(text))) {
      hashes.add(createHash('sha256').update(text).digest('base64'));
    }
  }
  return [...hashes];
}

/**
 * Holds a page back until it is whole, so that its header can name its scripts and a page from before a commit can be
 * asked for again; and keeps shared caches from holding pages for long: the framework would let them for a year.
 * @param {import('node:http').IncomingMessage} request
 * @param {import('node:http').ServerResponse} response
 */
export function governResponse(request, response) {
  const write = response.write.bind(response);
  const end = response.end.bind(response);
  const setHeader = response.setHeader.bind(response);
  const writeHead = response.writeHead.bind(response);
  const reader = watchReading(response);
  /** @type {Buffer[]} */
  const held = [];
  let whole = false;

  response.setHeader = (name, value) =>
    setHeader(name, name.toLowerCase() === 'cache-control' && String(value).includes('s-maxage') ? 'no-cache' : value);
  response.writeHead = (status, ...rest) => {
    for (const headers of rest) {
      if (typeof headers === 'object' && headers !== null && !Array.isArray(headers)) {
        for (const [name, value] of Object.entries(headers)) if (value !== undefined) response.setHeader(name, value);
      }
    }
    response.statusCode = status;
    // The head goes out with the body: until then the policy isn't known.
    return isHeld() && !whole ? response : writeHead(status);
  };
  response.write = (chunk, ...rest) => {
    if (!isHeld()) return write(chunk, ...rest);
    held.push(bytesOf(chunk, rest[0]));
    rest.find((argument) => typeof argument === 'function')?.();
    return true;
  };
  response.end = (chunk, ...rest) => {
    if (response.headersSent || !isHeld()) return end(chunk, ...rest);
    if (chunk && typeof chunk !== 'function') held.push(bytesOf(chunk, rest[0]));
    const done = [chunk, ...rest].find((argument) => typeof argument === 'function');
    if (reader.outdated) askAgain(request, (...answer) => send(...answer, done));
    else send(response.statusCode, {}, Buffer.concat(held), done);
    return response;
  };

  function send(status, headers, body, done) {
    whole = true;
    response.statusCode = status;
    for (const [name, value] of Object.entries(headers)) if (value !== undefined) setHeader(name, value);
    // A browser puts the headers of a 304 in place of those it kept: it must keep the policy that names the scripts.
    if (status === 304) response.removeHeader('content-security-policy');
    else if (isHtml()) setHeader('content-security-policy', contentPolicy(inlineScriptHashes(body.toString('utf8'))));
    if (body.length > 0 && response.hasHeader('content-length')) setHeader('content-length', body.length);
    end(body, done);
  }

  function isHtml() {
    return String(response.getHeader('content-type') ?? '').startsWith('text/html');
  }

  // A page, what the browser fetches in its place, or the word that neither has changed.
  function isHeld() {
    const component = String(response.getHeader('content-type') ?? '').startsWith('text/x-component');
    return component || isHtml() || response.statusCode === 304;
  }
}

/**
 * @param {string | Uint8Array} chunk
 * @param {unknown} encoding
 */
function bytesOf(chunk, encoding) {
  return typeof chunk === 'string'
    ? Buffer.from(chunk, typeof encoding === 'string' ? /** @type {BufferEncoding} */ (encoding) : 'utf8')
    : Buffer.from(chunk);
}
