import { encode } from 'next-auth/jwt';
import { openSession } from '@/lib/auth/commands/sessions';
import { sessionCookieName } from '@/lib/auth/rules';
import { env } from '@/lib/platform/env';
import type { Route } from '@/lib/platform/http/route';
import type { MadeMember } from './members';

export interface CallTraits {
  /** Who calls; nobody where it is left out. */
  as?: MadeMember;
  params?: Record<string, string>;
  query?: string;
  /** Sent as JSON; a FormData as it is. */
  body?: unknown;
  headers?: Record<string, string>;
}

/** Calls an operation of the API as a browser of ours would: with its cookie and from its own pages. */
export async function callRoute(route: Route, traits: CallTraits = {}): Promise<Response> {
  const { as, params = {}, query = '', body, headers = {} } = traits;
  const path = route.spec.path.replace(/\{(\w+)\}/g, (_, name: string) => encodeURIComponent(params[name] ?? ''));
  const isForm = body instanceof FormData || body instanceof ReadableStream;
  const request = new Request(`${env().publicOrigin}${path}${query}`, {
    method: route.spec.method,
    headers: {
      origin: env().publicOrigin,
      ...(as ? { cookie: await cookieOf(as) } : {}),
      ...(body !== undefined && !isForm ? { 'content-type': 'application/json' } : {}),
      ...headers,
    },
    body: body === undefined ? undefined : isForm ? body : JSON.stringify(body),
    // A streamed body needs saying so.
    ...(body instanceof ReadableStream ? { duplex: 'half' } : {}),
  } as RequestInit);
  return route.handler(request, { params: Promise.resolve(params) });
}

const cookies = new WeakMap<MadeMember, string>();

async function cookieOf(member: MadeMember): Promise<string> {
  const known = cookies.get(member);
  if (known) return known;
  const sid = await openSession(member.id);
  const token = await encode({ token: { sid }, secret: env().secret });
  const cookie = `${sessionCookieName(false)}=${token}`;
  cookies.set(member, cookie);
  return cookie;
}

/** A form with one file, as a browser sends it. */
export function formWith(file: Uint8Array | string, name: string, fields: Record<string, string> = {}): FormData {
  const form = new FormData();
  for (const [key, value] of Object.entries(fields)) form.append(key, value);
  form.append('file', new Blob([file as BlobPart]), name);
  return form;
}
