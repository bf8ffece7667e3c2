import { getTableName, is, sql } from 'drizzle-orm';
import { MySqlTable } from 'drizzle-orm/mysql-core';

import { type Database, inTransaction } from '#server/db/client.ts';
import * as schema from '#server/db/schema/index.ts';

/** Deletes every row of every table. */
export async function emptyTables(database: Database): Promise<void> {
  await inTransaction(database, async (tx) => {
    await tx.execute(sql`set foreign_key_checks = 0`);
    for (const table of Object.values(schema)) {
      if (is(table, MySqlTable)) await tx.execute(sql`delete from ${sql.identifier(getTableName(table))}`);
    }
    await tx.execute(sql`set foreign_key_checks = 1`);
  });
}
