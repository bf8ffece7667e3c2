import { createHash } from 'node:crypto';

import { sql } from 'drizzle-orm';
import { bigint, customType, datetime, json } from 'drizzle-orm/mysql-core';

/** A row's own number. */
export const id = () => bigint({ mode: 'number', unsigned: true }).primaryKey().autoincrement();

/** The number of a row of another table. */
export const reference = () => bigint({ mode: 'number', unsigned: true });

/** A point in time, UTC, to the millisecond. */
export const instant = () => datetime({ mode: 'date', fsp: 3 });

/** A point in time that the database fills in with its own clock. */
export const instantNow = () =>
  instant()
    .notNull()
    .default(sql`(utc_timestamp(3))`);

/** A draw number; draws go beyond 2^31 but stay exact in a double. */
export const drawNumber = () => bigint({ mode: 'number', unsigned: true });

/** A JSON document of a known shape; it is written and read by code that knows its schema. */
export const document = <Shape>() => json().$type<Shape>();

/** Up to 16 MB of bytes. */
export const bytes = customType<{ data: Buffer }>({ dataType: () => 'mediumblob' });

/** SHA-256 as 64 hexadecimal digits, for the columns that hold hashes. */
export function sha256(content: string | Buffer): string {
  return createHash('sha256').update(content).digest('hex');
}
