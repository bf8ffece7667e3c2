import { eq, sql } from 'drizzle-orm';
import { afterAll, beforeEach, describe, expect, it } from 'vitest';

import { applyMigrations } from '#server/db/apply-migrations.ts';
import { databaseErrorCode, inTransaction, openDatabase } from '#server/db/client.ts';
import { people, personRoles, seals, sessions, topics } from '#server/db/schema/index.ts';
import { takeNumber } from '#server/db/take-number.ts';
import { testDatabaseUrl } from '#tests/support/database.ts';
import { emptyTables } from '#tests/support/empty-tables.ts';
import { makePaper, makePerson, makeTopic } from '#tests/support/factories.ts';

const { database, close } = openDatabase(testDatabaseUrl());
beforeEach(() => emptyTables(database));
afterAll(() => close());

const pause = (milliseconds: number) => new Promise((resolve) => setTimeout(resolve, milliseconds));

describe('the migrations', () => {
  it('do nothing the second time, even when two servers start at once', async () => {
    await Promise.all([applyMigrations(testDatabaseUrl()), applyMigrations(testDatabaseUrl())]);
    const [rows] = await database.execute(sql`select count(*) as n from __drizzle_migrations`);
    const before = JSON.stringify(rows);
    await applyMigrations(testDatabaseUrl());
    const [again] = await database.execute(sql`select count(*) as n from __drizzle_migrations`);
    expect(JSON.stringify(again)).toBe(before);
  });
});

describe('times', () => {
  it('are kept in UTC to the millisecond', async () => {
    const person = await makePerson(database);
    const at = new Date('2026-07-01T23:59:59.987Z');
    await database.update(people).set({ lastSeenAt: at }).where(eq(people.id, person.id));
    const [row] = await database
      .select({ at: people.lastSeenAt, text: sql<string>`cast(last_seen_at as char)` })
      .from(people);
    expect(row).toEqual({ at, text: '2026-07-01 23:59:59.987' });
  });

  it('that the database fills in are in UTC', async () => {
    const person = await makePerson(database);
    const [row] = await database.select().from(people).where(eq(people.id, person.id));
    expect(Math.abs((row?.createdAt.getTime() ?? 0) - Date.now())).toBeLessThan(60_000);
  });
});

describe('texts', () => {
  it('keep every sign', async () => {
    const name = '\u{1D463} = \u221A(2eV/m) \u2248 10\u2077 \u{1F9EA}';
    const person = await makePerson(database, { name });
    const [row] = await database.select().from(people).where(eq(people.id, person.id));
    expect(row?.name).toBe(name);
  });
});

describe('a running number', () => {
  it('is given once, however many ask, and by each name on its own', async () => {
    const taken = await Promise.all(
      Array.from({ length: 12 }, () => inTransaction(database, (tx) => takeNumber(tx, 'item:EG'))),
    );
    expect(taken.sort((a, b) => a - b)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12]);
    expect(await inTransaction(database, (tx) => takeNumber(tx, 'item:OD'))).toBe(1);
  });

  it('is given again when the transaction that took it is undone', async () => {
    const undone = inTransaction(database, async (tx) => {
      await takeNumber(tx, 'item:EG');
      throw new Error('undo');
    });
    await expect(undone).rejects.toThrow('undo');
    expect(await inTransaction(database, (tx) => takeNumber(tx, 'item:EG'))).toBe(1);
  });
});

describe('a transaction', () => {
  it('is tried again after a deadlock, and both changes stay', async () => {
    const one = await makeTopic(database, 'one');
    const two = await makeTopic(database, 'two');
    let tries = 0;
    const touch = (first: number, second: number, mark: string) =>
      inTransaction(database, async (tx) => {
        tries += 1;
        for (const id of [first, second]) {
          await tx
            .update(topics)
            .set({ name: sql`concat(name, ${mark})` })
            .where(eq(topics.id, id));
          await pause(100);
        }
      });
    await Promise.all([touch(one.id, two.id, 'a'), touch(two.id, one.id, 'b')]);
    expect(tries).toBe(3);
    const names = (await database.select().from(topics)).map(({ name }) => name);
    expect(names.every((name) => /^(one|two)(ab|ba)$/.test(name))).toBe(true);
  });

  it('leaves nothing behind when it fails halfway', async () => {
    const failed = inTransaction(database, async (tx) => {
      await tx.insert(topics).values({ code: 'AB', name: 'Half' });
      await tx.insert(topics).values({ code: 'AB', name: 'The same code' });
    });
    await expect(failed).rejects.toSatisfy((error) => databaseErrorCode(error) === 'ER_DUP_ENTRY');
    expect(await database.select().from(topics)).toHaveLength(0);
  });
});

describe('the tables themselves', () => {
  it('refuse an address that is not in lower case', async () => {
    await expect(makePerson(database, { email: 'Ann@tests.example' })).rejects.toThrow();
  });

  it('refuse a topic’s code that is not two or three capitals', async () => {
    for (const code of ['e', 'eg', 'E1']) {
      await expect(database.insert(topics).values({ code, name: code })).rejects.toThrow();
    }
  });

  it('refuse a seal by one person alone', async () => {
    const [one, two] = [await makePerson(database), await makePerson(database)];
    const paper = await makePaper(database, { createdById: one.id });
    const seal = { paperId: paper.id, canonical: '{}', sha256: 'a'.repeat(64), sealedAt: new Date() };
    await expect(
      database.insert(seals).values({ ...seal, proposedById: one.id, confirmedById: one.id }),
    ).rejects.toThrow();
    await database.insert(seals).values({ ...seal, proposedById: one.id, confirmedById: two.id });
  });

  it('take a person’s roles and sessions along, but never a person who has made something', async () => {
    const idle = await makePerson(database, { roles: ['writer'] });
    await database
      .insert(sessions)
      .values({ sid: 'x'.repeat(64), data: {}, expiresAt: new Date(), personId: idle.id });
    await database.delete(people).where(eq(people.id, idle.id));
    expect(await database.select().from(personRoles)).toHaveLength(0);
    expect(await database.select().from(sessions)).toHaveLength(0);
    const busy = await makePerson(database);
    await makePaper(database, { createdById: busy.id });
    await expect(database.delete(people).where(eq(people.id, busy.id))).rejects.toThrow();
  });
});
