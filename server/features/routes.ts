import type { AppContext } from '../context.ts';
import type { Authentication } from '../http/authentication.ts';
import type { Route } from '../http/route.ts';
import { deskRoutes } from './desk/routes.ts';
import { checkingRoutes } from './checking/routes.ts';
import { figureRoutes } from './figures/routes.ts';
import { itemRoutes } from './items/routes.ts';
import { paperRoutes } from './papers/routes.ts';
import { peopleRoutes } from './people/routes.ts';
import { recordRoutes } from './records/routes.ts';
import { reviewRoutes } from './reviews/routes.ts';
import { sessionRoutes } from './session/routes.ts';
import { topicRoutes } from './topics/routes.ts';

/** Every route that reads the session; a new feature adds its own here. */
export function sessionedRoutes(context: AppContext, authentication: Authentication): Route[] {
  return [
    ...sessionRoutes(context, authentication),
    ...deskRoutes(context),
    ...checkingRoutes(context),
    ...figureRoutes(context),
    ...itemRoutes(context),
    ...paperRoutes(context),
    ...peopleRoutes(context),
    ...recordRoutes(context),
    ...reviewRoutes(context),
    ...topicRoutes(context),
  ];
}
