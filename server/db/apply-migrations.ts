import { join } from 'node:path';

import { sql } from 'drizzle-orm';
import { migrate } from 'drizzle-orm/mysql2/migrator';

import { openDatabase } from './client.ts';
import { projectFolder } from './project-folder.ts';

const LOCK = 'graticule.migrations';
const LOCK_SECONDS = 120;

/**
 * Brings the database at `url` to the newest schema. Servers that start together wait for each other.
 * Throws when the lock is not free within two minutes or a migration fails.
 */
export async function applyMigrations(url: string): Promise<void> {
  // One connection only, since the lock belongs to it.
  const { database, close } = openDatabase(url, 1);
  try {
    const [rows] = await database.execute(sql`select get_lock(${LOCK}, ${LOCK_SECONDS}) as locked`);
    const locked = Array.isArray(rows) ? (rows[0] as { locked?: number } | undefined)?.locked : undefined;
    if (locked !== 1) throw new Error('Another server has been migrating the database for two minutes.');
    await database.execute(sql`alter database character set utf8mb4 collate utf8mb4_unicode_ci`);
    await migrate(database, { migrationsFolder: join(projectFolder(import.meta.url), 'drizzle') });
    await database.execute(sql`select release_lock(${LOCK})`);
  } finally {
    await close();
  }
}
