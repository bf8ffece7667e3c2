import { lt } from 'drizzle-orm';

import type { AppContext } from '../context.ts';
import { oneTimeTokens, sessions, signInAttempts } from '../db/schema/index.ts';

const EVERY = 10 * 60_000;
const DAY = 24 * 3_600_000;

/** Removes what no longer counts: expired sessions, day-old tries to sign in, tokens expired a month ago. */
export async function clearExpired(context: Pick<AppContext, 'database' | 'clock'>): Promise<void> {
  const now = context.clock().getTime();
  await context.database.delete(sessions).where(lt(sessions.expiresAt, new Date(now)));
  await context.database.delete(signInAttempts).where(lt(signInAttempts.at, new Date(now - DAY)));
  await context.database.delete(oneTimeTokens).where(lt(oneTimeTokens.expiresAt, new Date(now - 30 * DAY)));
}

/** Clears every ten minutes; a failure is logged and tried again next time. Returns what stops it. */
export function startHousekeeping(context: AppContext): () => Promise<void> {
  let running: Promise<void> = Promise.resolve();
  const timer = setInterval(() => {
    running = clearExpired(context).catch((error: unknown) => {
      context.logger.warn({ err: error }, 'housekeeping failed');
    });
  }, EVERY);
  timer.unref();
  return async () => {
    clearInterval(timer);
    await running;
  };
}
