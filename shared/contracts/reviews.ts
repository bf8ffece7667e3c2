import { z } from 'zod';

import { assayReportSchema, itemContentSchema } from '../engine/index.ts';
import { itemSchemeSchema, itemSheetSchema } from '../sheet/model.ts';
import { emptyReply, endpoint, idParam, instant } from './endpoint.ts';
import { abilitiesSchema } from './items.ts';
import { personNameSchema } from './people.ts';
import { topicSchema } from './topics.ts';

/** waiting: in the queue or addressed; working: claimed, answers hidden; revealed: all shown; decided: over. */
export const REVIEW_STAGES = ['waiting', 'working', 'revealed', 'decided'] as const;
export type ReviewStage = (typeof REVIEW_STAGES)[number];

export const DECISIONS = ['approved', 'returned', 'recalled'] as const;

export const reviewRowSchema = z.object({
  id: z.number().int(),
  itemId: z.number().int(),
  itemCode: z.string(),
  itemTitle: z.string(),
  topic: topicSchema,
  revision: z.number().int(),
  marks: z.number().int(),
  requestedBy: personNameSchema,
  reviewer: personNameSchema.nullable(),
  stage: z.enum(REVIEW_STAGES),
  decision: z.enum(DECISIONS).nullable(),
  dueOn: z.iso.date().nullable(),
  requestedAt: instant,
  abilities: abilitiesSchema,
});
export type ReviewRow = z.infer<typeof reviewRowSchema>;

export const listReviews = endpoint('GET', '/api/reviews', {
  query: z.object({ scope: z.enum(['open', 'mine', 'decided']).default('open') }),
  response: z.object({ reviews: z.array(reviewRowSchema) }),
});

/** One try at one part; says whether it agrees, never by how much, until the reveal. */
export const workingSchema = z.object({
  partId: z.string(),
  attempt: z.number().int(),
  text: z.string(),
  agrees: z.boolean(),
  /** What the reviewer is told before the reveal. */
  remark: z.string(),
  /** The reviewer holds to this working against the checker. */
  disputed: z.boolean(),
  /** What made the reviewer agree after the reveal; null while nothing did. */
  settledReason: z.string().nullable(),
  createdAt: instant,
});
export type Working = z.infer<typeof workingSchema>;

export const commentSchema = z.object({
  id: z.number().int(),
  author: personNameSchema,
  /** A part's id, `stem`, `script`, or empty for the item as a whole. */
  anchor: z.string(),
  text: z.string(),
  createdAt: instant,
});
export type ReviewComment = z.infer<typeof commentSchema>;

/** What is shown once every numeric part has a working. */
export const revealSchema = z.object({
  content: itemContentSchema,
  scheme: itemSchemeSchema,
  report: assayReportSchema,
  assayStale: z.boolean(),
  /** The last approved revision's content, to show what changed; null for a first revision. */
  previous: z.object({ revision: z.number().int(), content: itemContentSchema }).nullable(),
});

export const MAX_ATTEMPTS = 2;

export const reviewSchema = z.object({
  ...reviewRowSchema.shape,
  note: z.string(),
  /** The draw that the server chose for this review. */
  draw: z.number(),
  /** The item as a candidate sees it, without anything of the answers; null until the review is claimed. */
  sheet: itemSheetSchema.nullable(),
  numericParts: z.array(z.object({ partId: z.string(), letter: z.string(), unit: z.string() })),
  workings: z.array(workingSchema),
  reveal: revealSchema.nullable(),
  comments: z.array(commentSchema),
  decisionReason: z.string(),
  decidedAt: instant.nullable(),
});
export type Review = z.infer<typeof reviewSchema>;

const params = z.object({ reviewId: idParam });

export const getReview = endpoint('GET', '/api/reviews/:reviewId', { params, response: reviewSchema });

export const claimReview = endpoint('POST', '/api/reviews/:reviewId/claim', {
  params,
  response: reviewSchema,
});

/** Gives a claimed review back to the queue; possible until the reveal. */
export const releaseReview = endpoint('POST', '/api/reviews/:reviewId/release', {
  params,
  response: emptyReply,
});

export const addWorking = endpoint('POST', '/api/reviews/:reviewId/workings', {
  params,
  body: z.object({
    partId: z.string().max(40),
    text: z.string().trim().min(1, 'Write your answer with its unit.').max(200),
  }),
  response: reviewSchema,
});

/** Holds to one's own working after the last try; the item cannot be approved until it is settled. */
export const disputePart = endpoint('POST', '/api/reviews/:reviewId/disputes', {
  params,
  body: z.object({ partId: z.string().max(40) }),
  response: reviewSchema,
});

/** Settles a dispute after the reveal: the reviewer now agrees, and says why. */
export const settlePart = endpoint('POST', '/api/reviews/:reviewId/settlements', {
  params,
  body: z.object({
    partId: z.string().max(40),
    reason: z.string().trim().min(1, 'Say what settled it.').max(2_000),
  }),
  response: reviewSchema,
});

/** Shows the answers; needs a working of every numeric part. */
export const revealReview = endpoint('POST', '/api/reviews/:reviewId/reveal', {
  params,
  response: reviewSchema,
});

export const addComment = endpoint('POST', '/api/reviews/:reviewId/comments', {
  params,
  body: z.object({
    anchor: z.string().max(40).default(''),
    text: z.string().trim().min(1, 'Write the comment first.').max(4_000),
  }),
  response: reviewSchema,
});

export const decideReview = endpoint('POST', '/api/reviews/:reviewId/decision', {
  params,
  body: z.object({
    decision: z.enum(['approved', 'returned']),
    reason: z.string().trim().max(4_000).default(''),
    /** The reviewer's acceptance of cautions that the writer gave no reason for, by finding key. */
    acceptedCautions: z.record(z.string().max(200), z.string().max(1_000)).default({}),
  }),
  response: reviewSchema,
});
