/** The database server of the tests, without a database's name; `npm test` starts one and sets it. */
export function serverUrl(): string {
  const url = process.env['TEST_DATABASE_SERVER'];
  if (!url) throw new Error('TEST_DATABASE_SERVER is not set. Run the tests by npm test.');
  return url;
}

/** The database of the worker with this number, from 1. */
export function workerDatabaseUrl(worker: number): string {
  return `${serverUrl()}/test_${worker}`;
}

/** The database of this test worker, empty but migrated. */
export function testDatabaseUrl(): string {
  return process.env['TEST_DATABASE_URL'] ?? workerDatabaseUrl(Number(process.env['VITEST_POOL_ID'] ?? '1'));
}
