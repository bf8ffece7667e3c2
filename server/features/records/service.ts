import type { RecordRow } from '#shared/contracts/records.ts';

import type { AppContext } from '../../context.ts';
import { inTransaction } from '../../db/client.ts';
import { type RecordQuery, selectRecords } from './queries.ts';
import { recordEvent } from './record-event.ts';

/** One page of the records for `actor`; that they read it is recorded too. */
export async function readRecords(
  context: AppContext,
  actor: { id: number; sessionRef?: string },
  query: RecordQuery,
): Promise<{ rows: RecordRow[]; total: number }> {
  const page = await selectRecords(context.database, query);
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
  return page;
}
