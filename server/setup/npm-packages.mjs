import { existsSync } from 'node:fs';

import { fingerprint, isRecorded, record } from './fingerprint.mjs';
import { inProject } from './places.mjs';
import { run } from './run.mjs';
import { say } from './say.mjs';

/** Installs the npm packages of the lock file, when they are missing or the lock file has changed. */
export async function ensureNpmPackages() {
  const lock = fingerprint(['package-lock.json']);
  const present = existsSync(inProject('node_modules/.package-lock.json'));
  if (present && isRecorded('npm-packages', lock)) return;
  say('Installing npm packages.');
  // NODE_ENV=production would leave out what the build needs.
  await run('npm', ['ci', '--include=dev', '--no-audit', '--no-fund', '--no-progress'], {
    env: { ...process.env, NODE_ENV: '' },
  });
  record('npm-packages', lock);
}
