import { and, desc, eq, inArray, or } from 'drizzle-orm';

import type { Connection } from '../../db/client.ts';
import { assays, items, people, reviews, revisionAuthors, revisions, topics } from '../../db/schema/index.ts';

const revisionColumns = {
  id: revisions.id,
  itemId: revisions.itemId,
  number: revisions.number,
  state: revisions.state,
  content: revisions.content,
  contentHash: revisions.contentHash,
  version: revisions.version,
  authorId: revisions.authorId,
  authorName: people.name,
  note: revisions.note,
  createdAt: revisions.createdAt,
  updatedAt: revisions.updatedAt,
};
export type RevisionRow = Awaited<ReturnType<typeof selectRevisions>>[number];

/** Every revision of an item, the newest first. */
export function selectRevisions(connection: Connection, itemId: number) {
  return connection
    .select(revisionColumns)
    .from(revisions)
    .innerJoin(people, eq(people.id, revisions.authorId))
    .where(eq(revisions.itemId, itemId))
    .orderBy(desc(revisions.number));
}

/** One revision by its id; null when there is none. */
export async function selectRevision(
  connection: Connection,
  revisionId: number,
): Promise<RevisionRow | null> {
  const [row] = await connection
    .select(revisionColumns)
    .from(revisions)
    .innerJoin(people, eq(people.id, revisions.authorId))
    .where(eq(revisions.id, revisionId));
  return row ?? null;
}

/** The item's own row with topic and owner; locked when `lock` is given in a transaction. */
export async function selectItem(connection: Connection, itemId: number, lock = false) {
  const select = connection
    .select({
      id: items.id,
      code: items.code,
      title: items.title,
      state: items.state,
      marks: items.marks,
      topicId: topics.id,
      topicCode: topics.code,
      topicName: topics.name,
      ownerId: people.id,
      ownerName: people.name,
      latestRevisionId: items.latestRevisionId,
      approvedRevisionId: items.approvedRevisionId,
    })
    .from(items)
    .innerJoin(topics, eq(topics.id, items.topicId))
    .innerJoin(people, eq(people.id, items.ownerId))
    .where(eq(items.id, itemId));
  if (lock) await connection.select({ id: items.id }).from(items).where(eq(items.id, itemId)).for('update');
  const [row] = await select;
  return row ?? null;
}
export type ItemRecord = NonNullable<Awaited<ReturnType<typeof selectItem>>>;

/** The newest assay of a revision, or null. */
export async function selectNewestAssay(connection: Connection, revisionId: number) {
  const [row] = await connection
    .select()
    .from(assays)
    .where(eq(assays.revisionId, revisionId))
    .orderBy(desc(assays.createdAt), desc(assays.id))
    .limit(1);
  return row ?? null;
}

/** Ids of everyone who wrote in any revision of the item. */
export async function selectAuthorIds(connection: Connection, itemId: number): Promise<number[]> {
  const rows = await connection
    .selectDistinct({ id: revisionAuthors.personId })
    .from(revisionAuthors)
    .innerJoin(revisions, eq(revisions.id, revisionAuthors.revisionId))
    .where(eq(revisions.itemId, itemId));
  return rows.map((row) => row.id);
}

/** The same of many items, by item id. */
export async function selectAuthorsOfItems(
  connection: Connection,
  itemIds: readonly number[],
): Promise<Map<number, number[]>> {
  const authors = new Map<number, number[]>();
  if (itemIds.length === 0) return authors;
  const rows = await connection
    .selectDistinct({ itemId: revisions.itemId, personId: revisionAuthors.personId })
    .from(revisionAuthors)
    .innerJoin(revisions, eq(revisions.id, revisionAuthors.revisionId))
    .where(inArray(revisions.itemId, [...itemIds]));
  for (const { itemId, personId } of rows) authors.set(itemId, [...(authors.get(itemId) ?? []), personId]);
  return authors;
}

/** Whether this person has claimed a review of the item and the answers are still hidden from them. */
export async function isWorkingBlind(
  connection: Connection,
  itemId: number,
  personId: number,
): Promise<boolean> {
  const [row] = await connection
    .select({ id: reviews.id })
    .from(reviews)
    .where(
      and(
        eq(reviews.itemId, itemId),
        eq(reviews.reviewerId, personId),
        or(eq(reviews.stage, 'waiting'), eq(reviews.stage, 'working')),
      ),
    )
    .limit(1);
  return row !== undefined;
}

/** Whether a review of this revision is addressed to, or was taken on by, this person. */
export async function isReviewerOf(
  connection: Connection,
  revisionId: number,
  personId: number,
): Promise<boolean> {
  const [row] = await connection
    .select({ id: reviews.id })
    .from(reviews)
    .where(and(eq(reviews.revisionId, revisionId), eq(reviews.reviewerId, personId)));
  return row !== undefined;
}

/** The review of a revision, or null. */
export async function selectReviewOf(connection: Connection, revisionId: number) {
  const [row] = await connection.select().from(reviews).where(eq(reviews.revisionId, revisionId));
  return row ?? null;
}

/** The reasons of the item's newest decided review when that returned it, or null. */
export async function selectReturnReason(connection: Connection, itemId: number): Promise<string | null> {
  const [row] = await connection
    .select({ decision: reviews.decision, reason: reviews.decisionReason })
    .from(reviews)
    .where(and(eq(reviews.itemId, itemId), eq(reviews.stage, 'decided')))
    .orderBy(desc(reviews.decidedAt), desc(reviews.id))
    .limit(1);
  return row?.decision === 'returned' ? row.reason : null;
}
