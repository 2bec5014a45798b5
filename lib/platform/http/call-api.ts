import type { ZodType } from 'zod';
import type { FieldProblem } from '../errors';

/** What the API answered instead of success: a sentence for people, the fields concerned, and facts to go on with. */
export class ApiProblem extends Error {
  constructor(
    readonly status: number,
    readonly code: string,
    message: string,
    readonly fields: FieldProblem[],
    readonly facts: Record<string, unknown>,
  ) {
    super(message);
  }
}

interface Call<T> {
  method?: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  /** Sent as JSON; a FormData is sent as it is. */
  body?: unknown;
  /** The shape of the answer; left out where it is empty. */
  answer?: ZodType<T>;
  ifMatch?: number;
  idempotencyKey?: string;
  signal?: AbortSignal;
}

/**
 * One call of our own API from the browser.
 * @throws {ApiProblem} with what the API says; also where there is no connection (status 0, code "offline").
 */
export async function callApi<T = undefined>(path: string, call: Call<T> = {}): Promise<T> {
  const isForm = call.body instanceof FormData;
  const response = await fetch(path, {
    method: call.method ?? 'GET',
    signal: call.signal,
    headers: {
      accept: 'application/json',
      ...(call.body !== undefined && !isForm ? { 'content-type': 'application/json' } : {}),
      ...(call.ifMatch === undefined ? {} : { 'if-match': `"${call.ifMatch}"` }),
      ...(call.idempotencyKey === undefined ? {} : { 'idempotency-key': call.idempotencyKey }),
    },
    body: isForm ? (call.body as FormData) : call.body === undefined ? undefined : JSON.stringify(call.body),
  }).catch((error: unknown) => {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw new ApiProblem(
      0,
      'offline',
      'There is no connection to the site. What you typed stays here; try again.',
      [],
      {},
    );
  });
  if (!response.ok) throw await readProblem(response);
  if (!call.answer) return undefined as T;
  return call.answer.parse(await response.json());
}

async function readProblem(response: Response): Promise<ApiProblem> {
  const problem = (await response.json().catch(() => ({}))) as {
    title?: string;
    detail?: string;
    errors?: FieldProblem[];
    facts?: Record<string, unknown>;
  };
  const detail = problem.detail ?? `The site answered ${response.status}. What you typed stays here; try again.`;
  return new ApiProblem(response.status, problem.title ?? 'unknown', detail, problem.errors ?? [], problem.facts ?? {});
}
