import 'server-only';
import { ConnectionError, ConnectionAcquireTimeoutError } from 'sequelize';
import type { ZodError } from 'zod';
import { currentContext } from '../context';
import { AppError, type FieldProblem } from '../errors';
import { log } from '../log';

/** Turns whatever was thrown into problem details (RFC 9457); what was not expected is logged and stays unnamed. */
export function problemResponse(error: unknown, path: string): Response {
  const known = asAppError(error);
  const requestId = currentContext()?.requestId ?? null;
  if (!known) {
    log().error({ err: error, path }, 'a request failed unexpectedly');
    return answer(500, {
      type: 'about:blank',
      title: 'internal-error',
      status: 500,
      detail: `Something went wrong on our side; nothing was saved. Try again, and if it stays, quote ${requestId}.`,
      instance: path,
      requestId,
    });
  }
  if (known.status >= 500) log().error({ err: error, path, code: known.code }, 'a request could not be served');
  else log().info({ path, code: known.code }, 'a request was refused');
  const { fields, facts, retryAfterSeconds } = known.details;
  return answer(
    known.status,
    {
      type: `/guides/api-errors#${known.code}`,
      title: known.code,
      status: known.status,
      detail: known.message,
      instance: path,
      requestId,
      ...(fields ? { errors: fields } : {}),
      ...(facts ? { facts } : {}),
    },
    retryAfterSeconds === undefined ? {} : { 'retry-after': String(retryAfterSeconds) },
  );
}

/** The fields that a zod schema refused, as JSON pointers. */
export function fieldProblems(error: ZodError, under = ''): FieldProblem[] {
  return error.issues.map((issue) => ({
    pointer: under + issue.path.map((part) => `/${String(part).replaceAll('~', '~0').replaceAll('/', '~1')}`).join(''),
    message: issue.message,
  }));
}

function asAppError(error: unknown): AppError | null {
  if (error instanceof AppError) return error;
  // The bundler copies the class, so a copy is known by its name and shape.
  if (error instanceof Error && error.name === 'AppError' && 'code' in error) return error as AppError;
  if (error instanceof ConnectionError || error instanceof ConnectionAcquireTimeoutError) {
    return new AppError('unavailable', 'The database does not answer just now. Nothing was lost; try again shortly.', {
      retryAfterSeconds: 10,
    });
  }
  return null;
}

function answer(status: number, body: unknown, headers: Record<string, string> = {}): Response {
  return new Response(JSON.stringify(body), {
    status,
    headers: { 'content-type': 'application/problem+json; charset=utf-8', 'cache-control': 'no-store', ...headers },
  });
}
