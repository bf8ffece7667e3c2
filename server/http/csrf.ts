import { csrfSync } from 'csrf-sync';
import type { Request } from 'express';

import { AppError } from '#shared/errors/app-error.ts';

/** Kept in the session, sent back in the header `x-csrf-token`: only our own pages can read and send it. */
const { generateToken, isRequestValid } = csrfSync({
  getTokenFromRequest: (request) => request.get('x-csrf-token'),
});

/** The session's token; a session without one gets one. */
export function csrfTokenOf(request: Request): string {
  return generateToken(request);
}

/** Throws AppError badCsrfToken unless a changing request carries its session's token. */
export function demandCsrfToken(request: Request): void {
  if (request.method === 'GET' || request.method === 'HEAD' || isRequestValid(request)) return;
  throw new AppError(
    'badCsrfToken',
    'This page has been open since an earlier session. Reload it, then do that again.',
  );
}
