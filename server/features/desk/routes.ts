import { getDesk } from '#shared/contracts/desk.ts';

import type { AppContext } from '../../context.ts';
import { type Route, route } from '../../http/route.ts';
import { readDesk } from './service.ts';

/** What waits for the person who asks. */
export function deskRoutes(context: AppContext): Route[] {
  return [
    route(getDesk, { can: 'desk.read' }, async ({ actor }) => ({ groups: await readDesk(context, actor) })),
  ];
}
