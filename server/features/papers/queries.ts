import { and, asc, desc, eq, inArray, ne, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/mysql-core';

import type { PaperDetails } from '#shared/contracts/papers.ts';
import type { PaperState } from '#shared/domain/paper-life.ts';

import type { Connection, Transaction } from '../../db/client.ts';
import { items, paperPlaces, papers, people, revisions, seals, topics } from '../../db/schema/index.ts';

const proposer = alias(people, 'proposer');
const confirmer = alias(people, 'confirmer');
const approved = alias(revisions, 'approved');

/** Every paper, the last changed first, with how much is on it. */
export function selectPapers(connection: Connection) {
  return connection
    .select({
      id: papers.id,
      code: papers.code,
      title: papers.title,
      state: papers.state,
      targetMarks: papers.targetMarks,
      updatedAt: papers.updatedAt,
      createdById: people.id,
      createdByName: people.name,
      items:
        sql<number>`(select count(*) from ${paperPlaces} where ${paperPlaces.paperId} = ${papers.id})`.mapWith(
          Number,
        ),
      // The marks of the revisions that stand on the paper, read in the database: their contents are long.
      marks:
        sql<number>`(select coalesce(sum(part.marks), 0) from ${paperPlaces} join ${revisions} on ${revisions.id} = ${paperPlaces.revisionId}, json_table(${revisions.content}, '$.parts[*]' columns (marks int path '$.marks')) as part where ${paperPlaces.paperId} = ${papers.id})`.mapWith(
          Number,
        ),
    })
    .from(papers)
    .innerJoin(people, eq(people.id, papers.createdById))
    .orderBy(desc(papers.updatedAt), desc(papers.id));
}

/** One paper; its row is locked when `lock` is given in a transaction. */
export async function selectPaper(connection: Connection, paperId: number, lock = false) {
  if (lock)
    await connection.select({ id: papers.id }).from(papers).where(eq(papers.id, paperId)).for('update');
  const [row] = await connection
    .select({
      id: papers.id,
      code: papers.code,
      title: papers.title,
      subtitle: papers.subtitle,
      targetMarks: papers.targetMarks,
      durationMinutes: papers.durationMinutes,
      instructions: papers.instructions,
      state: papers.state,
      version: papers.version,
      createdById: people.id,
      createdByName: people.name,
      proposedById: papers.proposedById,
      proposedByName: proposer.name,
    })
    .from(papers)
    .innerJoin(people, eq(people.id, papers.createdById))
    .leftJoin(proposer, eq(proposer.id, papers.proposedById))
    .where(eq(papers.id, paperId));
  return row ?? null;
}
export type PaperRecord = NonNullable<Awaited<ReturnType<typeof selectPaper>>>;

/** The running order with the content of each revision that was taken. */
export function selectPlaces(connection: Connection, paperId: number) {
  return connection
    .select({
      id: paperPlaces.id,
      position: paperPlaces.position,
      draw: paperPlaces.draw,
      itemId: items.id,
      itemCode: items.code,
      itemState: items.state,
      topicId: topics.id,
      topicCode: topics.code,
      topicName: topics.name,
      revisionId: revisions.id,
      revision: revisions.number,
      content: revisions.content,
      approvedRevision: approved.number,
    })
    .from(paperPlaces)
    .innerJoin(items, eq(items.id, paperPlaces.itemId))
    .innerJoin(topics, eq(topics.id, items.topicId))
    .innerJoin(revisions, eq(revisions.id, paperPlaces.revisionId))
    .leftJoin(approved, eq(approved.id, items.approvedRevisionId))
    .where(eq(paperPlaces.paperId, paperId))
    .orderBy(asc(paperPlaces.position));
}
export type PlaceRecord = Awaited<ReturnType<typeof selectPlaces>>[number];

/** The approved revision of each item, by item id; items without one are left out. */
export async function selectApproved(connection: Connection, itemIds: readonly number[]) {
  if (itemIds.length === 0) return new Map<number, never>();
  const rows = await connection
    .select({ itemId: items.id, itemCode: items.code, revisionId: approved.id, content: approved.content })
    .from(items)
    .innerJoin(approved, eq(approved.id, items.approvedRevisionId))
    .where(inArray(items.id, [...itemIds]));
  return new Map(rows.map((row) => [row.itemId, row]));
}

export async function insertPaper(
  tx: Transaction,
  paper: PaperDetails & { code: string; createdById: number },
): Promise<number> {
  const [stored] = await tx.insert(papers).values(paper).$returningId();
  if (stored === undefined) throw new Error('The paper was not stored.');
  return stored.id;
}

/** Changes a paper and raises its version. */
export async function updatePaper(
  tx: Transaction,
  paperId: number,
  at: Date,
  change: Partial<PaperDetails> & {
    state?: PaperState;
    proposedById?: number | null;
    proposedAt?: Date | null;
    releasedAt?: Date;
  },
): Promise<void> {
  await tx
    .update(papers)
    .set({ ...change, version: sql`${papers.version} + 1`, updatedAt: at })
    .where(eq(papers.id, paperId));
}

/** Puts these places in this order in place of those that stood there. */
export async function replacePlaces(
  tx: Transaction,
  paperId: number,
  places: readonly { itemId: number; revisionId: number; draw: number }[],
): Promise<void> {
  await tx.delete(paperPlaces).where(eq(paperPlaces.paperId, paperId));
  if (places.length === 0) return;
  await tx
    .insert(paperPlaces)
    .values(places.map((place, index) => ({ ...place, paperId, position: index + 1 })));
}

export async function selectSeal(connection: Connection, paperId: number) {
  const [row] = await connection
    .select({
      canonical: seals.canonical,
      sha256: seals.sha256,
      sealedAt: seals.sealedAt,
      proposedById: proposer.id,
      proposedByName: proposer.name,
      confirmedById: confirmer.id,
      confirmedByName: confirmer.name,
    })
    .from(seals)
    .innerJoin(proposer, eq(proposer.id, seals.proposedById))
    .innerJoin(confirmer, eq(confirmer.id, seals.confirmedById))
    .where(eq(seals.paperId, paperId));
  return row ?? null;
}
export type SealRecord = NonNullable<Awaited<ReturnType<typeof selectSeal>>>;

export async function insertSeal(tx: Transaction, seal: typeof seals.$inferInsert): Promise<void> {
  await tx.insert(seals).values(seal);
}

/** Other papers, sealed or not, that hold any of these items. */
export function selectOtherUses(connection: Connection, paperId: number, itemIds: readonly number[]) {
  if (itemIds.length === 0) return Promise.resolve([]);
  return connection
    .select({
      itemId: paperPlaces.itemId,
      paperId: papers.id,
      paperCode: papers.code,
      draw: paperPlaces.draw,
    })
    .from(paperPlaces)
    .innerJoin(papers, eq(papers.id, paperPlaces.paperId))
    .where(and(inArray(paperPlaces.itemId, [...itemIds]), ne(papers.id, paperId)));
}
