import type { Review } from '#shared/contracts/reviews.ts';
import type { Subject } from '#shared/domain/permissions.ts';
import type { ItemContent } from '#shared/engine/index.ts';
import { AppError } from '#shared/errors/app-error.ts';

import type { AppContext } from '../../context.ts';
import type { Connection } from '../../db/client.ts';
import { demand } from '../../http/demand.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { storedFigures } from '../figures/stored-figures.ts';
import {
  authorIdsOf,
  authorIdsOfItems,
  newestAssayOf,
  previousApproved,
  readContent,
  requireRevision,
} from '../items/service.ts';
import { presentReview, presentReviewRow } from './present.ts';
import * as queries from './queries.ts';

export interface OpenReview {
  row: queries.ReviewRecord;
  subject: Subject;
  content: ItemContent;
}

/** A review with what ownership rules ask about it; throws AppError notFound. */
export async function requireReview(
  connection: Connection,
  reviewId: number,
  lock = false,
): Promise<OpenReview> {
  const row = await queries.selectReview(connection, reviewId, lock);
  if (row === null) throw new AppError('notFound', 'There is no such review.');
  const revision = await requireRevision(connection, row.revisionId);
  return {
    row,
    subject: {
      ownerId: row.ownerId,
      authorIds: await authorIdsOf(connection, row.itemId),
      reviewerId: row.reviewerId,
    },
    content: readContent(revision),
  };
}

export async function listReviews(context: AppContext, actor: SignedIn, scope: 'open' | 'mine' | 'decided') {
  const rows = await queries.selectReviewList(context.database, scope, actor.id);
  const authors = await authorIdsOfItems(
    context.database,
    rows.map((row) => row.itemId),
  );
  return {
    reviews: rows.map((row) =>
      presentReviewRow(row, actor, {
        ownerId: row.ownerId,
        authorIds: authors.get(row.itemId) ?? [],
        reviewerId: row.reviewerId,
      }),
    ),
  };
}

/**
 * Whether this person sees the answers: the writers always, everyone else once the reviewer has had them shown.
 * A review that ended before that never shows them, since the same person may work the next revision.
 */
function seesAnswers({ row, subject }: OpenReview, actor: SignedIn): boolean {
  const wrote = subject.ownerId === actor.id || (subject.authorIds?.includes(actor.id) ?? false);
  return wrote || row.revealedAt !== null;
}

/** Tries of the present claim; those of somebody who gave the review back were at another draw. */
export async function currentWorkings(connection: Connection, row: queries.ReviewRecord) {
  const all = await queries.selectWorkings(connection, row.id);
  const { claimedAt } = row;
  return claimedAt === null ? [] : all.filter((working) => working.createdAt >= claimedAt);
}

/** The review as this person may see it at its stage. */
export async function getReview(context: AppContext, actor: SignedIn, reviewId: number): Promise<Review> {
  const { database } = context;
  const open = await requireReview(database, reviewId);
  const { row, subject, content } = open;
  demand(actor, 'review.read', subject);
  const answers = seesAnswers(open, actor);
  const maySeeSheet = answers || (row.stage === 'working' && row.reviewerId === actor.id);
  const view = maySeeSheet
    ? await context.engine.viewDraw(content, row.draw, await storedFigures(database, content))
    : null;
  const assay = answers ? await newestAssayOf(database, row.revisionId) : null;
  const reveal =
    answers && view !== null && assay !== null
      ? {
          content,
          scheme: view.scheme,
          report: assay.report,
          assayStale: assay.stale,
          previous: await previousApproved(database, row.itemId, row.revision),
        }
      : null;
  return presentReview({
    row,
    actor,
    subject,
    content,
    sheet: view?.sheet ?? null,
    workings: await currentWorkings(database, row),
    comments: await queries.selectComments(database, reviewId),
    reveal,
  });
}
