import { createHash } from 'node:crypto';

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
 * Holds an HTML answer back until it is whole, so that its header can name its scripts, and keeps shared caches from
 * holding pages for long: the framework would let a proxy keep a page for a year.
 * @param {import('node:http').ServerResponse} response
 */
export function governResponse(response) {
  const write = response.write.bind(response);
  const end = response.end.bind(response);
  const setHeader = response.setHeader.bind(response);
  const writeHead = response.writeHead.bind(response);
  /** @type {Buffer[]} */
  const held = [];

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
    return isHtml() ? response : writeHead(status);
  };
  response.write = (chunk, ...rest) => {
    if (!isHtml()) return write(chunk, ...rest);
    held.push(Buffer.from(chunk, typeof rest[0] === 'string' ? rest[0] : undefined));
    rest.find((argument) => typeof argument === 'function')?.();
    return true;
  };
  response.end = (chunk, ...rest) => {
    if (!isHtml() || response.headersSent) return end(chunk, ...rest);
    if (chunk && typeof chunk !== 'function')
      held.push(Buffer.from(chunk, typeof rest[0] === 'string' ? rest[0] : undefined));
    const page = Buffer.concat(held);
    setHeader('content-security-policy', contentPolicy(inlineScriptHashes(page.toString('utf8'))));
    const done = [chunk, ...rest].find((argument) => typeof argument === 'function');
    return done ? end(page, done) : end(page);
  };

  function isHtml() {
    return String(response.getHeader('content-type') ?? '').startsWith('text/html');
  }
}
