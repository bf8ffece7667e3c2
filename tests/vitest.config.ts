import path from 'node:path';
import { fileURLToPath } from 'node:url';

import { defineConfig } from 'vitest/config';

import { workerCount } from './support/worker-count.ts';

const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '..');

/** Threads of the engine start slowly from their sources, ms. */
const TEST_TIMEOUT = 20_000;

/** Tests that take minutes; LONG=true runs them alone. */
const ending = process.env['LONG'] === 'true' ? 'long.ts' : 'test.{ts,tsx}';

export default defineConfig({
  root,
  // The client's own configuration concerns its bundle alone.
  cacheDir: path.join(root, 'node_modules/.vite-tests'),
  test: {
    maxWorkers: workerCount,
    testTimeout: TEST_TIMEOUT,
    hookTimeout: TEST_TIMEOUT,
    projects: [
      {
        extends: true,
        test: {
          // Tests of screens ask for jsdom in their first line.
          name: 'unit',
          include: [
            `{shared,server,src}/**/*.${ending}`,
            `tests/{corpus,export,references,support}/**/*.${ending}`,
          ],
        },
      },
      {
        extends: true,
        test: {
          name: 'integration',
          include: [`tests/api/**/*.${ending}`],
          globalSetup: ['tests/support/worker-databases.ts'],
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          include: [`tests/browser/**/*.${ending}`],
          // One browser and one server at a time: two cores carry no more.
          fileParallelism: false,
          testTimeout: 180_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
});
