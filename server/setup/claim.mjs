import { rmSync } from 'node:fs';

import { inData, makeDataFolder } from './places.mjs';
import { processOf, writePidFile } from './processes.mjs';
import { SetupError } from './say.mjs';

const pidFile = inData('start.pid');

/**
 * Makes this the only start of the project, since a second would take the first one's processes for orphans.
 * Hands back how to give that up. Throws a SetupError when another runs.
 */
export function claimProject() {
  makeDataFolder();
  const other = processOf(pidFile, 'setup/start.mjs') ?? processOf(pidFile, 'setup/dev.mjs');
  if (other !== null) {
    throw new SetupError(`The project already runs here as process ${other}. Stop that first.`);
  }
  writePidFile(pidFile, process.pid);
  return async () => rmSync(pidFile, { force: true });
}
