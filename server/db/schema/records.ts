import { sql } from 'drizzle-orm';
import { check, index, int, mysqlEnum, mysqlTable, tinyint, varchar } from 'drizzle-orm/mysql-core';

import { document, id, instant, instantNow, reference } from '../columns.ts';
import { people } from './people.ts';

/** Who did what; rows are only ever added, and each carries the hash of the one before it. */
export const auditEvents = mysqlTable(
  'audit_events',
  {
    id: id(),
    at: instant().notNull(),
    personId: reference().references(() => people.id),
    /** Beginning of the hash of the session's id: tells sessions apart without naming them. */
    sessionRef: varchar({ length: 16 }),
    event: varchar({ length: 60 }).notNull(),
    subjectType: varchar({ length: 40 }).notNull(),
    subjectId: reference(),
    summary: varchar({ length: 500 }).notNull(),
    before: document<unknown>(),
    after: document<unknown>(),
    previousHash: varchar({ length: 64 }).notNull(),
    hash: varchar({ length: 64 }).notNull().unique(),
  },
  (table) => [
    index('audit_events_at').on(table.at),
    index('audit_events_person').on(table.personId, table.at),
    index('audit_events_event').on(table.event, table.at),
    index('audit_events_subject').on(table.subjectType, table.subjectId, table.at),
  ],
);

/** One row: the hash of the newest event. Locking it puts events in one order. */
export const auditHead = mysqlTable(
  'audit_head',
  { id: tinyint().primaryKey(), hash: varchar({ length: 64 }).notNull() },
  () => [check('audit_head_single', sql`id = 1`)],
);

/** Letters to be sent, written in the transaction that causes them. */
export const outgoingMail = mysqlTable(
  'outgoing_mail',
  {
    id: id(),
    kind: varchar({ length: 40 }).notNull(),
    personId: reference().references(() => people.id),
    address: varchar({ length: 254 }).notNull(),
    payload: document<Record<string, unknown>>().notNull(),
    /** The same letter is queued once. */
    dedupeKey: varchar({ length: 120 }).notNull().unique(),
    state: mysqlEnum(['waiting', 'sent', 'failed']).notNull().default('waiting'),
    attempts: int().notNull().default(0),
    nextAttemptAt: instantNow(),
    sentAt: instant(),
    createdAt: instantNow(),
  },
  (table) => [
    index('outgoing_mail_due').on(table.state, table.nextAttemptAt),
    check('outgoing_mail_sent', sql`(state = 'sent') = (sent_at is not null)`),
  ],
);
