import { and, asc, eq, inArray } from 'drizzle-orm';

import { type Role, ROLES } from '#shared/domain/roles.ts';

import type { Connection, Transaction } from '../../db/client.ts';
import { people, personRoles } from '../../db/schema/index.ts';

const columns = {
  id: people.id,
  name: people.name,
  email: people.email,
  active: people.active,
  createdAt: people.createdAt,
  lastSeenAt: people.lastSeenAt,
  version: people.version,
};

export type PersonRow = Omit<typeof people.$inferSelect, 'passwordHash' | 'updatedAt'> & { roles: Role[] };

async function rolesOf(connection: Connection, ids: readonly number[]): Promise<Map<number, Role[]>> {
  const roles = new Map<number, Role[]>(ids.map((id) => [id, []]));
  if (ids.length === 0) return roles;
  const rows = await connection
    .select({ personId: personRoles.personId, role: personRoles.role })
    .from(personRoles)
    .where(inArray(personRoles.personId, [...ids]));
  for (const { personId, role } of rows) roles.get(personId)?.push(role);
  for (const list of roles.values()) list.sort((a, b) => ROLES.indexOf(a) - ROLES.indexOf(b));
  return roles;
}

/** Everyone, by name, with their roles; `onlyActive` leaves out closed accounts. */
export async function selectPeople(connection: Connection, onlyActive: boolean): Promise<PersonRow[]> {
  const rows = await connection
    .select(columns)
    .from(people)
    .where(onlyActive ? eq(people.active, true) : undefined)
    .orderBy(asc(people.name), asc(people.id));
  const roles = await rolesOf(
    connection,
    rows.map((row) => row.id),
  );
  return rows.map((row) => ({ ...row, roles: roles.get(row.id) ?? [] }));
}

/** One person with their roles; null when there is none. */
export async function selectPerson(connection: Connection, personId: number): Promise<PersonRow | null> {
  const [row] = await connection.select(columns).from(people).where(eq(people.id, personId));
  if (row === undefined) return null;
  const roles = await rolesOf(connection, [personId]);
  return { ...row, roles: roles.get(personId) ?? [] };
}

/** One person with their roles, locked until the transaction ends; null when there is none. */
export async function lockPerson(tx: Transaction, personId: number): Promise<PersonRow | null> {
  const [row] = await tx.select(columns).from(people).where(eq(people.id, personId)).for('update');
  if (row === undefined) return null;
  const roles = await rolesOf(tx, [personId]);
  return { ...row, roles: roles.get(personId) ?? [] };
}

/** Ids of all active administrators, locked, so that two of them cannot remove each other at one moment. */
export async function lockAdministrators(tx: Transaction): Promise<number[]> {
  const rows = await tx
    .select({ id: people.id })
    .from(personRoles)
    .innerJoin(people, eq(people.id, personRoles.personId))
    .where(and(eq(personRoles.role, 'administrator'), eq(people.active, true)))
    .orderBy(asc(people.id))
    .for('update');
  return rows.map((row) => row.id);
}

/** Gives a person exactly these roles and raises the version. */
export async function replaceRoles(
  tx: Transaction,
  person: PersonRow,
  roles: readonly Role[],
  grantedById: number,
  at: Date,
): Promise<void> {
  const taken = person.roles.filter((role) => !roles.includes(role));
  const given = roles.filter((role) => !person.roles.includes(role));
  if (taken.length > 0) {
    await tx
      .delete(personRoles)
      .where(and(eq(personRoles.personId, person.id), inArray(personRoles.role, taken)));
  }
  if (given.length > 0) {
    await tx
      .insert(personRoles)
      .values(given.map((role) => ({ personId: person.id, role, grantedById, grantedAt: at })));
  }
  await tx
    .update(people)
    .set({ version: person.version + 1, updatedAt: at })
    .where(eq(people.id, person.id));
}
