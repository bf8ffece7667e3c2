import { listRecords } from '#shared/contracts/records.ts';

import type { AppContext } from '../../context.ts';
import { type Route, route } from '../../http/route.ts';
import { readRecords } from './service.ts';

/** The records; reading them is recorded too. */
export function recordRoutes(context: AppContext): Route[] {
  return [
    route(listRecords, { can: 'record.list' }, async ({ actor, query }) => {
      const { rows, total } = await readRecords(context, actor, query);
      return { rows, total, page: query.page, pageSize: query.pageSize };
    }),
  ];
}
