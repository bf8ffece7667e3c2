import { asc, eq } from 'drizzle-orm';
import { afterAll, beforeEach, describe, expect, it } from 'vitest';

import { inTransaction } from '#server/db/client.ts';
import { sha256 } from '#server/db/columns.ts';
import { auditEvents } from '#server/db/schema/index.ts';
import { chainHash, GENESIS_HASH } from '#server/features/records/chain.ts';
import { recordEvent } from '#server/features/records/record-event.ts';
import { listRecords } from '#shared/contracts/records.ts';
import { emptyTables } from '#tests/support/empty-tables.ts';
import { openTestApp } from '#tests/support/test-app.ts';

const app = openTestApp();
const { database } = app.context;
beforeEach(() => emptyTables(database));
afterAll(() => app.close());

const note = (summary: string, extra: { after?: unknown } = {}) =>
  inTransaction(database, (tx) =>
    recordEvent(tx, {
      event: 'test.noted',
      actor: null,
      subjectType: 'test',
      subjectId: 1,
      summary,
      ...extra,
    }),
  );

/** Ids of events whose hash, or whose link to the event before, does not hold. */
async function brokenEvents(): Promise<number[]> {
  const events = await database.select().from(auditEvents).orderBy(asc(auditEvents.id));
  return events
    .filter((event, index) => {
      const previous = events[index - 1]?.hash ?? GENESIS_HASH;
      return event.previousHash !== previous || chainHash(event, sha256) !== event.hash;
    })
    .map((event) => event.id);
}

describe('the records', () => {
  it('form one chain even when many events come at once', async () => {
    await Promise.all(
      Array.from({ length: 20 }, (_, index) => note(`Event ${index}.`, { after: { index } })),
    );
    expect(await database.select().from(auditEvents)).toHaveLength(20);
    expect(await brokenEvents()).toEqual([]);
  });

  it('show when an event has been altered', async () => {
    await note('First.', { after: { roles: ['writer'], of: { b: 1, a: 2 } } });
    await note('Second.');
    await note('Third.');
    const [, second] = await database.select().from(auditEvents).orderBy(asc(auditEvents.id));
    await database
      .update(auditEvents)
      .set({ summary: 'Nothing.' })
      .where(eq(auditEvents.id, second?.id ?? 0));
    expect(await brokenEvents()).toEqual([second?.id]);
  });

  it('show when an event has been taken out', async () => {
    await note('First.');
    await note('Second.');
    await note('Third.');
    const [, second, third] = await database.select().from(auditEvents).orderBy(asc(auditEvents.id));
    await database.delete(auditEvents).where(eq(auditEvents.id, second?.id ?? 0));
    expect(await brokenEvents()).toEqual([third?.id]);
  });

  it('keep nothing of a change that was undone', async () => {
    const undone = inTransaction(database, async (tx) => {
      await recordEvent(tx, {
        event: 'test.noted',
        actor: null,
        subjectType: 'test',
        subjectId: 1,
        summary: 'Undone.',
      });
      throw new Error('undo');
    });
    await expect(undone).rejects.toThrow('undo');
    expect(await database.select().from(auditEvents)).toHaveLength(0);
    await note('After.');
    expect(await brokenEvents()).toEqual([]);
  });

  it('are read in pages, the newest first, and the reading is recorded', async () => {
    const { client, person } = await app.signIn(['administrator'], { name: 'Ann' });
    for (let index = 1; index <= 5; index += 1) await note(`Event ${index}.`);
    const page = await client.call(listRecords, { query: { page: 1, pageSize: 2, event: 'test.noted' } });
    expect(page).toMatchObject({ total: 5, page: 1, pageSize: 2 });
    expect(page.rows.map((row) => row.summary)).toEqual(['Event 5.', 'Event 4.']);
    const last = await client.call(listRecords, { query: { page: 3, pageSize: 2, event: 'test' } });
    expect(last.rows.map((row) => row.summary)).toEqual(['Event 1.']);
    const mine = await client.call(listRecords, { query: { person: person.id } });
    expect(mine.rows.map((row) => [row.event, row.person?.name])).toEqual([
      ['record.read', 'Ann'],
      ['record.read', 'Ann'],
      ['session.signedIn', 'Ann'],
    ]);
  });

  it('take signs of a pattern literally', async () => {
    const { client } = await app.signIn(['administrator']);
    await note('Event.');
    expect((await client.call(listRecords, { query: { event: '%' } })).total).toBe(0);
  });
});
