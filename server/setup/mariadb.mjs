import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, openSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';

import { keptPort, waitForGreeting } from './ports.mjs';
import { endOrphan, endProcess } from './processes.mjs';
import { run } from './run.mjs';
import { SetupError } from './say.mjs';

/** Recovery after a crash may take a while on a full bank, ms. */
const START_PATIENCE = 120_000;
const STOP_PATIENCE = 60_000;

/** Programs of Debian that stand outside an ordinary user's search path. */
const server = existsSync('/usr/sbin/mariadbd') ? '/usr/sbin/mariadbd' : 'mariadbd';

/** MariaDB refuses to run as root unless it is told so by name. */
const asRoot = process.getuid?.() === 0 ? ['--user=root'] : [];

/** Makes the system tables beside their place and then moves them, so that a half-made folder is never used. */
async function initialise(folder) {
  const side = `${folder}.new`;
  rmSync(side, { recursive: true, force: true });
  await run('mariadb-install-db', [
    '--no-defaults',
    `--datadir=${side}`,
    '--auth-root-authentication-method=socket',
    '--skip-test-db',
    ...asRoot,
  ]);
  renameSync(side, folder);
}

/** A short-named folder for this run; `note` remembers it, so that one left by a crash goes away. */
function makeRunFolder(note) {
  if (existsSync(note)) rmSync(readFileSync(note, 'utf8'), { recursive: true, force: true });
  const folder = mkdtempSync(path.join(tmpdir(), 'graticule-'));
  writeFileSync(note, folder);
  return folder;
}

/**
 * @typedef {object} Mariadb
 * @property {number} port
 * @property {string} socket
 * @property {Promise<number>} ended its exit code, when it has ended for whatever reason
 */

/**
 * Starts a MariaDB server of the project's own on 127.0.0.1, with its data in `folder`; one that a crash has left
 * there is ended first. It lives in a process group of its own, so that Ctrl-C reaches the server in front of it
 * before it.
 * @param {object} options
 * @param {string} options.folder absolute; made and filled when missing
 * @param {readonly string[]} options.statements SQL run before the first connection is taken
 * @param {ReturnType<typeof import('./stoppers.mjs').createStoppers>} options.stoppers learns how to stop it
 * @param {readonly string[]} [options.args] further arguments
 * @returns {Promise<Mariadb>} once it takes connections
 * @throws {SetupError} when it does not come up, with the end of its log
 */
export async function startMariadb({ folder, statements, stoppers, args = [] }) {
  const pidFile = `${folder}.pid`;
  await endOrphan(pidFile, `--datadir=${folder}`, STOP_PATIENCE);
  if (!existsSync(folder)) await initialise(folder);

  const port = await keptPort(`${folder}.port`);
  // A socket's path must be short, which the project's own need not be.
  const run = makeRunFolder(`${folder}.run`);
  const socket = path.join(run, 'mariadb.sock');
  const init = path.join(run, 'init.sql');
  writeFileSync(init, statements.map((statement) => `${statement};\n`).join(''), { mode: 0o600 });
  const log = `${folder}.log`;
  const child = spawn(
    server,
    [
      '--no-defaults',
      `--datadir=${folder}`,
      `--socket=${socket}`,
      `--pid-file=${pidFile}`,
      '--bind-address=127.0.0.1',
      `--port=${port}`,
      `--init-file=${init}`,
      '--skip-name-resolve',
      '--skip-log-bin',
      '--character-set-server=utf8mb4',
      '--collation-server=utf8mb4_unicode_ci',
      '--max-allowed-packet=64M',
      ...asRoot,
      ...args,
    ],
    { detached: true, stdio: ['ignore', 'ignore', openSync(log, 'w', 0o600)] },
  );
  let gone = false;
  const ended = new Promise((resolve) => {
    const end = (code) => {
      gone = true;
      rmSync(run, { recursive: true, force: true });
      resolve(code ?? 1);
    };
    child.once('exit', end);
    child.once('error', () => end(127));
  });
  const stop = async () => {
    if (!gone && child.pid !== undefined) await endProcess(child.pid, STOP_PATIENCE);
    await ended;
  };

  stoppers.add(stop);

  if (!(await waitForGreeting(port, () => gone, START_PATIENCE))) {
    const end = readFileSync(log, 'utf8').trim().split('\n').slice(-8).join('\n');
    throw new SetupError(`MariaDB did not start. Its log ends:\n${end}`);
  }
  return { port, socket, ended };
}
