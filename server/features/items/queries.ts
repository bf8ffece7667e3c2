import {
  and,
  asc,
  count,
  desc,
  eq,
  inArray,
  isNotNull,
  isNull,
  like,
  ne,
  not,
  or,
  type SQL,
  sql,
} from 'drizzle-orm';
import { alias } from 'drizzle-orm/mysql-core';

import type { ItemQuery } from '#shared/contracts/items.ts';
import type { ItemState } from '#shared/domain/item-life.ts';
import type { AssayReport, ItemContent } from '#shared/engine/index.ts';

import type { Connection, Transaction } from '../../db/client.ts';
import {
  assays,
  items,
  paperPlaces,
  people,
  reviews,
  revisionAuthors,
  revisions,
  topics,
} from '../../db/schema/index.ts';

const latest = alias(revisions, 'latest');
const approved = alias(revisions, 'approved');
const assay = alias(assays, 'assay');

/** Who looks at the list, as far as it decides what they may find out. */
export interface Viewer {
  id: number;
  /** Whether their roles let them open items at all. */
  opensItems: boolean;
}

/** Words that the full-text index leaves out (InnoDB's default list) or that are too short for it. */
const UNINDEXED = new Set(
  'about are com for from how that the this was what when where who will with und www'.split(' '),
);
const SHORTEST_WORD = 3;

/** The code or title holds the search, or every indexed word of it begins some word of the item's printed text. */
function searchCondition(search: string): SQL | undefined {
  const pattern = search.replace(/[%_\\]/g, '\\$&');
  const byName = or(like(items.code, `${pattern}%`), like(items.title, `%${pattern}%`));
  const looksLikeCode = /^[A-Za-z]{2,3}-\d*$/.test(search);
  const words = search
    .toLowerCase()
    .split(/[^\p{L}\p{N}]+/u)
    .filter((word) => word.length >= SHORTEST_WORD && !UNINDEXED.has(word));
  if (looksLikeCode || words.length === 0) return byName;
  const wanted = words.map((word) => `+${word}*`).join(' ');
  // The index covers these three columns together, so all three are named.
  const byText = sql`match(${items.code}, ${items.title}, ${items.searchText}) against (${wanted} in boolean mode)`;
  return or(byName, byText);
}

/** True for items whose findings would tell this person something before their own working of the item. */
function findingsHidden({ id, opensItems }: Viewer): SQL<number> {
  const awaited = opensItems
    ? sql`${reviews.reviewerId} = ${id}`
    : sql`(${reviews.reviewerId} = ${id} or ${reviews.reviewerId} is null)`;
  return sql<number>`exists (select 1 from ${reviews} where ${reviews.itemId} = ${items.id} and ${reviews.stage} in ('waiting', 'working') and ${awaited})`;
}

function conditions(query: ItemQuery, viewer: Viewer): SQL | undefined {
  const byFinding =
    query.finding === undefined
      ? undefined
      : query.finding === 'none'
        ? and(isNull(items.worstFinding), isNotNull(items.latestAssayId))
        : eq(items.worstFinding, query.finding);
  return and(
    query.search === undefined || query.search === '' ? undefined : searchCondition(query.search),
    query.topic === undefined ? undefined : eq(items.topicId, query.topic),
    query.state === undefined ? undefined : eq(items.state, query.state),
    query.owner === undefined ? undefined : eq(items.ownerId, query.owner),
    byFinding,
    byFinding === undefined ? undefined : not(findingsHidden(viewer)),
  );
}

const SORT_COLUMNS = {
  code: items.code,
  title: items.title,
  topic: topics.name,
  state: items.state,
  owner: people.name,
  marks: items.marks,
  updated: items.updatedAt,
} as const;

/** One page of the bank as `viewer` may see it. `usedOn` counts the papers that hold the item. */
export async function selectItemPage(connection: Connection, query: ItemQuery, viewer: Viewer) {
  const where = conditions(query, viewer);
  const direction = query.direction === 'ascending' ? asc : desc;
  const rows = await connection
    .select({
      id: items.id,
      code: items.code,
      title: items.title,
      state: items.state,
      marks: items.marks,
      parts: items.partsCount,
      worstFinding: items.worstFinding,
      findingsHidden: findingsHidden(viewer).mapWith(Boolean),
      updatedAt: items.updatedAt,
      topicId: topics.id,
      topicCode: topics.code,
      topicName: topics.name,
      ownerId: people.id,
      ownerName: people.name,
      revision: latest.number,
      contentHash: latest.contentHash,
      approvedRevision: approved.number,
      assayHash: assay.contentHash,
      assayEngine: assay.engineVersion,
      usedOn:
        sql<number>`(select count(*) from ${paperPlaces} where ${paperPlaces.itemId} = ${items.id})`.mapWith(
          Number,
        ),
    })
    .from(items)
    .innerJoin(topics, eq(topics.id, items.topicId))
    .innerJoin(people, eq(people.id, items.ownerId))
    .innerJoin(latest, eq(latest.id, items.latestRevisionId))
    .leftJoin(approved, eq(approved.id, items.approvedRevisionId))
    .leftJoin(assay, eq(assay.id, items.latestAssayId))
    .where(where)
    .orderBy(direction(SORT_COLUMNS[query.sort]), asc(items.id))
    .limit(query.pageSize)
    .offset((query.page - 1) * query.pageSize);
  const [all] = await connection.select({ total: count() }).from(items).where(where);
  return { rows, total: all?.total ?? 0 };
}

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
