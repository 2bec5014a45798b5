import 'server-only';
import { randomUUID } from 'node:crypto';
import { revalidateTag } from 'next/cache';
import type { z, ZodType } from 'zod';
import { readActor } from '@/lib/auth/queries';
import type { Actor } from '@/lib/auth/schema';
import { runInContext, type RequestContext } from '../context';
import { AppError } from '../errors';
import { takeToken, type Limit } from '../rate-limit';
import { readJson, readQuery } from './body';
import { clientAddress, refuseForeignWrites, refuseOddAddress } from './guard';
import { onceForKey } from './idempotency';
import { fieldProblems, problemResponse } from './problem';

export type Access = 'anyone' | 'member' | 'moderator' | 'admin';
export type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

const RANK = { anyone: 0, member: 1, moderator: 2, admin: 3 } as const;

/** Everything that one operation of the API is: the same object runs it, documents it and lets tests go over it. */
export interface RouteSpec<A extends Access, P, Q, B, R> {
  operationId: string;
  method: Method;
  /** As OpenAPI writes it: /api/v1/reports/{id}. */
  path: `/api/v1/${string}`;
  summary: string;
  /** The least role that may call it at all; what a caller may do to a row is the command's to decide. */
  access: A;
  limit?: Limit;
  /** Takes an Idempotency-Key: a repeat gets the first answer. */
  idempotent?: boolean;
  params?: ZodType<P>;
  query?: ZodType<Q>;
  body?: ZodType<B>;
  /** A body that the handler streams itself (multipart); the wrapper doesn't touch it. */
  upload?: { description: string };
  /** Success: its status and the shape of its body; null where the answer is a file or nothing. */
  success: { status: number; body: ZodType<R> | null; description: string; contentType?: string };
  handle: (call: Call<A, P, Q, B>) => Promise<Answer<R> | Response>;
}

export interface Call<A extends Access, P, Q, B> {
  actor: A extends 'anyone' ? Actor | null : Actor;
  params: P;
  query: Q;
  body: B;
  request: Request;
  address: string;
  /** The version in If-Match, or null where there is none. */
  ifMatch: number | null;
}

export interface Answer<R> {
  body?: R;
  headers?: Record<string, string>;
}

interface NextContext {
  params: Promise<Record<string, string | string[] | undefined>>;
}

/** What tests and the API document read of a route. */
export type AnyRouteSpec = Omit<RouteSpec<Access, unknown, unknown, unknown, unknown>, 'handle'>;

export interface Route {
  spec: AnyRouteSpec;
  handler: (request: Request, context: NextContext) => Promise<Response>;
}

const EVERY_CALL: Limit = { name: 'call', atOnce: 300, perMinute: 1200 };

/** The one way in: every handler under /api/v1 is made here. */
export function defineRoute<A extends Access, P = unknown, Q = unknown, B = unknown, R = unknown>(
  spec: RouteSpec<A, P, Q, B, R>,
): Route {
  const { handle, ...documented } = spec;
  return {
    spec: documented as AnyRouteSpec,
    handler: (request, context) => {
      const requestContext: RequestContext = { requestId: randomUUID(), staleTags: new Set() };
      return runInContext(requestContext, async () => {
        const response = await respond(spec, handle, request, context);
        for (const tag of requestContext.staleTags) revalidateTag(tag, { expire: 0 });
        response.headers.set('x-request-id', requestContext.requestId);
        if (!response.headers.has('cache-control')) response.headers.set('cache-control', 'no-store');
        return response;
      });
    },
  };
}

async function respond<A extends Access, P, Q, B, R>(
  spec: RouteSpec<A, P, Q, B, R>,
  handle: RouteSpec<A, P, Q, B, R>['handle'],
  request: Request,
  context: NextContext,
): Promise<Response> {
  const url = new URL(request.url);
  try {
    refuseOddAddress(url);
    refuseForeignWrites(request);
    const address = clientAddress(request);
    takeToken(EVERY_CALL, address);
    const actor = await readActor(request);
    admit(spec.access, actor);
    if (spec.limit) takeToken(spec.limit, actor ? `member ${actor.memberId}` : address);
    const rawBody = spec.body ? await readJson(request) : undefined;
    const call: Call<A, P, Q, B> = {
      actor: actor as Call<A, P, Q, B>['actor'],
      params: parse(spec.params, await context.params, '/params'),
      query: parse(spec.query, readQuery(url), '/query'),
      body: parse(spec.body, rawBody, ''),
      request,
      address,
      ifMatch: readIfMatch(request),
    };
    const idempotencyKey = spec.idempotent ? request.headers.get('idempotency-key') : null;
    if (idempotencyKey && actor) {
      const said = `${spec.method} ${url.pathname} ${JSON.stringify(rawBody)}`;
      const stored = await onceForKey(actor.memberId, idempotencyKey, said, async () => {
        const answer = await handle(call);
        if (answer instanceof Response) throw new Error('A file is no answer that can be kept.');
        return { status: spec.success.status, body: spec.success.body?.parse(answer.body) };
      });
      return json(stored.status, stored.body, {});
    }
    const answer = await handle(call);
    if (answer instanceof Response) return answer;
    // Parsing the answer drops every field that its schema doesn't name: nothing leaves by accident.
    return json(spec.success.status, spec.success.body?.parse(answer.body), answer.headers ?? {});
  } catch (error) {
    return problemResponse(error, url.pathname);
  }
}

function admit(access: Access, actor: Actor | null): void {
  if (access === 'anyone') return;
  if (!actor) throw new AppError('not-signed-in', 'Sign in to do this; what you typed stays where it is.');
  if (RANK[actor.role] < RANK[access]) {
    throw new AppError('not-allowed', `This is for a ${access}. Ask an admin if it should be for you.`);
  }
}

function parse<T>(schema: ZodType<T> | undefined, value: unknown, under: string): T {
  if (!schema) return undefined as T;
  const result = schema.safeParse(value);
  if (result.success) return result.data;
  throw new AppError('bad-input', 'Some of what was sent can’t be used as it is; each field says why.', {
    fields: fieldProblems(result.error as z.ZodError, under),
  });
}

function readIfMatch(request: Request): number | null {
  const text = request.headers.get('if-match');
  const version = text === null ? null : /^"?(\d{1,9})"?$/.exec(text)?.[1];
  return version ? Number(version) : null;
}

function json(status: number, body: unknown, headers: Record<string, string>): Response {
  if (body === undefined || body === null) return new Response(null, { status, headers });
  return new Response(JSON.stringify(body), {
    status,
    headers: { 'content-type': 'application/json; charset=utf-8', ...headers },
  });
}
