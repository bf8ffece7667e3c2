import type { Person } from '#shared/contracts/people.ts';
import { type Role, ROLES } from '#shared/domain/roles.ts';
import { AppError } from '#shared/errors/app-error.ts';

import type { AppContext } from '../../context.ts';
import { type Connection, inTransaction } from '../../db/client.ts';
import { demand } from '../../http/demand.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { recordEvent } from '../records/record-event.ts';
import {
  lockAdministrators,
  lockPerson,
  type PersonRow,
  replaceRoles,
  selectPeople,
  selectPerson,
} from './queries.ts';

function present(row: PersonRow): Person {
  return {
    id: row.id,
    name: row.name,
    email: row.email,
    roles: row.roles,
    active: row.active,
    createdAt: row.createdAt.toISOString(),
    lastSeenAt: row.lastSeenAt?.toISOString() ?? null,
    version: row.version,
  };
}

/** One person with their roles; throws AppError notFound. */
export async function personById(connection: Connection, personId: number): Promise<PersonRow> {
  const person = await selectPerson(connection, personId);
  if (person === null) throw new AppError('notFound', 'There is no such person.');
  return person;
}

/** Active people who hold any of these roles, by name. */
export async function peopleInRoles(connection: Connection, roles: readonly Role[]): Promise<PersonRow[]> {
  const everyone = await selectPeople(connection, true);
  return everyone.filter((person) => roles.some((role) => person.roles.includes(role)));
}

/** All people, by name. */
export async function listPeople(context: AppContext): Promise<Person[]> {
  return (await selectPeople(context.database, false)).map(present);
}

/** Active people by name, those with `role` when one is asked for. */
export async function choosePeople(
  context: AppContext,
  role: Role | undefined,
): Promise<{ id: number; name: string; roles: Role[] }[]> {
  const rows = await selectPeople(context.database, true);
  return rows
    .filter((row) => role === undefined || row.roles.includes(role))
    .map(({ id, name, roles }) => ({ id, name, roles }));
}

/**
 * Gives a person exactly these roles. Throws AppError notFound, notAllowed, conflict (with the person as they
 * are now) when the version is stale, or notPossible when no administrator would be left.
 */
export async function setRoles(
  context: AppContext,
  actor: SignedIn,
  personId: number,
  wanted: { version: number; roles: readonly Role[] },
): Promise<Person> {
  return inTransaction(context.database, async (tx) => {
    const administrators = await lockAdministrators(tx);
    const person = await lockPerson(tx, personId);
    if (person === null) throw new AppError('notFound', 'There is no such person.');
    demand(actor, 'person.setRoles');
    if (person.version !== wanted.version) {
      throw new AppError('conflict', 'Somebody else changed this person’s roles. Look at them again.', {
        current: present(person),
      });
    }
    const roles = ROLES.filter((role) => wanted.roles.includes(role));
    const othersRemain = administrators.some((id) => id !== personId);
    if (person.roles.includes('administrator') && !roles.includes('administrator') && !othersRemain) {
      throw new AppError(
        'notPossible',
        actor.id === personId
          ? 'You are the last administrator. Give the role to another person before you give it up.'
          : 'This is the last administrator. Give the role to another person first.',
      );
    }
    await replaceRoles(tx, person, roles, actor.id, context.clock());
    await recordEvent(tx, {
      event: 'person.rolesSet',
      actor,
      subjectType: 'person',
      subjectId: personId,
      summary: `Gave ${person.name} the roles: ${roles.join(', ') || 'none'}.`,
      before: { roles: person.roles },
      after: { roles },
    });
    const changed = await lockPerson(tx, personId);
    if (changed === null) throw new Error(`Person ${personId} is gone within the transaction.`);
    return present(changed);
  });
}
