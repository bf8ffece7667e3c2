import { existsSync, rmSync, writeFileSync } from 'node:fs';

import { attempt, run } from './run.mjs';
import { say, SetupError } from './say.mjs';

/** What the product needs from Debian, and why. */
export const toServe = {
  'mariadb-server': 'keeps the bank; only its programs are used, never the system’s own server',
};

/** What the tests need besides. */
export const toTest = {
  ...toServe,
  chromium: 'walks through the screens as a person would',
  pandoc: 'reads exported documents back',
  'poppler-utils': 'looks at printed pages',
  units: 'a second opinion on units',
  'python3-numpy': 'a second opinion on sampling',
  'python3-scipy': 'a second opinion on numerical results',
  'python3-docx': 'a second reader of exported documents',
};

/** Those of `names` that dpkg does not know as installed. */
async function missingOf(names) {
  if (!existsSync('/usr/bin/dpkg-query')) return names;
  const { output } = await attempt('dpkg-query', ['-W', '-f', '${Package} ${db:Status-Status}\n', ...names]);
  const installed = new Set(output.split('\n').filter((line) => line.endsWith(' installed')));
  return names.filter((name) => !installed.has(`${name} installed`));
}

/**
 * Installs without letting a package start a service of its own: a policy program that refuses is put in place
 * for the time of the installation, unless the machine has one already.
 */
async function installQuietly(names) {
  const policy = '/usr/sbin/policy-rc.d';
  const ours = !existsSync(policy);
  if (ours) writeFileSync(policy, '#!/bin/sh\nexit 101\n', { mode: 0o755 });
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  try {
    await run('apt-get', ['update', '-q'], { env });
    await run('apt-get', ['install', '-y', '-q', '--no-install-recommends', ...names], { env });
  } finally {
    if (ours) rmSync(policy, { force: true });
  }
}

/**
 * Sees to it that the Debian packages of `table` are there, installing them when this may be done.
 * Throws a SetupError that says what to install when it may not.
 * @param {Readonly<Record<string, string>>} table
 */
export async function ensureDebianPackages(table) {
  const missing = await missingOf(Object.keys(table));
  if (missing.length === 0) return;
  if (process.getuid?.() !== 0 || !existsSync('/usr/bin/apt-get')) {
    throw new SetupError(`Please install these Debian packages, then run this again: ${missing.join(' ')}.`);
  }
  for (const name of missing) say(`Installing ${name}: ${table[name]}.`);
  await installQuietly(missing);
}
