import { afterAll, beforeEach, describe, expect, it } from 'vitest';

import { getDesk } from '#shared/contracts/desk.ts';
import { choosePeople, listPeople, personSchema, setRoles } from '#shared/contracts/people.ts';
import { listRecords } from '#shared/contracts/records.ts';
import { getSession } from '#shared/contracts/session.ts';
import { listTopics } from '#shared/contracts/topics.ts';
import { emptyTables } from '#tests/support/empty-tables.ts';
import { makePerson, makeTopic } from '#tests/support/factories.ts';
import { openTestApp } from '#tests/support/test-app.ts';

const app = openTestApp();
const { database } = app.context;
beforeEach(() => emptyTables(database));
afterAll(() => app.close());

describe('people', () => {
  it('are listed for the administrator with roles and last visit', async () => {
    const { client, person } = await app.signIn(['administrator'], { name: 'Bo' });
    await makePerson(database, { name: 'Abe', roles: ['setter', 'writer'], active: false });
    const { people } = await client.call(listPeople);
    expect(people.map(({ name, roles, active }) => ({ name, roles, active }))).toEqual([
      { name: 'Abe', roles: ['writer', 'setter'], active: false },
      { name: 'Bo', roles: ['administrator'], active: true },
    ]);
    expect(people.find(({ id }) => id === person.id)?.lastSeenAt).not.toBeNull();
    expect(JSON.stringify(people)).not.toContain('argon2');
  });

  it('are offered by role to everybody, active ones alone and without their addresses', async () => {
    const { client } = await app.signIn(['writer'], { name: 'Wil' });
    await makePerson(database, { name: 'Rae', roles: ['reviewer'] });
    await makePerson(database, { name: 'Gone', roles: ['reviewer'], active: false });
    const reply = await client.attempt(choosePeople, { query: { role: 'reviewer' } });
    expect(choosePeople.response.parse(reply.body).people.map(({ name }) => name)).toEqual(['Rae']);
    expect(JSON.stringify(reply.body)).not.toContain('@');
    expect((await client.call(choosePeople)).people).toHaveLength(2);
  });
});

describe('giving roles', () => {
  it('takes hold at once and is recorded with what it was before', async () => {
    const { client, person } = await app.signIn(['administrator']);
    const { client: other, person: writer } = await app.signIn(['writer'], { name: 'Wil' });
    const changed = await client.call(setRoles, {
      params: { personId: writer.id },
      body: { version: 1, roles: ['setter', 'reviewer', 'setter'] },
    });
    expect(changed).toMatchObject({ roles: ['reviewer', 'setter'], version: 2 });
    expect((await other.call(getSession)).person?.roles).toEqual(['reviewer', 'setter']);
    const { rows } = await client.call(listRecords, { query: { event: 'person' } });
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({
      event: 'person.rolesSet',
      person: { id: person.id },
      subjectType: 'person',
      subjectId: writer.id,
      summary: 'Gave Wil the roles: reviewer, setter.',
    });
  });

  it('can leave a person without any role', async () => {
    const { client } = await app.signIn(['administrator']);
    const { client: other, person } = await app.signIn(['writer']);
    await client.call(setRoles, { params: { personId: person.id }, body: { version: 1, roles: [] } });
    expect((await other.attempt(getDesk)).status).toBe(403);
  });

  it('refuses a stale version and shows the person as they are now', async () => {
    const { client } = await app.signIn(['administrator']);
    const { person } = await app.signIn(['writer']);
    const params = { personId: person.id };
    await client.call(setRoles, { params, body: { version: 1, roles: ['setter'] } });
    const reply = await client.attempt(setRoles, { params, body: { version: 1, roles: ['moderator'] } });
    expect(reply.status).toBe(409);
    expect(reply.body.code).toBe('conflict');
    expect(personSchema.parse(reply.body.current)).toMatchObject({ roles: ['setter'], version: 2 });
    const { people } = await client.call(listPeople);
    expect(people.find(({ id }) => id === person.id)?.roles).toEqual(['setter']);
  });

  it('keeps one administrator', async () => {
    const { client, person } = await app.signIn(['administrator']);
    await makePerson(database, { roles: ['administrator'], active: false });
    const params = { personId: person.id };
    const refused = await client.attempt(setRoles, { params, body: { version: 1, roles: ['writer'] } });
    expect(refused.status).toBe(409);
    expect(refused.body.detail).toMatch(/last administrator/);
    const second = await makePerson(database, { roles: ['administrator'] });
    await client.call(setRoles, { params, body: { version: 1, roles: ['writer'] } });
    expect((await client.attempt(listPeople)).status).toBe(403);
    expect(second.roles).toEqual(['administrator']);
  });

  it('keeps one administrator when two give each other up at one moment', async () => {
    const { client: one, person: first } = await app.signIn(['administrator']);
    const { client: two, person: second } = await app.signIn(['administrator']);
    const body = { version: 1, roles: [] };
    await Promise.all([
      one.attempt(setRoles, { params: { personId: second.id }, body }),
      two.attempt(setRoles, { params: { personId: first.id }, body }),
    ]);
    const roles = [(await one.call(getSession)).person?.roles, (await two.call(getSession)).person?.roles];
    expect(roles.flat()).toContain('administrator');
  });

  it('knows when there is no such person', async () => {
    const { client } = await app.signIn(['administrator']);
    const reply = await client.attempt(setRoles, {
      params: { personId: 999_999 },
      body: { version: 1, roles: [] },
    });
    expect(reply.status).toBe(404);
  });
});

describe('topics', () => {
  it('are listed in their order', async () => {
    const { client } = await app.signIn(['setter']);
    await makeTopic(database, 'First');
    await makeTopic(database, 'Second');
    const { topics } = await client.call(listTopics);
    expect(topics.map(({ name }) => name)).toEqual(['First', 'Second']);
    expect(topics[0]?.code).toMatch(/^[A-Z]{3}$/);
  });
});
