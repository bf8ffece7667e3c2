/** The database of this test worker, empty but migrated. */
export function testDatabaseUrl(): string {
  return process.env['TEST_DATABASE_URL'] ?? '';
}
