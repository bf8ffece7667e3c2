import { and, asc, count, eq, isNull, ne, notExists, type SQL, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/mysql-core';

import type { Connection } from '../../db/client.ts';
import {
  items,
  paperPlaces,
  papers,
  people,
  reviews,
  revisionAuthors,
  revisions,
} from '../../db/schema/index.ts';

/** Entries shown of one group; its total counts all. */
const SHOWN = 20;
/** How many rows there are before the limit cuts them. */
const total = sql<number>`count(*) over ()`.mapWith(Number);

/** Items of one owner that stand in one state, the longest untouched first. */
export function selectOwnItems(connection: Connection, ownerId: number, state: 'drafting' | 'returned') {
  const decider = alias(people, 'decider');
  return connection
    .select({
      id: items.id,
      code: items.code,
      title: items.title,
      revision: revisions.number,
      updatedAt: items.updatedAt,
      decision: reviews.decision,
      decidedAt: reviews.decidedAt,
      decidedBy: decider.name,
      total,
    })
    .from(items)
    .innerJoin(revisions, eq(revisions.id, items.latestRevisionId))
    .leftJoin(reviews, eq(reviews.revisionId, revisions.id))
    .leftJoin(decider, eq(decider.id, reviews.reviewerId))
    .where(and(eq(items.ownerId, ownerId), eq(items.state, state)))
    .orderBy(asc(items.updatedAt), asc(items.id))
    .limit(SHOWN);
}

function selectReviews(connection: Connection, where: SQL | undefined) {
  const requester = alias(people, 'requester');
  return connection
    .select({
      id: reviews.id,
      code: items.code,
      title: items.title,
      stage: reviews.stage,
      dueOn: reviews.dueOn,
      createdAt: reviews.createdAt,
      claimedAt: reviews.claimedAt,
      requestedBy: requester.name,
      total,
    })
    .from(reviews)
    .innerJoin(items, eq(items.id, reviews.itemId))
    .innerJoin(requester, eq(requester.id, reviews.requestedById))
    .where(where)
    .orderBy(sql`${reviews.dueOn} is null`, asc(reviews.dueOn), asc(reviews.createdAt))
    .limit(SHOWN);
}

/** Open reviews that are addressed to or claimed by one person, those due soonest first. */
export function selectReviewsFor(connection: Connection, reviewerId: number) {
  return selectReviews(connection, and(eq(reviews.reviewerId, reviewerId), ne(reviews.stage, 'decided')));
}

/** Reviews that wait for anyone, without those of items that this person owns or has written in. */
export function selectReviewQueue(connection: Connection, personId: number) {
  const wrote = connection
    .select({ one: sql`1` })
    .from(revisionAuthors)
    .innerJoin(revisions, eq(revisions.id, revisionAuthors.revisionId))
    .where(and(eq(revisions.itemId, reviews.itemId), eq(revisionAuthors.personId, personId)));
  return selectReviews(
    connection,
    and(
      eq(reviews.stage, 'waiting'),
      isNull(reviews.reviewerId),
      ne(items.ownerId, personId),
      notExists(wrote),
    ),
  );
}

/** Papers that are being assembled, with how many items they have so far. */
export function selectAssembling(connection: Connection) {
  return connection
    .select({
      id: papers.id,
      code: papers.code,
      title: papers.title,
      updatedAt: papers.updatedAt,
      places: count(paperPlaces.id),
      total,
    })
    .from(papers)
    .leftJoin(paperPlaces, eq(paperPlaces.paperId, papers.id))
    .where(eq(papers.state, 'assembling'))
    .groupBy(papers.id)
    .orderBy(asc(papers.updatedAt), asc(papers.id))
    .limit(SHOWN);
}

/** Papers that another person has proposed for sealing. */
export function selectToConfirm(connection: Connection, personId: number) {
  return connection
    .select({
      id: papers.id,
      code: papers.code,
      title: papers.title,
      proposedAt: papers.proposedAt,
      updatedAt: papers.updatedAt,
      proposedBy: people.name,
      total,
    })
    .from(papers)
    .innerJoin(people, eq(people.id, papers.proposedById))
    .where(and(eq(papers.state, 'proposed'), ne(papers.proposedById, personId)))
    .orderBy(asc(papers.proposedAt), asc(papers.id))
    .limit(SHOWN);
}
