import type { Review } from '#shared/contracts/reviews.ts';
import { MAX_ATTEMPTS } from '#shared/contracts/reviews.ts';
import type { Subject } from '#shared/domain/permissions.ts';
import { isNumericPart, type ItemContent } from '#shared/engine/index.ts';
import { AppError } from '#shared/errors/app-error.ts';

import type { AppContext } from '../../context.ts';
import { type Connection, inTransaction, type Transaction } from '../../db/client.ts';
import { demand } from '../../http/demand.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { storedFigures } from '../figures/stored-figures.ts';
import {
  authorIdsOf,
  newestAssayOf,
  previousApproved,
  readContent,
  requireRevision,
} from '../items/service.ts';
import { recordEvent } from '../records/record-event.ts';
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
  return {
    reviews: rows.map((row) =>
      presentReviewRow(row, actor, { ownerId: row.ownerId, reviewerId: row.reviewerId }),
    ),
  };
}

/** Whether this person sees the answers: the reviewer from the reveal on, the writers always. */
function seesAnswers({ row, subject }: OpenReview, actor: SignedIn): boolean {
  const wrote = subject.ownerId === actor.id || (subject.authorIds?.includes(actor.id) ?? false);
  return wrote || row.stage === 'revealed' || row.stage === 'decided';
}

/** The review as this person may see it at its stage. */
export async function loadReview(
  context: AppContext,
  connection: Connection,
  actor: SignedIn,
  reviewId: number,
): Promise<Review> {
  const open = await requireReview(connection, reviewId);
  const { row, subject, content } = open;
  demand(actor, 'review.read', subject);
  const answers = seesAnswers(open, actor);
  const maySeeSheet = answers || (row.stage === 'working' && row.reviewerId === actor.id);
  const view = maySeeSheet
    ? await context.engine.viewDraw(content, row.draw, await storedFigures(connection, content))
    : null;
  const assay = answers ? await newestAssayOf(connection, row.revisionId) : null;
  const reveal =
    answers && view !== null && assay !== null
      ? {
          content,
          scheme: view.scheme,
          report: assay.report,
          assayStale: assay.stale,
          previous: await previousApproved(connection, row.itemId, row.revision),
        }
      : null;
  return presentReview({
    row,
    actor,
    subject,
    content,
    sheet: view?.sheet ?? null,
    workings: await queries.selectWorkings(connection, reviewId),
    comments: await queries.selectComments(connection, reviewId),
    reveal,
  });
}

export const getReview = (context: AppContext, actor: SignedIn, reviewId: number): Promise<Review> =>
  loadReview(context, context.database, actor, reviewId);

function demandStage(row: queries.ReviewRecord, stage: queries.ReviewRecord['stage'], refusal: string): void {
  if (row.stage !== stage) throw new AppError('notPossible', refusal);
}

/** Runs `work` with the review locked, then gives the review as it is now. */
async function change(
  context: AppContext,
  actor: SignedIn,
  reviewId: number,
  work: (tx: Transaction, open: OpenReview) => Promise<void>,
): Promise<Review> {
  await inTransaction(context.database, async (tx) => work(tx, await requireReview(tx, reviewId, true)));
  return loadReview(context, context.database, actor, reviewId);
}

/** Takes a waiting review on; the draw to work is chosen by chance then, by nobody who works it. */
export async function claimReview(context: AppContext, actor: SignedIn, reviewId: number): Promise<Review> {
  const before = await requireReview(context.database, reviewId);
  const chosen = await context.engine.chooseDraw(before.content, context.random());
  return change(context, actor, reviewId, async (tx, { row, subject }) => {
    demand(actor, 'review.claim', subject);
    demandStage(row, 'waiting', 'This review is no longer waiting: somebody has claimed it.');
    await queries.updateReview(tx, reviewId, {
      stage: 'working',
      reviewerId: actor.id,
      draw: chosen.draw ?? row.draw,
      claimedAt: context.clock(),
    });
    await recordEvent(tx, {
      event: 'review.claimed',
      actor,
      subjectType: 'review',
      subjectId: reviewId,
      summary: `Claimed the review of ${row.itemCode} revision ${row.revision}.`,
    });
  });
}

/** Gives a claimed review back to the queue. */
export async function releaseReview(context: AppContext, actor: SignedIn, reviewId: number): Promise<void> {
  await inTransaction(context.database, async (tx) => {
    const { row, subject } = await requireReview(tx, reviewId, true);
    demand(actor, 'review.work', subject);
    demandStage(row, 'working', 'Only a review that is being worked can be given back.');
    await queries.updateReview(tx, reviewId, { stage: 'waiting', reviewerId: null, claimedAt: null });
    await recordEvent(tx, {
      event: 'review.released',
      actor,
      subjectType: 'review',
      subjectId: reviewId,
      summary: `Gave the review of ${row.itemCode} revision ${row.revision} back to the queue.`,
    });
  });
}

function requireNumericPart(content: ItemContent, partId: string): void {
  const part = content.parts.find((candidate) => candidate.id === partId);
  if (part === undefined || !isNumericPart(part)) {
    throw new AppError('invalid', 'This part has no numeric answer to work.', {
      fields: [{ path: 'partId', message: 'Choose a numeric part.' }],
    });
  }
}

const newestOf = (workings: readonly queries.WorkingRow[], partId: string) =>
  workings.filter((working) => working.partId === partId).at(-1);

/** Compares the reviewer's own answer with the band; says whether it agrees and nothing more. */
export async function addWorking(
  context: AppContext,
  actor: SignedIn,
  reviewId: number,
  wanted: { partId: string; text: string },
): Promise<Review> {
  const before = await requireReview(context.database, reviewId);
  demand(actor, 'review.work', before.subject);
  requireNumericPart(before.content, wanted.partId);
  const marked = await context.engine.markWorking({
    content: before.content,
    partId: wanted.partId,
    draw: before.row.draw,
    text: wanted.text,
  });
  return change(context, actor, reviewId, async (tx, { row, subject }) => {
    demand(actor, 'review.work', subject);
    demandStage(row, 'working', 'Workings are given before the answers are shown.');
    if (row.draw !== before.row.draw) {
      throw new AppError('conflict', 'This review was claimed anew meanwhile. Look at it again.');
    }
    const workings = await queries.selectWorkings(tx, reviewId);
    const newest = newestOf(workings, wanted.partId);
    if (newest?.agrees === true)
      throw new AppError('notPossible', 'Your working of this part agrees already.');
    if ((newest?.attempt ?? 0) >= MAX_ATTEMPTS) {
      throw new AppError('notPossible', 'Both tries at this part are used. Hold to your working, or go on.');
    }
    await queries.insertWorking(tx, {
      reviewId,
      partId: wanted.partId,
      attempt: (newest?.attempt ?? 0) + 1,
      text: wanted.text,
      agrees: marked.agrees,
      verdict: marked.verdict,
      remark: marked.remark.slice(0, 400),
    });
    await recordEvent(tx, {
      event: 'review.worked',
      actor,
      subjectType: 'review',
      subjectId: reviewId,
      summary: `Worked a part of ${row.itemCode} revision ${row.revision}.`,
    });
  });
}

/** Holds to one's own working against the checker. */
export function disputePart(
  context: AppContext,
  actor: SignedIn,
  reviewId: number,
  partId: string,
): Promise<Review> {
  return change(context, actor, reviewId, async (tx, { row, subject }) => {
    demand(actor, 'review.work', subject);
    demandStage(row, 'working', 'Say so before the answers are shown.');
    const newest = newestOf(await queries.selectWorkings(tx, reviewId), partId);
    if (newest === undefined || newest.agrees) {
      throw new AppError(
        'notPossible',
        'Give your working first; only one that does not agree can be held to.',
      );
    }
    await queries.updateWorking(tx, newest.id, { disputed: true });
    await recordEvent(tx, {
      event: 'review.disputed',
      actor,
      subjectType: 'review',
      subjectId: reviewId,
      summary: `Held to their own working of a part of ${row.itemCode} revision ${row.revision}.`,
    });
  });
}

/** Ends a dispute after the reveal, with what settled it. */
export function settlePart(
  context: AppContext,
  actor: SignedIn,
  reviewId: number,
  wanted: { partId: string; reason: string },
): Promise<Review> {
  return change(context, actor, reviewId, async (tx, { row, subject }) => {
    demand(actor, 'review.work', subject);
    demandStage(row, 'revealed', 'A dispute is settled after the answers are shown and before the decision.');
    const newest = newestOf(await queries.selectWorkings(tx, reviewId), wanted.partId);
    if (newest === undefined || newest.agrees)
      throw new AppError('notPossible', 'There is nothing to settle in this part.');
    await queries.updateWorking(tx, newest.id, { settledReason: wanted.reason });
    await recordEvent(tx, {
      event: 'review.settled',
      actor,
      subjectType: 'review',
      subjectId: reviewId,
      summary: `Settled a part of ${row.itemCode} revision ${row.revision}.`,
      after: { reason: wanted.reason },
    });
  });
}

/** Shows the answers, once every numeric part has a working that agrees or is held to, or both tries are used. */
export function revealReview(context: AppContext, actor: SignedIn, reviewId: number): Promise<Review> {
  return change(context, actor, reviewId, async (tx, { row, subject, content }) => {
    demand(actor, 'review.work', subject);
    demandStage(row, 'working', 'The answers are shown already, or the review is not claimed yet.');
    const workings = await queries.selectWorkings(tx, reviewId);
    const open = content.parts.filter((part) => {
      if (!isNumericPart(part)) return false;
      const newest = newestOf(workings, part.id);
      return newest === undefined || !(newest.agrees || newest.disputed || newest.attempt >= MAX_ATTEMPTS);
    });
    if (open.length > 0) {
      throw new AppError(
        'notPossible',
        `${open.length === 1 ? 'One numeric part still waits' : `${open.length} numeric parts still wait`} for your working.`,
      );
    }
    await queries.updateReview(tx, reviewId, { stage: 'revealed', revealedAt: context.clock() });
    await recordEvent(tx, {
      event: 'review.revealed',
      actor,
      subjectType: 'review',
      subjectId: reviewId,
      summary: `Saw the answers of ${row.itemCode} revision ${row.revision}.`,
    });
  });
}

export function addComment(
  context: AppContext,
  actor: SignedIn,
  reviewId: number,
  wanted: { anchor: string; text: string },
): Promise<Review> {
  return change(context, actor, reviewId, async (tx, { row, subject }) => {
    demand(actor, 'review.comment', subject);
    await queries.insertComment(tx, { reviewId, revisionId: row.revisionId, authorId: actor.id, ...wanted });
    await recordEvent(tx, {
      event: 'review.commented',
      actor,
      subjectType: 'review',
      subjectId: reviewId,
      summary: `Commented on ${row.itemCode} revision ${row.revision}.`,
    });
  });
}
