import {
  AppError,
  type ErrorCode,
  ERROR_STATUS,
  ERROR_TITLES,
  type Problem,
} from '#shared/errors/app-error.ts';

const UNEXPECTED =
  'The server met a fault of its own; nothing was saved. Try again, and if it comes back, tell the administrator the request number.';

/** What a library's error says of itself; body-parser, multer and the router all use some of these. */
interface LibraryError {
  type?: unknown;
  code?: unknown;
  status?: unknown;
  name?: unknown;
}

function libraryFailure(error: Error & LibraryError): AppError | null {
  const fail = (code: ErrorCode, sentence: string) => new AppError(code, sentence, { cause: error });
  if (error.type === 'entity.too.large') {
    return fail(
      'tooLarge',
      'This is larger than the server takes in one request. Make it smaller and try again.',
    );
  }
  if (error.type === 'entity.parse.failed') {
    return fail('badRequest', 'The request is not readable JSON. Reload the page and try again.');
  }
  if (error.type === 'encoding.unsupported' || error.type === 'charset.unsupported') {
    return fail('unsupportedFile', 'The request is written in an encoding that the server does not read.');
  }
  if (error.name === 'MulterError') {
    return error.code === 'LIMIT_FILE_SIZE'
      ? fail('tooLarge', 'This file is larger than the server takes. Make it smaller and try again.')
      : fail('badRequest', 'Send one file, in the field named file.');
  }
  if (error.status === 404) return fail('notFound', 'There is nothing at this address.');
  if (typeof error.status === 'number' && error.status >= 400 && error.status < 500) {
    return fail('badRequest', 'The request could not be read. Reload the page and try again.');
  }
  return null;
}

/** The expected failure that an error stands for, or null when it is a bug. */
export function expectedFailure(error: unknown): AppError | null {
  if (error instanceof AppError) return error;
  return error instanceof Error ? libraryFailure(error) : null;
}

/** Problem details (RFC 9457) of a failure; null stands for a bug, of which nothing is told but the request id. */
export function problemDetails(failure: AppError | null, requestId: string): Problem {
  const code = failure?.code ?? 'internal';
  return {
    type: `urn:graticule:problem:${code}`,
    title: ERROR_TITLES[code],
    status: ERROR_STATUS[code],
    detail: failure?.message ?? UNEXPECTED,
    code,
    requestId,
    ...(failure?.fields === undefined ? {} : { fields: failure.fields }),
    ...(failure?.current === undefined ? {} : { current: failure.current }),
  };
}
