import { SharedCacheControls } from 'next/dist/server/lib/incremental-cache/shared-cache-controls.external.js';

/**
 * Next's cache of pages and of data read for them, in this process's memory alone: a new process starts empty, so a
 * kill at any moment leaves nothing stale. Next makes one handler a request, so what they share lives on globalThis;
 * the file is plain JavaScript because Next loads it by its path.
 *
 * Time is counted in dropped tags, not in milliseconds: two things in one millisecond have an order too.
 */
const MOST_BYTES = 192 * 1024 * 1024;
/** Of how many tags we remember when they were dropped; what began before the oldest of those isn't kept. */
const MOST_DROPPED_TAGS = 20_000;
const key = Symbol.for('wattcairn.page-cache');

export const store = (globalThis[key] ??= {
  /** Least recently used first. */
  entries: new Map(),
  bytes: 0,
  drops: 0,
  droppedAt: new Map(),
  forgottenUntil: 0,
  /** Requests in flight that look whether a rendering they share began too early: see lib/ops/fresh-answer.mjs. */
  readers: new Set(),
});

export default class MemoryCache {
  began = store.drops;

  /**
   * @param {string} name
   * @param {{ tags?: string[], softTags?: string[] }} how
   */
  async get(name, { tags = [], softTags = [] } = {}) {
    const entry = store.entries.get(name);
    if (!entry) return null;
    remove(name);
    if (isOutdated(entry.began, [...tags, ...softTags])) return null;
    keep(name, entry);
    return { value: entry.value, cacheControl: entry.cacheControl, lastModified: entry.lastModified };
  }

  /**
   * @param {string} name
   * @param {Record<string, any> | null} value a page, an answer of a route, or data.
   * @param {{ fetchCache?: boolean, tags?: string[], cacheControl?: object }} how
   */
  async set(name, value, { fetchCache = false, tags = [], cacheControl } = {}) {
    remove(name);
    if (!fetchCache) for (const reader of store.readers) reader.outdated ||= this.began < reader.arrived;
    // Nothing that wasn't found is kept: it would outlive the making of the thing, whose tag it couldn't carry.
    if (!value || value.status >= 400) return;
    const carried = value.headers?.['x-next-cache-tags']?.split(',') ?? [];
    const entry = { value, tags: [...tags, ...carried], began: this.began, cacheControl, lastModified: Date.now() };
    entry.bytes = sizeOf(value);
    // The rendering read the database before a commit that has dropped its tag since: what it shows is old already.
    if (isOutdated(entry.began, entry.tags) || entry.bytes > MOST_BYTES / 8) return;
    keep(name, entry);
    for (const oldest of store.entries.keys()) {
      if (store.bytes <= MOST_BYTES) break;
      remove(oldest);
    }
  }

  /** @param {string | string[]} tagOrTags */
  async revalidateTag(tagOrTags) {
    const dropped = new Set([tagOrTags].flat());
    store.drops += 1;
    for (const tag of dropped) {
      store.droppedAt.delete(tag);
      store.droppedAt.set(tag, store.drops);
    }
    for (const [tag, at] of store.droppedAt) {
      if (store.droppedAt.size <= MOST_DROPPED_TAGS) break;
      store.droppedAt.delete(tag);
      store.forgottenUntil = at;
    }
    for (const [name, entry] of store.entries) if (entry.tags.some((tag) => dropped.has(tag))) remove(name);
  }

  resetRequestCache() {}
}

function isOutdated(began, tags) {
  return began < store.forgottenUntil || tags.some((tag) => (store.droppedAt.get(tag) ?? 0) > began);
}

function keep(name, entry) {
  store.entries.set(name, entry);
  store.bytes += entry.bytes;
}

function remove(name) {
  store.bytes -= store.entries.get(name)?.bytes ?? 0;
  store.entries.delete(name);
  // Next remembers a lifetime for every address that was ever asked for; the entry carries its own.
  SharedCacheControls.cacheControls.delete(name);
}

function sizeOf(value) {
  const texts = [value.html, value.data?.body].filter(Boolean);
  const buffers = [value.rscData, value.body, ...(value.segmentData?.values() ?? [])].filter(Boolean);
  const measured = [...texts, ...buffers].reduce((sum, part) => sum + 2 * part.length, 0);
  // What the entry costs beside its content: keys, headers, tags.
  return measured + 1024;
}
