/** The unexpected, sorted by what the caller can do about it. Expected outcomes are values, not errors. */
export type ErrorCode =
  'invalid' | 'forbidden' | 'not-found' | 'conflict' | 'too-many' | 'unavailable' | 'internal';

/** Where in the caller's input a fault lies. Lines and columns count from 1. */
export interface FieldFault {
  reason: string;
  field?: string;
  line?: number;
  column?: number;
}

/** The one error this program throws on purpose. Its message is written for the person who reads it. */
export class AppError extends Error {
  readonly code: ErrorCode;
  readonly faults: readonly FieldFault[];

  constructor(code: ErrorCode, message: string, options: { cause?: unknown; faults?: FieldFault[] } = {}) {
    super(message, options.cause === undefined ? undefined : { cause: options.cause });
    this.name = 'AppError';
    this.code = code;
    this.faults = options.faults ?? [];
  }
}

/**
 * Whether an error says that the database is shutting down, starting up or gone: PostgreSQL documentation, appendix A,
 * classes 08 and 57; the Prisma error reference, P1001 and P1017; and the words of the socket and of `pg`.
 */
export function isDatabaseAway(error: unknown): boolean {
  const { code, message } = (error ?? {}) as { code?: unknown; message?: unknown };
  return (
    /^(57P0|08|ECONN|EPIPE|P1001|P1017)/.test(String(code)) ||
    /Connection terminated|is not queryable|Can't reach database server|Server has closed the connection/.test(
      String(message),
    )
  );
}

/** RFC 9457 problem details, with `faults` as our extension member. */
export interface Problem {
  type: 'about:blank';
  title: string;
  status: number;
  detail: string;
  faults?: readonly FieldFault[];
}

/** The one mapping to HTTP (status codes: RFC 9110 §15.5 and §15.6, 429: RFC 6585 §4). A new code does not compile until it is here. */
const httpMeaning = {
  invalid: { status: 422, title: 'Unprocessable Content' },
  forbidden: { status: 403, title: 'Forbidden' },
  'not-found': { status: 404, title: 'Not Found' },
  conflict: { status: 409, title: 'Conflict' },
  'too-many': { status: 429, title: 'Too Many Requests' },
  unavailable: { status: 503, title: 'Service Unavailable' },
  internal: { status: 500, title: 'Internal Server Error' },
} as const satisfies Record<ErrorCode, { status: number; title: string }>;

/**
 * Problem details (RFC 9457 §3) of whatever was thrown. What is no `AppError` becomes a plain 500 whose detail
 * tells nothing of the inside: its message may hold a query or a path.
 */
export function problemOf(thrown: unknown): Problem {
  const error =
    thrown instanceof AppError
      ? thrown
      : isDatabaseAway(thrown)
        ? new AppError('unavailable', 'The database does not answer just now: try again in a moment.')
        : new AppError('internal', 'The server could not do this.');
  return {
    type: 'about:blank',
    ...httpMeaning[error.code],
    detail: error.message,
    ...(error.faults.length > 0 ? { faults: error.faults } : {}),
  };
}

/** The same as a response of media type `application/problem+json` (RFC 9457 §6.1). */
export function problemResponse(thrown: unknown, headers: Record<string, string> = {}): Response {
  const problem = problemOf(thrown);
  return new Response(JSON.stringify(problem), {
    status: problem.status,
    headers: { 'content-type': 'application/problem+json', ...headers },
  });
}
