import { startBankDatabase } from './bank-database.mjs';
import { inProject } from './places.mjs';
import { isFree } from './ports.mjs';
import { run } from './run.mjs';
import { SetupError } from './say.mjs';
import { keptSecret } from './secrets.mjs';

/** The invented consortium of the demo. */
export const ORGANISATION = 'Larkmoor Assessment Consortium';

/**
 * The port to serve on: PORT, or 3000. Throws a SetupError when it is no port or someone else has it.
 */
export async function choosePort() {
  const text = process.env['PORT'] || '3000';
  const port = Number(text);
  if (!Number.isInteger(port) || port < 1 || port > 65535) {
    throw new SetupError(`PORT is “${text}”, which is no port; set it to a number from 1 to 65535.`);
  }
  if (!(await isFree(port, process.env['HOST'] || '127.0.0.1'))) {
    throw new SetupError(`Port ${port} is taken. Choose another, for example PORT=${port + 1} npm start.`);
  }
  return port;
}

/**
 * The database of DATABASE_URL, or the project's own, which is started. `stoppers` learns what to stop, and
 * `ended` settles when the project's own server goes away by itself.
 */
export async function provideDatabase(stoppers) {
  const given = process.env['DATABASE_URL'];
  if (given) return { ownerUrl: given, applicationUrl: given, ended: new Promise(() => {}) };
  return startBankDatabase(stoppers);
}

/** The environment of every program of the product, from the caller's and the data folder. */
export function productEnvironment(databaseUrl, extra) {
  return {
    ...process.env,
    SESSION_SECRET: process.env['SESSION_SECRET'] || keptSecret('session-secret'),
    ORGANISATION: process.env['ORGANISATION'] || ORGANISATION,
    LOG_LEVEL: process.env['LOG_LEVEL'] || 'warn',
    DATABASE_URL: databaseUrl,
    ...extra,
  };
}

/** Migrates the database and fills an empty one with the demo. */
export async function prepareDatabase(nodeArgs, scripts, env) {
  for (const script of scripts) {
    await run(process.execPath, [...nodeArgs, inProject(script)], { env });
  }
}
