import mysql from 'mysql2/promise';

import { applyMigrations } from '#server/db/apply-migrations.ts';

import { serverUrl, workerDatabaseUrl } from './database.ts';
import { workerCount } from './worker-count.ts';

/** Gives each worker an empty, migrated database before the first test. */
export async function setup(): Promise<void> {
  const connection = await mysql.createConnection(serverUrl());
  try {
    for (let worker = 1; worker <= workerCount; worker += 1) {
      const url = workerDatabaseUrl(worker);
      const name = new URL(url).pathname.slice(1);
      await connection.query(`drop database if exists \`${name}\``);
      await connection.query(`create database \`${name}\` character set utf8mb4 collate utf8mb4_unicode_ci`);
      await applyMigrations(url);
    }
  } finally {
    await connection.end();
  }
}
