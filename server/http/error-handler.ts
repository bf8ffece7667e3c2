import type { ErrorRequestHandler, RequestHandler } from 'express';
import type { Logger } from 'pino';

import { AppError } from '#shared/errors/app-error.ts';

import { expectedFailure, problemDetails } from './problem.ts';
import { requestIdOf } from './request-log.ts';

const RETRY_AFTER_SECONDS = { tooManyRequests: '900', busy: '3', timedOut: '10' } as const;

/** The last middleware: every failure becomes problem details; a bug is logged whole. */
export function createErrorHandler(logger: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    const requestId = requestIdOf(request);
    const failure = expectedFailure(error);
    if (failure === null) {
      logger.error(
        { err: error, requestId, method: request.method, path: request.path },
        'unexpected failure',
      );
    }
    if (response.headersSent) {
      next(error);
      return;
    }
    const problem = problemDetails(failure, requestId);
    if (problem.code in RETRY_AFTER_SECONDS) {
      response.set('Retry-After', RETRY_AFTER_SECONDS[problem.code as keyof typeof RETRY_AFTER_SECONDS]);
    }
    response.status(problem.status).type('application/problem+json').send(JSON.stringify(problem));
  };
}

/** Answers every path under /api that no route has taken. */
export const unknownPath: RequestHandler = (request) => {
  throw new AppError('notFound', `There is no ${request.method} ${request.baseUrl}${request.path} here.`);
};
