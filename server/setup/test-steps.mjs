import { readFileSync, rmSync } from 'node:fs';

import { ensureBuilt } from './build.mjs';
import { inData, inProject } from './places.mjs';
import { attempt } from './run.mjs';
import { SetupError } from './say.mjs';

/** Where the tests keep their build, apart from that of a running server. */
export const TEST_BUILD = '.data/test-build';

/**
 * @typedef {{ passed: number, failures: string[] }} Outcome
 * @typedef {object} Step
 * @property {string} name as `--only` takes it
 * @property {string} what shown while it runs
 * @property {(env: NodeJS.ProcessEnv) => Promise<Outcome>} run
 */

/** A program of a package that passes when it ends with code 0; counts as one check. */
function check(name, what, script, args) {
  return {
    name,
    what,
    run: async (env) => {
      const { code } = await attempt('node', [inProject('node_modules', script), ...args], {
        env,
        show: true,
      });
      return code === 0 ? { passed: 1, failures: [] } : { passed: 0, failures: [what] };
    },
  };
}

/** Reads what Vitest reports about each test. */
function readReport(file, what, code) {
  let report;
  try {
    report = JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return { passed: 0, failures: [`${what}: the run ended without a report`] };
  }
  const failures = [];
  for (const testFile of report.testResults) {
    const where = testFile.name.replace(`${inProject()}/`, '');
    const failed = testFile.assertionResults.filter((test) => test.status === 'failed');
    for (const test of failed) failures.push(`${where}: ${test.fullName}`);
    if (testFile.status === 'failed' && failed.length === 0) failures.push(`${where}: could not be run`);
  }
  if (code !== 0 && failures.length === 0) failures.push(`${what}: ended with code ${code}`);
  return { passed: report.numPassedTests, failures };
}

/** One project of tests/vitest.config.ts. */
function tests(name, what) {
  return {
    name,
    what,
    run: async (env) => {
      const file = inData(`report-${process.pid}-${name}.json`);
      const args = ['run', '--config', 'tests/vitest.config.ts', '--project', name];
      const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${file}`];
      const script = inProject('node_modules/vitest/vitest.mjs');
      const { code } = await attempt('node', [script, ...args, ...reporters], { env, show: true });
      const outcome = readReport(file, what, code);
      rmSync(file, { force: true });
      return outcome;
    },
  };
}

const build = {
  name: 'build',
  what: 'build',
  run: async () => {
    try {
      await ensureBuilt(TEST_BUILD);
      return { passed: 1, failures: [] };
    } catch (error) {
      if (!(error instanceof SetupError)) throw error;
      return { passed: 0, failures: [`build: ${error.message}`] };
    }
  },
};

/** @type {readonly Step[]} in the order they run */
export const steps = [
  check('format', 'formatting', 'prettier/bin/prettier.cjs', ['--check', '--log-level', 'warn', '.']),
  check('lint', 'lint', 'eslint/bin/eslint.js', [
    '--config',
    '.eslint.config.mjs',
    '--max-warnings',
    '0',
    '.',
  ]),
  check('types', 'types', 'typescript/bin/tsc', ['--noEmit', '-p', 'tsconfig.json']),
  check('directions', 'dependency directions', 'dependency-cruiser/bin/dependency-cruise.mjs', [
    '--config',
    '.dependency-cruiser.cjs',
    'src',
    'server',
    'shared',
    'tests',
  ]),
  check('unused', 'unused code', 'knip/bin/knip.js', ['--config', '.knip.json', '--no-progress']),
  tests('unit', 'unit tests'),
  tests('integration', 'integration tests'),
  build,
  tests('browser', 'browser tests'),
];

/** Steps that need a database server. */
export const needDatabase = new Set(['integration', 'browser']);
