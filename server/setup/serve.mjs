import { spawn } from 'node:child_process';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';

import { inProject } from './places.mjs';
import { endOrphan, endProcess, writePidFile } from './processes.mjs';
import { SetupError } from './say.mjs';

/** The server ends requests that still run within ten seconds; a little more is given, ms. */
const STOP_PATIENCE = 20_000;
const START_PATIENCE = 60_000;

async function isHealthy(port) {
  try {
    const reply = await fetch(`http://127.0.0.1:${port}/api/health`, { signal: AbortSignal.timeout(2000) });
    return reply.status === 200;
  } catch {
    // Nothing listens yet, or it is too busy to answer.
    return false;
  }
}

/** Ends a server that an earlier run has left behind. */
export function endOrphanedServer(pidFile, script) {
  return endOrphan(pidFile, inProject(script), STOP_PATIENCE);
}

/**
 * Starts a program that serves /api/health on `port`, in a process group of its own, and waits until it is ready.
 * @param {object} options
 * @param {readonly string[]} options.args arguments of node; the script's path within the project last
 * @param {readonly string[]} [options.tail] arguments of the script
 * @param {NodeJS.ProcessEnv} options.env
 * @param {number} options.port
 * @param {string} options.pidFile
 * @param {ReturnType<typeof import('./stoppers.mjs').createStoppers>} options.stoppers learns how to stop it
 * @returns {Promise<{ ended: Promise<number> }>}
 * @throws {SetupError} when it ends or stays silent for a minute
 */
export async function startServer({ args, tail = [], env, port, pidFile, stoppers }) {
  const script = inProject(args.at(-1));
  const child = spawn(process.execPath, [...args.slice(0, -1), script, ...tail], {
    cwd: inProject(),
    env,
    detached: true,
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  writePidFile(pidFile, child.pid);
  let gone = false;
  const ended = new Promise((resolve) => {
    child.once('exit', (code) => {
      gone = true;
      resolve(code ?? 1);
    });
  });
  const stop = async () => {
    if (!gone) await endProcess(child.pid, STOP_PATIENCE);
    await ended;
  };
  stoppers.add(stop);
  const limit = Date.now() + START_PATIENCE;
  while (!(await isHealthy(port))) {
    if (gone) throw new SetupError(`${path.basename(script)} ended before it was ready.`);
    if (Date.now() > limit) throw new SetupError(`${path.basename(script)} was not ready within a minute.`);
    await pause(100);
  }
  return { ended };
}
