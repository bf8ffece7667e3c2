import { listRecords } from '#shared/contracts/records.ts';

import type { AppContext } from '../../context.ts';
import { inTransaction } from '../../db/client.ts';
import { type Route, route } from '../../http/route.ts';
import { selectRecords } from './queries.ts';
import { recordEvent } from './record-event.ts';

/** The records; reading them is recorded too. */
export function recordRoutes(context: AppContext): Route[] {
  return [
    route(listRecords, { can: 'record.list' }, async ({ actor, query }) => {
      const { rows, total } = await selectRecords(context.database, query);
      await inTransaction(context.database, (tx) =>
        recordEvent(tx, {
          event: 'record.read',
          actor,
          subjectType: 'records',
          subjectId: null,
          summary: `Read page ${query.page} of the records.`,
          after: { person: query.person ?? null, event: query.event ?? null },
        }),
      );
      return { rows, total, page: query.page, pageSize: query.pageSize };
    }),
  ];
}
