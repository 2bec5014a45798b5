import 'server-only';
import { now } from './clock';
import { AppError } from './errors';

/** A token bucket: so many at once, refilled at so many a minute. */
export interface Limit {
  name: string;
  atOnce: number;
  perMinute: number;
}

interface Bucket {
  tokens: number;
  at: number;
}

const MOST_BUCKETS = 50_000;
const key = Symbol.for('wattcairn.buckets');
const holder = globalThis as unknown as Record<symbol, Map<string, Bucket> | undefined>;
const buckets = (holder[key] ??= new Map<string, Bucket>());

/**
 * Takes one token from the bucket of this limit and this key (a member, an address, an account).
 * @throws {AppError} too-many, with the time to wait; which bucket was empty is not said.
 */
export function takeToken(limit: Limit, who: string): void {
  const name = `${limit.name} ${who}`;
  const time = now().getTime();
  const bucket = buckets.get(name) ?? { tokens: limit.atOnce, at: time };
  // A clock that was set back takes nothing away.
  const minutes = Math.max(0, time - bucket.at) / 60_000;
  const tokens = Math.min(limit.atOnce, bucket.tokens + minutes * limit.perMinute);
  // Re-inserting keeps the map in order of use, so that the oldest bucket is the first to go.
  buckets.delete(name);
  buckets.set(name, { tokens: tokens >= 1 ? tokens - 1 : tokens, at: time });
  if (buckets.size > MOST_BUCKETS) dropOldest();
  if (tokens >= 1) return;
  const wait = Math.ceil(((1 - tokens) / limit.perMinute) * 60);
  throw new AppError('too-many', `That was too often in a short time. Try again in ${wait} seconds.`, {
    retryAfterSeconds: wait,
  });
}

/** For tests: every bucket is full again. */
export function refillBuckets(): void {
  buckets.clear();
}

function dropOldest(): void {
  const oldest = buckets.keys().next();
  if (!oldest.done) buckets.delete(oldest.value);
}
