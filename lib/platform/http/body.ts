import 'server-only';
import { AppError } from '../errors';

/** A draft with hundreds of phases and long notes is some 200 kB; files travel as multipart, not here. */
const MOST_BYTES = 1_000_000;

/**
 * Reads a JSON body, never more than the limit whatever the length header says.
 * @throws {AppError} unsupported-kind, too-large, or bad-request where it is no JSON.
 */
export async function readJson(request: Request): Promise<unknown> {
  const kind = request.headers.get('content-type')?.split(';')[0]?.trim().toLowerCase();
  if (kind !== 'application/json') {
    throw new AppError('unsupported-kind', 'Send this as JSON, with the content type application/json.');
  }
  const text = new TextDecoder('utf-8', { fatal: true });
  let read = 0;
  let content = '';
  try {
    for await (const chunk of request.body ?? []) {
      read += (chunk as Uint8Array).byteLength;
      if (read > MOST_BYTES) throw new AppError('too-large', 'That is longer than 1 MB. Send it in smaller parts.');
      content += text.decode(chunk as Uint8Array, { stream: true });
    }
    content += text.decode();
    return JSON.parse(content, refuseUnkeepable) as unknown;
  } catch (error) {
    if (error instanceof AppError) throw error;
    throw new AppError('bad-request', 'The body is no JSON that can be read. Check it and send it again.');
  }
}

const UNKEEPABLE = /\u0000|\p{Surrogate}/u;

/** The database keeps no NUL and no half of a surrogate pair; met there, they would look like a fault of ours. */
function refuseUnkeepable(key: string, value: unknown): unknown {
  if (UNKEEPABLE.test(key) || (typeof value === 'string' && UNKEEPABLE.test(value))) {
    throw new AppError('bad-request', 'A text holds a character that no keyboard makes. Type that text anew.');
  }
  return value;
}

/** Query parameters as an object; one that comes twice is an array, which a schema for a single value refuses. */
export function readQuery(url: URL): Record<string, string | string[]> {
  const query: Record<string, string | string[]> = Object.create(null) as Record<string, string | string[]>;
  for (const name of new Set(url.searchParams.keys())) {
    const values = url.searchParams.getAll(name);
    query[name] = values.length === 1 ? (values[0] ?? '') : values;
  }
  return query;
}
