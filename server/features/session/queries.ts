import { and, eq } from 'drizzle-orm';

import type { Role } from '#shared/domain/roles.ts';

import type { Database } from '../../db/client.ts';
import { people, personRoles } from '../../db/schema/index.ts';

export interface Credentials {
  id: number;
  passwordHash: string | null;
  active: boolean;
}

/** What signing in compares; null for an unknown address (given in lower case). */
export async function findCredentials(database: Database, email: string): Promise<Credentials | null> {
  const [row] = await database
    .select({ id: people.id, passwordHash: people.passwordHash, active: people.active })
    .from(people)
    .where(eq(people.email, email));
  return row ?? null;
}

export interface ActivePerson {
  id: number;
  name: string;
  email: string;
  roles: Role[];
  lastSeenAt: Date | null;
}

/** An active person with their roles; null when there is none. */
export async function findActivePerson(database: Database, personId: number): Promise<ActivePerson | null> {
  const rows = await database
    .select({
      id: people.id,
      name: people.name,
      email: people.email,
      lastSeenAt: people.lastSeenAt,
      role: personRoles.role,
    })
    .from(people)
    .leftJoin(personRoles, eq(personRoles.personId, people.id))
    .where(and(eq(people.id, personId), eq(people.active, true)))
    .orderBy(personRoles.role);
  const [first] = rows;
  if (first === undefined) return null;
  return {
    id: first.id,
    name: first.name,
    email: first.email,
    lastSeenAt: first.lastSeenAt,
    roles: rows.flatMap((row) => (row.role === null ? [] : [row.role])),
  };
}

/** Notes when a person was last here. */
export async function noteSeen(database: Database, personId: number, at: Date): Promise<void> {
  await database.update(people).set({ lastSeenAt: at }).where(eq(people.id, personId));
}
