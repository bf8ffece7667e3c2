import { and, count, eq, gt, inArray } from 'drizzle-orm';

import { AppError } from '#shared/errors/app-error.ts';

import type { Database } from '../../db/client.ts';
import { sha256 } from '../../db/columns.ts';
import { signInAttempts } from '../../db/schema/index.ts';

const WINDOW_MINUTES = 15;
/** Tries within the window before the next is refused. */
export const ATTEMPTS_PER_ACCOUNT = 8;
export const ATTEMPTS_PER_ADDRESS = 40;

export interface Attempt {
  /** Strikes the attempt out again, once it has succeeded. */
  forget: () => Promise<void>;
}

/**
 * Enters one try to sign in, before the password is looked at, so that tries at the same moment on several
 * servers all count. Throws AppError tooManyRequests when the account or the network address has had too many;
 * a refused try does not count.
 */
export async function enterAttempt(
  database: Database,
  now: Date,
  email: string,
  address: string,
): Promise<Attempt> {
  const subjects = [
    { kind: 'account' as const, subject: sha256(email), limit: ATTEMPTS_PER_ACCOUNT },
    { kind: 'address' as const, subject: sha256(address), limit: ATTEMPTS_PER_ADDRESS },
  ];
  const entered = await database
    .insert(signInAttempts)
    .values(subjects.map(({ kind, subject }) => ({ kind, subject, at: now })))
    .$returningId();
  const forget = async () => {
    await database.delete(signInAttempts).where(
      inArray(
        signInAttempts.id,
        entered.map((row) => row.id),
      ),
    );
  };
  const since = new Date(now.getTime() - WINDOW_MINUTES * 60_000);
  for (const { kind, subject, limit } of subjects) {
    const [row] = await database
      .select({ tries: count() })
      .from(signInAttempts)
      .where(
        and(eq(signInAttempts.kind, kind), eq(signInAttempts.subject, subject), gt(signInAttempts.at, since)),
      );
    if ((row?.tries ?? 0) > limit) {
      await forget();
      throw new AppError(
        'tooManyRequests',
        `There were too many tries to sign in. Wait ${WINDOW_MINUTES} minutes, then try again.`,
      );
    }
  }
  return { forget };
}
