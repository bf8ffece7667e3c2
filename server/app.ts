import { resolve } from 'node:path';

import express, { type Express } from 'express';

import type { AppContext } from './context.ts';
import { healthRoutes } from './features/health/routes.ts';
import { sessionedRoutes } from './features/routes.ts';
import { createIdentity } from './features/session/service.ts';
import { createAuthentication } from './http/authentication.ts';
import { createErrorHandler, unknownPath } from './http/error-handler.ts';
import { mountRoutes } from './http/mount-routes.ts';
import { logRequests } from './http/request-log.ts';
import type { Route } from './http/route.ts';
import { securityHeaders } from './http/security-headers.ts';
import { serveClient } from './http/static-client.ts';

export interface Application {
  app: Express;
  /** Every route that answers, with its guard. */
  routes: readonly Route[];
}

/** The whole application over a context; nothing listens yet. */
export function createApp(context: AppContext): Application {
  const { settings, logger } = context;
  const app = express();
  app.disable('x-powered-by');
  app.disable('etag');
  app.set('trust proxy', settings.trustProxy);
  app.set('query parser', 'simple');
  app.use(logRequests(logger));
  app.use(securityHeaders(settings.publicOrigin?.startsWith('https:') ?? false));

  // Asked every few seconds by whatever watches the server, so it stays clear of sessions.
  const health = healthRoutes(context);
  mountRoutes(app, health);

  const authentication = createAuthentication(context, createIdentity(context));
  app.use('/api', ...authentication.middleware);
  const sessioned = sessionedRoutes(context, authentication);
  mountRoutes(app, sessioned);
  app.use('/api', unknownPath);

  if (settings.staticFolder !== null) serveClient(app, resolve(settings.staticFolder));
  app.use(createErrorHandler(logger));
  return { app, routes: [...health, ...sessioned] };
}
