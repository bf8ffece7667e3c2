import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { setTimeout as pause } from 'node:timers/promises';

/** The command line of a living process, with spaces between its words; null when there is none. */
function commandLine(pid) {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').replaceAll('\0', ' ').trim() || null;
  } catch {
    return null;
  }
}

/**
 * The process that a pid file names, when it still lives and its command line holds `mark`: numbers of processes
 * are used again, so that the number alone proves nothing. Null otherwise.
 */
export function processOf(pidFile, mark) {
  if (!existsSync(pidFile)) return null;
  const pid = Number(readFileSync(pidFile, 'utf8').trim());
  if (!Number.isInteger(pid) || pid <= 1) return null;
  return commandLine(pid)?.includes(mark) ? pid : null;
}

/** Notes the number of a process for `processOf`. */
export function writePidFile(pidFile, pid) {
  writeFileSync(pidFile, `${pid}\n`);
}

/** Sends a signal to a process that may have ended meanwhile. */
function signal(pid, name) {
  try {
    process.kill(pid, name);
  } catch (error) {
    if (error.code !== 'ESRCH') throw error;
  }
}

/** Asks a process to end and waits until it has; forces it after `patience` ms. */
export async function endProcess(pid, patience) {
  signal(pid, 'SIGTERM');
  const limit = Date.now() + patience;
  while (commandLine(pid) !== null) {
    if (Date.now() > limit) signal(pid, 'SIGKILL');
    await pause(50);
  }
}

/** Ends what an earlier run left behind after a crash, and forgets its pid file. */
export async function endOrphan(pidFile, mark, patience) {
  const pid = processOf(pidFile, mark);
  if (pid !== null) await endProcess(pid, patience);
  rmSync(pidFile, { force: true });
}
