import { eq } from 'drizzle-orm';
import { afterAll, beforeEach, describe, expect, it } from 'vitest';

import { auditEvents, people, sessions, signInAttempts } from '#server/db/schema/index.ts';
import { clearExpired } from '#server/jobs/housekeeping.ts';
import { getDesk } from '#shared/contracts/desk.ts';
import { getSession, signIn, signOut } from '#shared/contracts/session.ts';
import { problemSchema } from '#shared/errors/app-error.ts';
import { emptyTables } from '#tests/support/empty-tables.ts';
import { openTestApp, PASSWORD } from '#tests/support/test-app.ts';

const app = openTestApp();
const { database } = app.context;
beforeEach(() => emptyTables(database));
afterAll(() => app.close());

const HOUR = 3_600_000;

function cookieOf(headers: Record<string, unknown>): string {
  const [cookie] = headers['set-cookie'] as string[];
  return cookie ?? '';
}

describe('signing in', () => {
  it('tells who is signed in, with their abilities and a token', async () => {
    const { client, person } = await app.signIn(['writer'], { name: 'Ada Brook' });
    const session = await client.call(getSession);
    expect(session.person).toMatchObject({ id: person.id, name: 'Ada Brook', roles: ['writer'] });
    expect(session.person?.abilities).toContain('item.create');
    expect(session.person?.abilities).not.toContain('review.claim');
    expect(session.csrfToken.length).toBeGreaterThan(30);
  });

  it('takes an address in whatever case it is written', async () => {
    const { person } = await app.signIn(['writer']);
    const reply = await app.visitor().signIn(person.email.toUpperCase(), PASSWORD);
    expect(reply.status).toBe(200);
  });

  it('answers a wrong password, an unknown address and a closed account with the same words', async () => {
    const { person } = await app.signIn(['writer']);
    const wrong = await app.visitor().signIn(person.email, 'wrong');
    const unknown = await app.visitor().signIn('nobody@tests.example', PASSWORD);
    await database.update(people).set({ active: false }).where(eq(people.id, person.id));
    const closed = await app.visitor().signIn(person.email, PASSWORD);
    for (const reply of [wrong, unknown, closed]) {
      expect(reply.status).toBe(401);
      expect(reply.body).toMatchObject({
        code: 'signInFailed',
        detail: 'The e-mail address and the password do not belong together.',
      });
    }
  });

  it('refuses a person who has not chosen a password yet', async () => {
    await app.signIn([], { email: 'set@tests.example' });
    await database.update(people).set({ passwordHash: null });
    expect((await app.visitor().signIn('set@tests.example', PASSWORD)).status).toBe(401);
  });

  it('names the fields that are missing', async () => {
    const reply = await app.visitor().attempt(signIn, { body: { email: 'no address' } });
    expect(reply.status).toBe(422);
    expect(reply.body.fields?.map((field) => field.path).sort()).toEqual(['email', 'password']);
  });

  it('gives the session a new id, so that one planted before is worth nothing', async () => {
    const { person } = await app.signIn(['writer']);
    const client = app.visitor();
    const before = cookieOf((await client.agent.get(getSession.path)).headers);
    await client.signIn(person.email, PASSWORD);
    const planted = await app.visitor().agent.get(getSession.path).set('Cookie', before);
    expect((planted.body as { person: unknown }).person).toBeNull();
    const after = cookieOf((await client.agent.get(getSession.path)).headers);
    expect(after.split(';')[0]).not.toBe(before.split(';')[0]);
    expect((await client.call(getSession)).person?.id).toBe(person.id);
  });

  it('keeps no session id in the database', async () => {
    const { client } = await app.signIn(['writer']);
    const cookie = decodeURIComponent(cookieOf((await client.agent.get(getSession.path)).headers));
    const id = /s:([^.]+)\./.exec(cookie)?.[1] ?? '';
    expect(id.length).toBeGreaterThan(20);
    const rows = await database.select().from(sessions);
    expect(JSON.stringify(rows)).not.toContain(id);
  });

  it('marks the cookie as HttpOnly and SameSite=Lax', async () => {
    const { client } = await app.signIn(['writer']);
    const cookie = cookieOf((await client.agent.get(getSession.path)).headers);
    expect(cookie).toMatch(/HttpOnly/);
    expect(cookie).toMatch(/SameSite=Lax/);
    expect(cookie).not.toMatch(/Secure/);
  });

  it('marks the cookie as secure behind a proxy that speaks https', async () => {
    const https = openTestApp({ secureCookies: true, publicOrigin: 'https://bank.example', trustProxy: 1 });
    const reply = await https.visitor().agent.get(getSession.path).set('X-Forwarded-Proto', 'https');
    expect(cookieOf(reply.headers)).toMatch(/Secure/);
    expect(reply.headers['strict-transport-security']).toBeDefined();
    await https.close();
  });

  it('records who came and who was refused', async () => {
    const { client, person } = await app.signIn(['writer']);
    await app.visitor().signIn(person.email, 'wrong');
    await client.call(signOut);
    const events = await database.select().from(auditEvents).orderBy(auditEvents.id);
    expect(events.map((event) => [event.event, event.personId])).toEqual([
      ['session.signedIn', person.id],
      ['session.refused', null],
      ['session.signedOut', person.id],
    ]);
  });
});

describe('a session', () => {
  it('ends with signing out', async () => {
    const { client } = await app.signIn(['writer']);
    const cookie = cookieOf((await client.agent.get(getSession.path)).headers);
    await client.call(signOut);
    expect((await client.call(getSession)).person).toBeNull();
    const replayed = await app.visitor().agent.get(getDesk.path).set('Cookie', cookie);
    expect(replayed.status).toBe(401);
  });

  it('ends after eight idle hours, with a sentence that says so', async () => {
    const { client } = await app.signIn(['writer']);
    app.clock.advance(8 * HOUR + 1_000);
    const reply = await client.attempt(getDesk);
    expect(reply.status).toBe(401);
    expect(reply.body).toMatchObject({
      code: 'notSignedIn',
      detail: 'Your session has ended. Sign in again; what you typed is still here.',
    });
  });

  it('lasts as long as it is used', async () => {
    const { client } = await app.signIn(['writer']);
    for (let hours = 0; hours < 20; hours += 5) {
      app.clock.advance(5 * HOUR);
      expect((await client.attempt(getDesk)).status).toBe(200);
    }
  });

  it('of nobody lasts two hours', async () => {
    const client = app.visitor();
    const before = (await client.call(getSession)).csrfToken;
    app.clock.advance(2 * HOUR + 1_000);
    expect((await client.call(getSession)).csrfToken).not.toBe(before);
  });

  it('ends at once when the account is closed', async () => {
    const { client, person } = await app.signIn(['writer']);
    await database.update(people).set({ active: false }).where(eq(people.id, person.id));
    expect((await client.attempt(getDesk)).status).toBe(401);
  });

  it('is cleared away once it has expired', async () => {
    await app.signIn(['writer']);
    await clearExpired(app.context);
    expect(await database.select().from(sessions)).not.toHaveLength(0);
    app.clock.advance(9 * HOUR);
    await clearExpired(app.context);
    expect(await database.select().from(sessions)).toHaveLength(0);
  });

  it('is known to every server process', async () => {
    const { client } = await app.signIn(['setter']);
    const cookie = cookieOf((await client.agent.get(getSession.path)).headers);
    const second = openTestApp({}, { clock: app.clock.now });
    const reply = await second.visitor().agent.get(getDesk.path).set('Cookie', cookie);
    expect(reply.status).toBe(200);
    await second.close();
  });
});

describe('a page’s token', () => {
  it.each([
    ['is missing', undefined],
    ['is wrong', 'f'.repeat(64)],
  ])('is asked of every change: refused when it %s', async (_name, token) => {
    const { client } = await app.signIn(['writer']);
    const request = client.agent.delete(signOut.path);
    if (token !== undefined) request.set('x-csrf-token', token);
    const reply = await request;
    expect(reply.status).toBe(403);
    const problem = problemSchema.parse(reply.body);
    expect(problem.code).toBe('badCsrfToken');
    expect(problem.detail).toMatch(/Reload/);
    expect((await client.call(getSession)).person).not.toBeNull();
  });

  it('is asked of signing in', async () => {
    const reply = await app
      .visitor()
      .agent.post(signIn.path)
      .send({ email: 'a@tests.example', password: 'x' });
    expect(reply.status).toBe(403);
  });

  it('of another session is refused', async () => {
    const { client } = await app.signIn(['writer']);
    const { client: other } = await app.signIn(['writer']);
    const reply = await client.agent.delete(signOut.path).set('x-csrf-token', await other.csrfToken());
    expect(reply.status).toBe(403);
  });
});

describe('too many tries', () => {
  it('close an account for a while, even for the right password, on every server', async () => {
    const { person } = await app.signIn(['writer']);
    const second = openTestApp({}, { clock: app.clock.now });
    for (let tries = 0; tries < 8; tries += 1) {
      const server = tries % 2 === 0 ? app : second;
      expect((await server.visitor().signIn(person.email, 'wrong')).status).toBe(401);
    }
    const refused = await second.visitor().signIn(person.email, PASSWORD);
    expect(refused.status).toBe(429);
    expect(refused.body.detail).toMatch(/Wait 15 minutes/);
    expect(refused.headers['retry-after']).toBe('900');
    app.clock.advance(15 * 60_000 + 1_000);
    expect((await app.visitor().signIn(person.email, PASSWORD)).status).toBe(200);
    await second.close();
  });

  it('do not count when they succeed', async () => {
    const { person } = await app.signIn(['writer']);
    for (let tries = 0; tries < 10; tries += 1) {
      expect((await app.visitor().signIn(person.email, PASSWORD)).status).toBe(200);
    }
    expect(await database.select().from(signInAttempts)).toHaveLength(0);
  });

  it('all count when they come at one moment', async () => {
    const { person } = await app.signIn(['writer']);
    const replies = await Promise.all(
      Array.from({ length: 12 }, () => app.visitor().signIn(person.email, 'wrong')),
    );
    const guessed = replies.filter((reply) => reply.status === 401);
    expect(guessed.length).toBeLessThanOrEqual(8);
    expect(replies.filter((reply) => reply.status === 429)).toHaveLength(12 - guessed.length);
  });

  it('from one network address are refused whatever the account', async () => {
    for (let tries = 0; tries < 40; tries += 1) {
      await app.visitor().signIn(`guess${tries}@tests.example`, 'wrong');
    }
    const reply = await app.visitor().signIn('another@tests.example', 'wrong');
    expect(reply.status).toBe(429);
  });
});
