import { randomInt } from 'node:crypto';

import { type Logger, pino } from 'pino';

import type { Settings } from './config/settings.ts';
import { type Database, openDatabase } from './db/client.ts';
import { createEngine, type Engine } from './workers/engine.ts';

/** Everything that the server's features stand on; made once, handed down. */
export interface AppContext {
  settings: Settings;
  database: Database;
  /** The checker, in its own threads. */
  engine: Engine;
  logger: Logger;
  /** The time now. */
  clock: () => Date;
  /** Numbers in [0, 1) that nobody can foretell. */
  random: () => number;
  /** Lets go of threads, then of the database. */
  close: () => Promise<void>;
}

/** Builds the context from the settings; tests put their own parts in by `overrides`. */
export function createContext(settings: Settings, overrides: Partial<AppContext> = {}): AppContext {
  const handle =
    overrides.database === undefined
      ? openDatabase(settings.databaseUrl, settings.databaseConnections)
      : null;
  const database = overrides.database ?? handle?.database;
  if (database === undefined) throw new Error('There is no database.');
  const logger = overrides.logger ?? pino({ level: settings.logLevel });
  const engine =
    overrides.engine ??
    createEngine({
      threads: settings.engineWorkers,
      report: (error) => logger.error({ err: error }, 'a thread of the engine broke'),
    });
  return {
    settings,
    database,
    engine,
    logger,
    clock: () => new Date(),
    random: () => randomInt(2 ** 32) / 2 ** 32,
    close: async () => {
      await engine.close();
      await handle?.close();
    },
    ...overrides,
  };
}
