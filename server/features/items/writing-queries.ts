import { and, eq, ne, sql } from 'drizzle-orm';

import type { ItemState } from '#shared/domain/item-life.ts';
import type { AssayReport, ItemContent } from '#shared/engine/index.ts';

import type { Transaction } from '../../db/client.ts';
import { assays, items, reviews, revisionAuthors, revisions } from '../../db/schema/index.ts';

interface NewItem {
  code: string;
  topicId: number;
  ownerId: number;
  content: ItemContent;
  contentHash: string;
  searchText: string;
  origin: 'written' | 'demo';
}

/** Stores a new item with its first revision. Returns both ids. */
export async function insertItem(
  tx: Transaction,
  item: NewItem,
): Promise<{ itemId: number; revisionId: number }> {
  const [stored] = await tx
    .insert(items)
    .values({
      code: item.code,
      topicId: item.topicId,
      ownerId: item.ownerId,
      title: item.content.title,
      marks: marksOf(item.content),
      partsCount: item.content.parts.length,
      searchText: item.searchText,
      origin: item.origin,
    })
    .$returningId();
  if (stored === undefined) throw new Error('The item was not stored.');
  const revisionId = await insertRevision(tx, {
    itemId: stored.id,
    number: 1,
    authorId: item.ownerId,
    content: item.content,
    contentHash: item.contentHash,
  });
  return { itemId: stored.id, revisionId };
}

interface NewRevision {
  itemId: number;
  number: number;
  authorId: number;
  content: ItemContent;
  contentHash: string;
}

/** Stores a revision that begins as a draft, and makes it the item's latest. */
export async function insertRevision(tx: Transaction, revision: NewRevision): Promise<number> {
  const [stored] = await tx
    .insert(revisions)
    .values({ ...revision, updatedById: revision.authorId })
    .$returningId();
  if (stored === undefined) throw new Error('The revision was not stored.');
  await addAuthor(tx, stored.id, revision.authorId);
  await tx
    .update(items)
    .set({ latestRevisionId: stored.id, state: 'drafting', latestAssayId: null, worstFinding: null })
    .where(eq(items.id, revision.itemId));
  return stored.id;
}

/** Remembers that this person wrote in the revision. */
export async function addAuthor(tx: Transaction, revisionId: number, personId: number): Promise<void> {
  await tx.insert(revisionAuthors).ignore().values({ revisionId, personId });
}

interface DraftChange {
  itemId: number;
  revisionId: number;
  version: number;
  content: ItemContent;
  contentHash: string;
  searchText: string;
  topicId: number;
  personId: number;
  at: Date;
}

/** Writes a draft's content and raises its version; what the bank's list shows follows. */
export async function updateDraft(tx: Transaction, change: DraftChange): Promise<void> {
  await tx
    .update(revisions)
    .set({
      content: change.content,
      contentHash: change.contentHash,
      version: change.version + 1,
      updatedById: change.personId,
      updatedAt: change.at,
    })
    .where(eq(revisions.id, change.revisionId));
  await addAuthor(tx, change.revisionId, change.personId);
  await tx
    .update(items)
    .set({
      title: change.content.title,
      marks: marksOf(change.content),
      partsCount: change.content.parts.length,
      searchText: change.searchText,
      topicId: change.topicId,
      updatedAt: change.at,
    })
    .where(eq(items.id, change.itemId));
}

/** Moves the latest revision and with it the item to a state. */
export async function updateState(
  tx: Transaction,
  change: { itemId: number; revisionId: number; state: ItemState; note?: string; at: Date },
): Promise<void> {
  await tx
    .update(revisions)
    .set({
      state: change.state,
      updatedAt: change.at,
      ...(change.note === undefined ? {} : { note: change.note }),
      version: sql`${revisions.version} + 1`,
    })
    .where(eq(revisions.id, change.revisionId));
  await tx
    .update(items)
    .set({
      state: change.state,
      updatedAt: change.at,
      ...(change.state === 'approved' ? { approvedRevisionId: change.revisionId } : {}),
      ...(change.state === 'withdrawn' ? { approvedRevisionId: null } : {}),
    })
    .where(eq(items.id, change.itemId));
}

interface NewAssay {
  itemId: number;
  revisionId: number;
  report: AssayReport;
  durationMs: number;
  requestedById: number;
  worst: 'blocker' | 'caution' | 'note' | null;
  at: Date;
}

/** Keeps an assay with its revision, and shows its worst finding in the bank. */
export async function insertAssay(tx: Transaction, assayed: NewAssay): Promise<number> {
  const [stored] = await tx
    .insert(assays)
    .values({
      revisionId: assayed.revisionId,
      engineVersion: assayed.report.engineVersion,
      contentHash: assayed.report.contentHash,
      report: assayed.report,
      durationMs: assayed.durationMs,
      requestedById: assayed.requestedById,
      createdAt: assayed.at,
    })
    .$returningId();
  if (stored === undefined) throw new Error('The assay was not stored.');
  await tx
    .update(items)
    .set({ latestAssayId: stored.id, worstFinding: assayed.worst })
    .where(and(eq(items.id, assayed.itemId), eq(items.latestRevisionId, assayed.revisionId)));
  return stored.id;
}

/** Stores a review that waits for a reviewer or for anyone. */
export async function insertReview(
  tx: Transaction,
  review: {
    itemId: number;
    revisionId: number;
    requestedById: number;
    reviewerId: number | null;
    note: string;
    dueOn: string | null;
  },
): Promise<number> {
  // The draw is chosen when the review is claimed.
  const [stored] = await tx
    .insert(reviews)
    .values({ ...review, draw: 1 })
    .$returningId();
  if (stored === undefined) throw new Error('The review was not stored.');
  return stored.id;
}

/** Ends a review that the writer took back. */
export async function closeRecalledReview(
  tx: Transaction,
  revisionId: number,
  reason: string,
  at: Date,
): Promise<void> {
  await tx
    .update(reviews)
    .set({ stage: 'decided', decision: 'recalled', decisionReason: reason, decidedAt: at })
    .where(and(eq(reviews.revisionId, revisionId), ne(reviews.stage, 'decided')));
}

function marksOf(content: ItemContent): number {
  return content.parts.reduce((sum, part) => sum + part.marks, 0);
}
