import type { Express } from 'express';

import { createApp } from '#server/app.ts';
import { readSettings, type Settings } from '#server/config/settings.ts';
import { type AppContext, createContext } from '#server/context.ts';
import { hashPassword } from '#server/features/session/password.ts';
import type { Route } from '#server/http/route.ts';
import { createEngine, type Engine } from '#server/workers/engine.ts';
import type { Role } from '#shared/domain/roles.ts';

import { Client } from './client.ts';
import { testDatabaseUrl } from './database.ts';
import { makePerson, type TestPerson } from './factories.ts';

export const PASSWORD = 'a long enough password';

/** An engine whose threads start with its first use, since most tests need none. */
function lazyEngine(): Engine {
  let engine: Engine | null = null;
  const started = () =>
    (engine ??= createEngine({
      threads: 1,
      report: (error) => {
        throw error;
      },
    }));
  return {
    assay: (...args) => started().assay(...args),
    viewDraw: (...args) => started().viewDraw(...args),
    markWorking: (...args) => started().markWorking(...args),
    chooseDraw: (...args) => started().chooseDraw(...args),
    buildPaper: (...args) => started().buildPaper(...args),
    cautions: (...args) => started().cautions(...args),
    close: async () => engine?.close(),
  };
}

/** A clock that stands at the real time until a test moves it. */
export interface TestClock {
  now: () => Date;
  /** Goes on by so many milliseconds. */
  advance: (milliseconds: number) => void;
}

function createClock(): TestClock {
  let ahead = 0;
  return {
    now: () => new Date(Date.now() + ahead),
    advance: (milliseconds) => {
      ahead += milliseconds;
    },
  };
}

export interface TestApp {
  app: Express;
  routes: readonly Route[];
  context: AppContext;
  clock: TestClock;
  /** A browser that nobody has signed in with. */
  visitor: () => Client;
  /** A new person with these roles, signed in through the sign-in route. */
  signIn: (
    roles: readonly Role[],
    person?: Partial<TestPerson>,
  ) => Promise<{ client: Client; person: TestPerson }>;
  close: () => Promise<void>;
}

/** The whole application on this worker's database. */
export function openTestApp(settings: Partial<Settings> = {}, overrides: Partial<AppContext> = {}): TestApp {
  const clock = createClock();
  const base = readSettings({
    NODE_ENV: 'test',
    DATABASE_URL: testDatabaseUrl(),
    SESSION_SECRET: 'a secret of the tests, long enough to be taken',
    LOG_LEVEL: 'silent',
  });
  const context = createContext(
    { ...base, ...settings },
    { engine: lazyEngine(), clock: clock.now, ...overrides },
  );
  const { app, routes } = createApp(context);
  const visitor = () => new Client(app);
  return {
    app,
    routes,
    context,
    clock,
    visitor,
    signIn: async (roles, overridden = {}) => {
      const passwordHash = await (hashed ??= hashPassword(PASSWORD));
      const person = await makePerson(context.database, { roles: [...roles], passwordHash, ...overridden });
      const client = visitor();
      const reply = await client.signIn(person.email, PASSWORD);
      if (reply.status !== 200) throw new Error(`Sign-in failed: ${JSON.stringify(reply.body)}`);
      return { client, person };
    },
    close: () => context.close(),
  };
}

let hashed: Promise<string> | null = null;
