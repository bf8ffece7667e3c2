import { and, eq, lt } from 'drizzle-orm';
import { type SessionData, Store } from 'express-session';

import type { Database } from '../db/client.ts';
import { sha256 } from '../db/columns.ts';
import { sessions } from '../db/schema/index.ts';

/** A session is written again for its expiry alone when that moves by more than this, ms. */
const TOUCH_AFTER = 60_000;
/** A session of nobody lives so long, ms: enough to fill in the sign-in page. */
const ANONYMOUS_LIFE = 2 * 3_600_000;

type Done = (error?: unknown) => void;

function personOf(session: SessionData): number | null {
  const id: unknown = session.passport?.user;
  return typeof id === 'number' ? id : null;
}

/** Sessions in the table `sessions`, so that every server process knows them; the id is kept as its hash. */
export class DatabaseSessionStore extends Store {
  readonly #database: Database;
  readonly #clock: () => Date;

  constructor(database: Database, clock: () => Date) {
    super();
    this.#database = database;
    this.#clock = clock;
  }

  #expiry(session: SessionData): Date {
    const life = session.cookie.originalMaxAge ?? ANONYMOUS_LIFE;
    const milliseconds = personOf(session) === null ? Math.min(life, ANONYMOUS_LIFE) : life;
    return new Date(this.#clock().getTime() + milliseconds);
  }

  #settle<Value>(work: Promise<Value>, done: (error: unknown, value?: Value) => void): void {
    work.then(
      (value) => done(null, value),
      (error: unknown) => done(error),
    );
  }

  override get(sid: string, done: (error: unknown, session?: SessionData | null) => void): void {
    this.#settle(this.#read(sid), done);
  }

  async #read(sid: string): Promise<SessionData | null> {
    const [row] = await this.#database
      .select()
      .from(sessions)
      .where(eq(sessions.sid, sha256(sid)));
    if (row === undefined || row.expiresAt <= this.#clock()) return null;
    return row.data as unknown as SessionData;
  }

  override set(sid: string, session: SessionData, done: Done = () => undefined): void {
    const values = {
      data: JSON.parse(JSON.stringify(session)) as Record<string, unknown>,
      expiresAt: this.#expiry(session),
      personId: personOf(session),
    };
    const write = this.#database
      .insert(sessions)
      .values({ sid: sha256(sid), ...values })
      .onDuplicateKeyUpdate({ set: values });
    this.#settle(write.execute(), (error) => done(error));
  }

  override touch(sid: string, session: SessionData, done: () => void = () => undefined): void {
    const expiresAt = this.#expiry(session);
    const write = this.#database
      .update(sessions)
      .set({ expiresAt })
      .where(
        and(
          eq(sessions.sid, sha256(sid)),
          lt(sessions.expiresAt, new Date(expiresAt.getTime() - TOUCH_AFTER)),
        ),
      );
    // A session that could not be prolonged is still the one it was.
    this.#settle(write.execute(), () => done());
  }

  override destroy(sid: string, done: Done = () => undefined): void {
    const remove = this.#database.delete(sessions).where(eq(sessions.sid, sha256(sid)));
    this.#settle(remove.execute(), (error) => done(error));
  }
}
