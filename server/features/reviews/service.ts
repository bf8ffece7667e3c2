import { MAX_ATTEMPTS, type Review } from '#shared/contracts/reviews.ts';
import { isNumericPart, type ItemContent, partLetter } from '#shared/engine/index.ts';
import { AppError } from '#shared/errors/app-error.ts';

import type { AppContext } from '../../context.ts';
import { inTransaction, type Transaction } from '../../db/client.ts';
import { demand } from '../../http/demand.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { recordEvent } from '../records/record-event.ts';
import * as queries from './queries.ts';
import { currentWorkings, getReview, type OpenReview, requireReview } from './reading-service.ts';

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
  return getReview(context, actor, reviewId);
}

/** Takes a waiting review on; the draw to work is chosen by chance then, by nobody who works it. */
export async function claimReview(context: AppContext, actor: SignedIn, reviewId: number): Promise<Review> {
  const before = await requireReview(context.database, reviewId);
  demand(actor, 'review.claim', before.subject);
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

/**
 * Compares the reviewer's own answer with the band; says whether it agrees and nothing more. What cannot be
 * compared at all is AppError invalid and takes no try.
 */
export async function addWorking(
  context: AppContext,
  actor: SignedIn,
  reviewId: number,
  wanted: { partId: string; text: string },
): Promise<Review> {
  const before = await requireReview(context.database, reviewId);
  demand(actor, 'review.work', before.subject);
  demandStage(
    before.row,
    'working',
    'Workings are given after the review is claimed and before the answers are shown.',
  );
  requireNumericPart(before.content, wanted.partId);
  const marked = await context.engine.markWorking({
    content: before.content,
    partId: wanted.partId,
    draw: before.row.draw,
    text: wanted.text,
  });
  if (!marked.comparable) {
    throw new AppError('invalid', marked.remark, { fields: [{ path: 'text', message: marked.remark }] });
  }
  return change(context, actor, reviewId, async (tx, { row, subject }) => {
    demand(actor, 'review.work', subject);
    demandStage(row, 'working', 'Workings are given before the answers are shown.');
    if (row.claimedAt?.getTime() !== before.row.claimedAt?.getTime()) {
      throw new AppError('notPossible', 'This review was claimed anew meanwhile. Look at it again.');
    }
    const tries = (await currentWorkings(tx, row)).filter((working) => working.partId === wanted.partId);
    if (tries.at(-1)?.agrees === true) {
      throw new AppError('notPossible', 'Your working of this part agrees already.');
    }
    if (tries.length >= MAX_ATTEMPTS) {
      throw new AppError('notPossible', 'Both tries at this part are used. You can hold to your working.');
    }
    const earlier = (await queries.selectWorkings(tx, reviewId)).filter(
      (working) => working.partId === wanted.partId,
    );
    await queries.insertWorking(tx, {
      reviewId,
      partId: wanted.partId,
      attempt: earlier.length + 1,
      text: wanted.text,
      agrees: marked.agrees,
      verdict: marked.verdict,
      remark: marked.remark.slice(0, 400),
      createdAt: context.clock(),
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

/** Holds to one's own working against the checker, after the last try. */
export function disputePart(
  context: AppContext,
  actor: SignedIn,
  reviewId: number,
  partId: string,
): Promise<Review> {
  return change(context, actor, reviewId, async (tx, { row, subject }) => {
    demand(actor, 'review.work', subject);
    demandStage(row, 'working', 'Say so before the answers are shown.');
    const tries = (await currentWorkings(tx, row)).filter((working) => working.partId === partId);
    const newest = tries.at(-1);
    if (newest === undefined || newest.agrees) {
      throw new AppError(
        'notPossible',
        'Give your working first; only one that does not agree can be held to.',
      );
    }
    if (tries.length < MAX_ATTEMPTS) {
      throw new AppError('notPossible', 'Try this part once more before you hold to your working.');
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
    const newest = newestOf(await currentWorkings(tx, row), wanted.partId);
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

/** Shows the answers, once every numeric part has a working that agrees or is held to. */
export function revealReview(context: AppContext, actor: SignedIn, reviewId: number): Promise<Review> {
  return change(context, actor, reviewId, async (tx, { row, subject, content }) => {
    demand(actor, 'review.work', subject);
    demandStage(row, 'working', 'The answers are shown already, or the review is not claimed yet.');
    const workings = await currentWorkings(tx, row);
    const open = content.parts.flatMap((part, index) => {
      if (!isNumericPart(part)) return [];
      const newest = newestOf(workings, part.id);
      return newest?.agrees === true || newest?.disputed === true ? [] : [`(${partLetter(index)})`];
    });
    if (open.length > 0) {
      throw new AppError(
        'notPossible',
        `${open.length === 1 ? `Part ${open.join()} has` : `Parts ${open.join(', ')} have`} no working yet that agrees or that you hold to.`,
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

/** Adds a comment, on a part or on the whole. Nobody can change or remove it. */
export function addComment(
  context: AppContext,
  actor: SignedIn,
  reviewId: number,
  wanted: { anchor: string; text: string },
): Promise<Review> {
  return change(context, actor, reviewId, async (tx, { row, subject, content }) => {
    demand(actor, 'review.comment', subject);
    const anchors = ['', 'stem', 'script', ...content.parts.map((part) => part.id)];
    if (!anchors.includes(wanted.anchor)) {
      throw new AppError('invalid', 'This comment points at a part that the item does not have.', {
        fields: [{ path: 'anchor', message: 'Choose a part, the stem, the script or the whole item.' }],
      });
    }
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
