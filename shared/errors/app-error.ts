import { z } from 'zod';

/** Expected failures of a request, with the HTTP status each answers with. */
export const ERROR_STATUS = {
  badRequest: 400,
  invalid: 422,
  signInFailed: 401,
  notSignedIn: 401,
  badCsrfToken: 403,
  notAllowed: 403,
  notFound: 404,
  conflict: 409,
  notPossible: 409,
  tooLarge: 413,
  unsupportedFile: 415,
  tooManyRequests: 429,
  timedOut: 503,
  busy: 503,
  internal: 500,
} as const;
export type ErrorCode = keyof typeof ERROR_STATUS;

export const ERROR_TITLES: Readonly<Record<ErrorCode, string>> = {
  badRequest: 'The request could not be read',
  invalid: 'Something in the request is not right',
  signInFailed: 'Sign-in failed',
  notSignedIn: 'You are not signed in',
  badCsrfToken: 'The page is out of date',
  notAllowed: 'You may not do that',
  notFound: 'Not found',
  conflict: 'Somebody else changed this',
  notPossible: 'That is not possible now',
  tooLarge: 'Too large',
  unsupportedFile: 'This file cannot be used',
  tooManyRequests: 'Too many attempts',
  timedOut: 'That took too long',
  busy: 'The server is busy',
  internal: 'Something went wrong',
};

/** One thing that is wrong with one field; `path` is dotted, as `parts.0.marks`. */
export const fieldProblemSchema = z.object({ path: z.string(), message: z.string() });
export type FieldProblem = z.infer<typeof fieldProblemSchema>;

/** Problem details (RFC 9457) with our extensions. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number(),
  /** A sentence that a user can act on. */
  detail: z.string(),
  code: z.enum(Object.keys(ERROR_STATUS) as [ErrorCode, ...ErrorCode[]]),
  requestId: z.string().optional(),
  fields: z.array(fieldProblemSchema).optional(),
  /** On a conflict: what the server holds now, in the shape of the resource's own contract. */
  current: z.unknown().optional(),
});
export type Problem = z.infer<typeof problemSchema>;

interface AppErrorOptions {
  fields?: FieldProblem[];
  current?: unknown;
  cause?: unknown;
}

/** An expected failure: a code, and a sentence that a user can act on. */
export class AppError extends Error {
  readonly code: ErrorCode;
  readonly fields: FieldProblem[] | undefined;
  readonly current: unknown;

  constructor(code: ErrorCode, message: string, options: AppErrorOptions = {}) {
    super(message, { cause: options.cause });
    this.name = 'AppError';
    this.code = code;
    this.fields = options.fields;
    this.current = options.current;
  }
}
