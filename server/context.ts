import { randomInt } from 'node:crypto';

import { type Logger, pino } from 'pino';

import type { Settings } from './config/settings.ts';
import { type Database, openDatabase } from './db/client.ts';
import { createEngine, type Engine } from './workers/engine.ts';
import { createExporter, type Exporter } from './workers/exporter.ts';
import { createPictures, type Pictures } from './workers/pictures.ts';

/** Everything that the server's features stand on; made once, handed down. */
export interface AppContext {
  settings: Settings;
  database: Database;
  /** The checker, in its own threads. */
  engine: Engine;
  /** Writes documents, in a thread of its own. */
  exporter: Exporter;
  /** Looks at uploaded pictures, in a thread of its own. */
  pictures: Pictures;
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
  const report = (error: Error) => {
    logger.error({ err: error }, 'a worker thread broke');
  };
  const engine = overrides.engine ?? createEngine({ threads: settings.engineWorkers, report });
  const exporter = overrides.exporter ?? createExporter({ report });
  const pictures = overrides.pictures ?? createPictures({ report });
  return {
    settings,
    database,
    engine,
    exporter,
    pictures,
    logger,
    clock: () => new Date(),
    random: () => randomInt(2 ** 32) / 2 ** 32,
    close: async () => {
      await Promise.all([engine.close(), exporter.close(), pictures.close()]);
      await handle?.close();
    },
    ...overrides,
  };
}
