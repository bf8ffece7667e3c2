import { sql } from 'drizzle-orm';
import { bigint, check, int, mysqlTable, varchar } from 'drizzle-orm/mysql-core';

import { id, instantNow } from '../columns.ts';

export const topics = mysqlTable(
  'topics',
  {
    id: id(),
    /** Two or three capitals that begin the codes of its items. */
    code: varchar({ length: 3 }).notNull().unique(),
    name: varchar({ length: 120 }).notNull().unique(),
    /** Order in lists. */
    position: int().notNull().default(0),
    createdAt: instantNow(),
  },
  () => [check('topics_code_capitals', sql`code regexp binary '^[A-Z]{2,3}$'`)],
);

/** Running numbers of codes, as `item:EG`; see takeNumber. */
export const counters = mysqlTable('counters', {
  name: varchar({ length: 40 }).primaryKey(),
  value: bigint({ mode: 'number', unsigned: true }).notNull(),
});
