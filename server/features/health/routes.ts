import { sql } from 'drizzle-orm';

import { getHealth } from '#shared/contracts/health.ts';
import { AppError } from '#shared/errors/app-error.ts';

import packageInfo from '../../../package.json' with { type: 'json' };
import type { AppContext } from '../../context.ts';
import { type Route, route } from '../../http/route.ts';

/** Whether the server and its database are ready. */
export function healthRoutes(context: AppContext): Route[] {
  return [
    route(getHealth, { can: 'anyone' }, async () => {
      try {
        await context.database.execute(sql`select 1`);
      } catch (error) {
        throw new AppError('busy', 'The database does not answer.', { cause: error });
      }
      return { status: 'ready' as const, version: packageInfo.version };
    }),
  ];
}
