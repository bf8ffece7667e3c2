import { eq } from 'drizzle-orm';

import { sha256 } from '../../db/columns.ts';
import type { Transaction } from '../../db/client.ts';
import { auditEvents, auditHead } from '../../db/schema/index.ts';
import { chainHash, type ChainedEvent, GENESIS_HASH } from './chain.ts';

/** One thing that happened, as the service that did it tells it. */
export interface EventToRecord {
  /** As `item.sent`. */
  event: string;
  /** Who did it; null for the system itself. */
  actor: { id: number; sessionRef?: string } | null;
  subjectType: string;
  subjectId: number | null;
  /** One sentence, past tense, naming the thing: "Sent EG-004 revision 2 to review." */
  summary: string;
  /** What changed, where that can be told in a few fields. Never content of unsealed papers or items. */
  before?: unknown;
  after?: unknown;
}

/**
 * Adds one event to the records, in the transaction of the change itself, chained to the event before it.
 * Call it last in the transaction: it holds the end of the chain until the commit.
 */
export async function recordEvent(tx: Transaction, event: EventToRecord): Promise<void> {
  const [head] = await tx
    .select({ hash: auditHead.hash })
    .from(auditHead)
    .where(eq(auditHead.id, 1))
    .for('update');
  if (head === undefined) {
    await tx.insert(auditHead).ignore().values({ id: 1, hash: GENESIS_HASH });
  }
  const chained: ChainedEvent = {
    at: new Date(),
    personId: event.actor?.id ?? null,
    sessionRef: event.actor?.sessionRef ?? null,
    event: event.event,
    subjectType: event.subjectType,
    subjectId: event.subjectId,
    summary: event.summary.slice(0, 500),
    before: event.before ?? null,
    after: event.after ?? null,
    previousHash: head?.hash ?? GENESIS_HASH,
  };
  const hash = chainHash(chained, sha256);
  await tx.insert(auditEvents).values({ ...chained, hash });
  await tx.update(auditHead).set({ hash }).where(eq(auditHead.id, 1));
}
