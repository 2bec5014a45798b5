import 'server-only';
import { AsyncLocalStorage } from 'node:async_hooks';

/** What belongs to one request, wherever the code is that needs it. */
export interface RequestContext {
  requestId: string;
  /** Cache tags that a commit made stale; the request wrapper drops them after the commit, before it answers. */
  staleTags: Set<string>;
}

const key = Symbol.for('wattcairn.request-context');
type Store = AsyncLocalStorage<RequestContext>;

// The bundler makes two copies of this file; both must look into one store.
const holder = globalThis as unknown as Record<symbol, Store | undefined>;
const store: Store = (holder[key] ??= new AsyncLocalStorage<RequestContext>());

export const runInContext = <T>(context: RequestContext, run: () => Promise<T>) => store.run(context, run);

export const currentContext = (): RequestContext | undefined => store.getStore();
