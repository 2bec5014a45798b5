/** The closed list of what can go wrong in a way that a caller can do something about. */
export const ERROR_STATUS = {
  'bad-input': 422,
  'bad-request': 400,
  'not-signed-in': 401,
  'not-allowed': 403,
  'not-found': 404,
  'method-not-allowed': 405,
  conflict: 409,
  gone: 410,
  'version-missing': 428,
  'version-changed': 412,
  'too-large': 413,
  'unsupported-kind': 415,
  'too-many': 429,
  'quota-reached': 429,
  unavailable: 503,
} as const;

export type ErrorCode = keyof typeof ERROR_STATUS;

/** One thing that is wrong with one field; the pointer is a JSON pointer (RFC 6901) into what was sent. */
export interface FieldProblem {
  pointer: string;
  message: string;
}

/**
 * An expected failure: a code, a sentence that says what is wrong and what to do, and the fields concerned. Bugs are
 * other errors; the request wrapper logs those and answers a plain 500.
 */
export class AppError extends Error {
  override readonly name = 'AppError';

  constructor(
    readonly code: ErrorCode,
    message: string,
    readonly details: {
      fields?: FieldProblem[];
      retryAfterSeconds?: number;
      /** What a person needs to go on: who decided first, which version is current. */
      facts?: Record<string, unknown>;
    } = {},
  ) {
    super(message);
  }

  get status(): number {
    return ERROR_STATUS[this.code];
  }
}

export const notFound = (what: string) =>
  new AppError('not-found', `There is no such ${what}. It may have been removed, or the address mistyped.`);
