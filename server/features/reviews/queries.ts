import { and, asc, desc, eq, isNull, ne, or } from 'drizzle-orm';
import { alias } from 'drizzle-orm/mysql-core';

import type { Verdict } from '#shared/engine/index.ts';

import type { Connection, Transaction } from '../../db/client.ts';
import {
  comments,
  independentWorkings,
  items,
  people,
  reviews,
  revisions,
  topics,
} from '../../db/schema/index.ts';

const requester = alias(people, 'requester');
const reviewer = alias(people, 'reviewer');

const columns = {
  id: reviews.id,
  itemId: items.id,
  itemCode: items.code,
  itemTitle: items.title,
  ownerId: items.ownerId,
  marks: items.marks,
  topicId: topics.id,
  topicCode: topics.code,
  topicName: topics.name,
  revisionId: revisions.id,
  revision: revisions.number,
  requestedById: requester.id,
  requestedByName: requester.name,
  reviewerId: reviews.reviewerId,
  reviewerName: reviewer.name,
  stage: reviews.stage,
  decision: reviews.decision,
  decisionReason: reviews.decisionReason,
  acceptedCautions: reviews.acceptedCautions,
  draw: reviews.draw,
  note: reviews.note,
  dueOn: reviews.dueOn,
  createdAt: reviews.createdAt,
  claimedAt: reviews.claimedAt,
  revealedAt: reviews.revealedAt,
  decidedAt: reviews.decidedAt,
};

function select(connection: Connection) {
  return connection
    .select(columns)
    .from(reviews)
    .innerJoin(items, eq(items.id, reviews.itemId))
    .innerJoin(revisions, eq(revisions.id, reviews.revisionId))
    .innerJoin(topics, eq(topics.id, items.topicId))
    .innerJoin(requester, eq(requester.id, reviews.requestedById))
    .leftJoin(reviewer, eq(reviewer.id, reviews.reviewerId));
}
export type ReviewRecord = Awaited<ReturnType<typeof select>>[number];

/** Most reviews that a list gives. */
const SHOWN = 200;

/** Reviews by scope: open ones, those of one person, or decided ones. */
export function selectReviewList(
  connection: Connection,
  scope: 'open' | 'mine' | 'decided',
  personId: number,
): Promise<ReviewRecord[]> {
  const mine = or(eq(reviews.reviewerId, personId), eq(reviews.requestedById, personId));
  const where =
    scope === 'open'
      ? ne(reviews.stage, 'decided')
      : scope === 'mine'
        ? and(ne(reviews.stage, 'decided'), or(mine, isNull(reviews.reviewerId)))
        : eq(reviews.stage, 'decided');
  return select(connection).where(where).orderBy(desc(reviews.createdAt)).limit(SHOWN);
}

/** One review; its row is locked when `lock` is given in a transaction. */
export async function selectReview(
  connection: Connection,
  reviewId: number,
  lock = false,
): Promise<ReviewRecord | null> {
  if (lock) {
    await connection.select({ id: reviews.id }).from(reviews).where(eq(reviews.id, reviewId)).for('update');
  }
  const [row] = await select(connection).where(eq(reviews.id, reviewId));
  return row ?? null;
}

export function selectWorkings(connection: Connection, reviewId: number) {
  return connection
    .select()
    .from(independentWorkings)
    .where(eq(independentWorkings.reviewId, reviewId))
    .orderBy(asc(independentWorkings.createdAt), asc(independentWorkings.id));
}
export type WorkingRow = Awaited<ReturnType<typeof selectWorkings>>[number];

export function selectComments(connection: Connection, reviewId: number) {
  return connection
    .select({
      id: comments.id,
      authorId: people.id,
      authorName: people.name,
      anchor: comments.anchor,
      text: comments.text,
      createdAt: comments.createdAt,
    })
    .from(comments)
    .innerJoin(people, eq(people.id, comments.authorId))
    .where(eq(comments.reviewId, reviewId))
    .orderBy(asc(comments.createdAt), asc(comments.id));
}

type ReviewChange = Partial<typeof reviews.$inferInsert>;

export async function updateReview(tx: Transaction, reviewId: number, change: ReviewChange): Promise<void> {
  await tx.update(reviews).set(change).where(eq(reviews.id, reviewId));
}

export async function insertWorking(
  tx: Transaction,
  working: {
    reviewId: number;
    partId: string;
    attempt: number;
    text: string;
    agrees: boolean;
    verdict: Verdict;
    remark: string;
    createdAt: Date;
  },
): Promise<void> {
  await tx.insert(independentWorkings).values(working);
}

/** Marks a working as held to against the checker, or the dispute as settled. */
export async function updateWorking(
  tx: Transaction,
  workingId: number,
  change: { disputed?: boolean; settledReason?: string },
): Promise<void> {
  await tx.update(independentWorkings).set(change).where(eq(independentWorkings.id, workingId));
}

export async function insertComment(
  tx: Transaction,
  comment: { reviewId: number; revisionId: number; authorId: number; anchor: string; text: string },
): Promise<void> {
  await tx.insert(comments).values(comment);
}
