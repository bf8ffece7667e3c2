import { and, count, desc, eq, like, or, type SQL } from 'drizzle-orm';

import type { RecordRow } from '#shared/contracts/records.ts';

import type { Connection } from '../../db/client.ts';
import { auditEvents, people } from '../../db/schema/index.ts';

export interface RecordQuery {
  page: number;
  pageSize: number;
  person?: number | undefined;
  /** A whole event name, as `item.sent`, or its first word for all events of that kind. */
  event?: string | undefined;
}

function filter(query: RecordQuery): SQL | undefined {
  const { person, event } = query;
  return and(
    person === undefined ? undefined : eq(auditEvents.personId, person),
    event === undefined || event === ''
      ? undefined
      : or(
          eq(auditEvents.event, event),
          like(auditEvents.event, `${event.replace(/[\\%_]/g, (sign) => `\\${sign}`)}.%`),
        ),
  );
}

/** One page of events, the newest first, and how many match in all. */
export async function selectRecords(
  connection: Connection,
  query: RecordQuery,
): Promise<{ rows: RecordRow[]; total: number }> {
  const where = filter(query);
  const rows = await connection
    .select({
      id: auditEvents.id,
      at: auditEvents.at,
      personId: people.id,
      personName: people.name,
      event: auditEvents.event,
      subjectType: auditEvents.subjectType,
      subjectId: auditEvents.subjectId,
      summary: auditEvents.summary,
    })
    .from(auditEvents)
    .leftJoin(people, eq(people.id, auditEvents.personId))
    .where(where)
    .orderBy(desc(auditEvents.id))
    .limit(query.pageSize)
    .offset((query.page - 1) * query.pageSize);
  const [all] = await connection.select({ total: count() }).from(auditEvents).where(where);
  return {
    rows: rows.map(({ personId, personName, at, ...row }) => ({
      ...row,
      at: at.toISOString(),
      person: personId === null || personName === null ? null : { id: personId, name: personName },
    })),
    total: all?.total ?? 0,
  };
}
