import 'server-only';
import NextAuth from 'next-auth';
import { notFound } from '@/lib/platform/errors';
import { refuseForeignWrites } from '@/lib/platform/http/guard';
import { problemResponse } from '@/lib/platform/http/problem';
import { authOptions } from './next-auth-options';

/** The parts of next-auth that are in use; its other pages and actions are not there. */
const IN_USE = new Set(['GET csrf', 'GET session', 'GET providers', 'POST callback/credentials', 'POST signout']);

interface NextAuthContext {
  params: Promise<{ nextauth: string[] }>;
}

/** next-auth's own routes stand outside the request wrapper; what they need of it is done here. */
export async function nextAuthHandler(request: Request, context: NextAuthContext): Promise<Response> {
  const { nextauth } = await context.params;
  const path = `/api/auth/${nextauth.join('/')}`;
  try {
    if (!IN_USE.has(`${request.method} ${nextauth.join('/')}`)) throw notFound('page');
    refuseForeignWrites(request);
    const response = (await NextAuth(request as never, { params: { nextauth } } as never, authOptions())) as Response;
    const headers = new Headers(response.headers);
    headers.set('cache-control', 'no-store');
    return new Response(response.body, { status: response.status, headers });
  } catch (error) {
    return problemResponse(error, path);
  }
}
