import type { Transaction } from '../db/client.ts';
import { outgoingMail } from '../db/schema/index.ts';

/** A letter to be written; its payload never holds item content or values. */
export interface MailToQueue {
  kind: 'reviewRequested' | 'reviewDecided' | 'paperProposed' | 'paperSealed';
  person: { id: number; email: string };
  payload: Record<string, unknown>;
  /** The same letter is queued once. */
  dedupeKey: string;
}

/** Puts a letter into the outbox in the transaction of the change that causes it. */
export async function queueMail(tx: Transaction, mail: MailToQueue): Promise<void> {
  await tx.insert(outgoingMail).ignore().values({
    kind: mail.kind,
    personId: mail.person.id,
    address: mail.person.email,
    payload: mail.payload,
    dedupeKey: mail.dedupeKey,
  });
}
