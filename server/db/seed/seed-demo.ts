import { count, eq, sql } from 'drizzle-orm';

import type { AppContext } from '../../context.ts';
import type { Database } from '../client.ts';
import { counters, people } from '../schema/index.ts';
import { demoItems } from './items/index.ts';
import { seedItem } from './seed-items.ts';
import { seedPapers } from './seed-papers.ts';
import { seedPeople, seedTopics } from './seed-people.ts';

/** The counter that tells how far the demo has come: 1 begun, 2 finished. */
const DEMO = 'demo';
const BEGUN = 1;
const FINISHED = 2;

async function progressOf(database: Database): Promise<number | null> {
  const [row] = await database
    .select({ value: counters.value })
    .from(counters)
    .where(eq(counters.name, DEMO));
  return row?.value ?? null;
}

/** Empties every table but that of the migrations; only a demo that broke off half-way is ever emptied. */
async function emptyHalfDemo(database: Database): Promise<void> {
  const [rows] = await database.execute<{ name: string }[]>(
    sql`select table_name as name from information_schema.tables where table_schema = database() and table_name not like '%drizzle%'`,
  );
  await database.transaction(async (tx) => {
    await tx.execute(sql`set foreign_key_checks = 0`);
    for (const { name } of rows as unknown as { name: string }[]) {
      await tx.execute(sql`delete from ${sql.identifier(name)}`);
    }
    await tx.execute(sql`set foreign_key_checks = 1`);
  });
}

/**
 * Fills an empty database with the demo; one that broke off half-way is begun again. Returns false, and
 * changes nothing, when people are there already.
 */
export async function seedDemo(context: AppContext): Promise<boolean> {
  const { database } = context;
  if ((await progressOf(database)) === BEGUN) await emptyHalfDemo(database);
  const [present] = await database.select({ people: count() }).from(people);
  if ((present?.people ?? 0) > 0) return false;
  await database.insert(counters).values({ name: DEMO, value: BEGUN });
  const team = await seedPeople(database);
  const topicIds = await seedTopics(database);
  const itemIds = new Map<string, number>();
  for (const demo of demoItems) {
    const topicId = topicIds.get(demo.topic);
    if (topicId === undefined) throw new Error(`The demo has no topic ${demo.topic}.`);
    const item = await seedItem(context, team, topicId, demo);
    itemIds.set(item.code, item.id);
  }
  await seedPapers(context, team, itemIds);
  await database.update(counters).set({ value: FINISHED }).where(eq(counters.name, DEMO));
  return true;
}
