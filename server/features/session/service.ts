import { AppError } from '#shared/errors/app-error.ts';

import type { AppContext } from '../../context.ts';
import { inTransaction } from '../../db/client.ts';
import { sha256 } from '../../db/columns.ts';
import { type Identity, SIGN_IN_FAILED } from '../../http/authentication.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { recordEvent } from '../records/record-event.ts';
import { passwordMatches } from './password.ts';
import { findActivePerson, findCredentials, noteSeen } from './queries.ts';
import { enterAttempt } from './throttle.ts';

/** The time of the last visit is written again after so long, ms. */
const SEEN_AFTER = 5 * 60_000;

/** A short name of a session for the records, from which the session's id cannot be found. */
export function sessionReference(sessionId: string): string {
  return sha256(`records ${sessionId}`).slice(0, 16);
}

async function verify(context: AppContext, typed: string, password: string, address: string) {
  const { database } = context;
  const email = typed.trim().toLowerCase();
  const attempt = await enterAttempt(database, context.clock(), email, address);
  const found = await findCredentials(database, email);
  const matches = await passwordMatches(found?.passwordHash ?? null, password);
  if (found === null || !matches || !found.active) {
    await inTransaction(database, (tx) =>
      recordEvent(tx, {
        event: 'session.refused',
        actor: null,
        subjectType: 'person',
        subjectId: found?.id ?? null,
        summary: found === null ? 'Refused a sign-in for an unknown address.' : 'Refused a sign-in.',
      }),
    );
    throw new AppError('signInFailed', SIGN_IN_FAILED);
  }
  await attempt.forget();
  return { id: found.id };
}

async function find(context: AppContext, personId: number, sessionId: string): Promise<SignedIn | null> {
  const person = await findActivePerson(context.database, personId);
  if (person === null) return null;
  const now = context.clock();
  if (person.lastSeenAt === null || now.getTime() - person.lastSeenAt.getTime() > SEEN_AFTER) {
    await noteSeen(context.database, personId, now);
  }
  const { id, name, email, roles } = person;
  return { id, name, email, roles, sessionRef: sessionReference(sessionId) };
}

/** Who people are, for the sessions of every request. */
export function createIdentity(context: AppContext): Identity {
  return {
    verify: (email, password, address) => verify(context, email, password, address),
    find: (personId, sessionId) => find(context, personId, sessionId),
  };
}

/** Records the beginning or the end of a session. */
export async function recordSession(
  context: AppContext,
  person: SignedIn,
  event: 'session.signedIn' | 'session.signedOut',
): Promise<void> {
  await inTransaction(context.database, (tx) =>
    recordEvent(tx, {
      event,
      actor: person,
      subjectType: 'person',
      subjectId: person.id,
      summary: event === 'session.signedIn' ? `${person.name} signed in.` : `${person.name} signed out.`,
    }),
  );
}
