import { randomUUID } from 'node:crypto';

import type { Request, RequestHandler } from 'express';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/** One line for each request, without bodies, cookies or queries; gives the request and the answer an id. */
export function logRequests(logger: Logger): RequestHandler {
  return pinoHttp({
    logger,
    genReqId: (_request, response) => {
      const id = randomUUID();
      response.setHeader('X-Request-Id', id);
      return id;
    },
    serializers: {
      req: (request: { id: unknown; method: string; url: string }) => ({
        id: request.id,
        method: request.method,
        path: request.url.split('?')[0],
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
    customLogLevel: (_request, response, error) => {
      if (error !== undefined || response.statusCode >= 500) return 'warn';
      return response.statusCode >= 400 ? 'info' : 'debug';
    },
  });
}

/** The id that `logRequests` gave to a request. */
export function requestIdOf(request: Request): string {
  return typeof request.id === 'string' ? request.id : 'unknown';
}
