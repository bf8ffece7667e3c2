import type { Review, ReviewComment, ReviewRow, Working } from '#shared/contracts/reviews.ts';
import { abilitiesFor, type Action, type Actor, type Subject } from '#shared/domain/permissions.ts';
import { isNumericPart, type ItemContent, partLetter } from '#shared/engine/index.ts';
import type { ItemSheet } from '#shared/sheet/model.ts';

import type { ReviewRecord, selectComments, WorkingRow } from './queries.ts';

const REVIEW_ACTIONS: readonly Action[] = [
  'review.read',
  'review.claim',
  'review.work',
  'review.decide',
  'review.comment',
];

/** A line of the review list. Nothing of the item but its name is told. */
export function presentReviewRow(row: ReviewRecord, actor: Actor, subject: Subject): ReviewRow {
  return {
    id: row.id,
    itemId: row.itemId,
    itemCode: row.itemCode,
    itemTitle: row.itemTitle,
    topic: { id: row.topicId, code: row.topicCode, name: row.topicName },
    revision: row.revision,
    marks: row.marks,
    requestedBy: { id: row.requestedById, name: row.requestedByName },
    reviewer: row.reviewerId === null ? null : { id: row.reviewerId, name: row.reviewerName ?? '' },
    stage: row.stage,
    decision: row.decision,
    dueOn: row.dueOn,
    requestedAt: row.createdAt.toISOString(),
    abilities: abilitiesFor(actor, REVIEW_ACTIONS, subject),
  };
}

/** `attempt` counts the tries of the present claim. */
function presentWorking(row: WorkingRow, attempt: number): Working {
  return {
    partId: row.partId,
    attempt,
    text: row.text,
    agrees: row.agrees,
    remark: row.remark,
    disputed: row.disputed,
    settledReason: row.settledReason,
    createdAt: row.createdAt.toISOString(),
  };
}

function presentComment(row: Awaited<ReturnType<typeof selectComments>>[number]): ReviewComment {
  return {
    id: row.id,
    author: { id: row.authorId, name: row.authorName },
    anchor: row.anchor,
    text: row.text,
    createdAt: row.createdAt.toISOString(),
  };
}

interface WholeReview {
  row: ReviewRecord;
  actor: Actor;
  subject: Subject;
  content: ItemContent;
  sheet: ItemSheet | null;
  workings: readonly WorkingRow[];
  comments: Awaited<ReturnType<typeof selectComments>>;
  reveal: Review['reveal'];
}

/** A review at its stage. Answers are in it only when `reveal` is. */
export function presentReview(whole: WholeReview): Review {
  const { row, actor, subject, content, sheet, workings, comments, reveal } = whole;
  return {
    ...presentReviewRow(row, actor, subject),
    note: row.note,
    draw: row.draw,
    sheet,
    numericParts:
      sheet === null
        ? []
        : content.parts.flatMap((part, index) =>
            isNumericPart(part)
              ? [{ partId: part.id, letter: partLetter(index), unit: part.answer.unit }]
              : [],
          ),
    workings: workings.map((working, index) =>
      presentWorking(
        working,
        workings.slice(0, index + 1).filter((one) => one.partId === working.partId).length,
      ),
    ),
    reveal,
    comments: comments.map(presentComment),
    decisionReason: row.decisionReason,
    decidedAt: row.decidedAt?.toISOString() ?? null,
  };
}
