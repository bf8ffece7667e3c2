import { eq, sql } from 'drizzle-orm';

import type { Transaction } from './client.ts';
import { counters } from './schema/index.ts';

/** The next running number (from 1) of the counter `name`, as `item:EG`; others wait until the transaction ends. */
export async function takeNumber(tx: Transaction, name: string): Promise<number> {
  await tx
    .insert(counters)
    .values({ name, value: 1 })
    .onDuplicateKeyUpdate({ set: { value: sql`${counters.value} + 1` } });
  const [counter] = await tx.select({ value: counters.value }).from(counters).where(eq(counters.name, name));
  if (counter === undefined) throw new Error(`The counter ${name} was not stored.`);
  return counter.value;
}
