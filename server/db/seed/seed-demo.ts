import { count } from 'drizzle-orm';

import type { AppContext } from '../../context.ts';
import { people } from '../schema/index.ts';
import { demoItems } from './items/index.ts';
import { seedItem } from './seed-items.ts';
import { seedPapers } from './seed-papers.ts';
import { seedPeople, seedTopics } from './seed-people.ts';

/** Fills an empty database with the demo. Returns false, and changes nothing, when anybody is there already. */
export async function seedDemo(context: AppContext): Promise<boolean> {
  const [present] = await context.database.select({ people: count() }).from(people);
  if ((present?.people ?? 0) > 0) return false;
  const team = await seedPeople(context.database);
  const topicIds = await seedTopics(context.database);
  const itemIds = new Map<string, number>();
  for (const demo of demoItems) {
    const topicId = topicIds.get(demo.topic);
    if (topicId === undefined) throw new Error(`The demo has no topic ${demo.topic}.`);
    const item = await seedItem(context, team, topicId, demo);
    itemIds.set(item.code, item.id);
  }
  await seedPapers(context, team, itemIds);
  return true;
}
