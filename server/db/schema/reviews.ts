import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  date,
  index,
  int,
  mysqlEnum,
  mysqlTable,
  unique,
  varchar,
} from 'drizzle-orm/mysql-core';

import type { DECISIONS, ReviewStage } from '#shared/contracts/reviews.ts';
import type { Verdict } from '#shared/engine/index.ts';
import { document, drawNumber, id, instant, instantNow, reference } from '../columns.ts';
import { items, revisions } from './items.ts';
import { people } from './people.ts';

const STAGES = ['waiting', 'working', 'revealed', 'decided'] as const satisfies readonly ReviewStage[];
const DECIDED = ['approved', 'returned', 'recalled'] as const satisfies readonly (typeof DECISIONS)[number][];

/** One review of one revision. */
export const reviews = mysqlTable(
  'reviews',
  {
    id: id(),
    itemId: reference()
      .notNull()
      .references(() => items.id),
    revisionId: reference()
      .notNull()
      .references(() => revisions.id)
      .unique(),
    requestedById: reference()
      .notNull()
      .references(() => people.id),
    /** Who it is addressed to or claimed by; null while it waits in the queue. */
    reviewerId: reference().references(() => people.id),
    stage: mysqlEnum(STAGES).notNull().default('waiting'),
    /** The draw that the reviewer works. */
    draw: drawNumber().notNull(),
    note: varchar({ length: 2000 }).notNull().default(''),
    dueOn: date({ mode: 'string' }),
    decision: mysqlEnum(DECIDED),
    decisionReason: varchar({ length: 4000 }).notNull().default(''),
    /** The reviewer's reasons for cautions that stand, by finding key. */
    acceptedCautions: document<Record<string, string>>().notNull().default({}),
    claimedAt: instant(),
    revealedAt: instant(),
    decidedAt: instant(),
    createdAt: instantNow(),
  },
  (table) => [
    index('reviews_item').on(table.itemId),
    index('reviews_stage').on(table.stage, table.createdAt),
    index('reviews_reviewer').on(table.reviewerId, table.stage, table.createdAt),
    index('reviews_requester').on(table.requestedById, table.createdAt),
    check('reviews_decision', sql`(stage = 'decided') = (decision is not null)`),
    check('reviews_reviewer_known', sql`stage in ('waiting', 'decided') or reviewer_id is not null`),
  ],
);

/** The reviewer's own answers, one row a try. */
export const independentWorkings = mysqlTable(
  'independent_workings',
  {
    id: id(),
    reviewId: reference()
      .notNull()
      .references(() => reviews.id),
    partId: varchar({ length: 40 }).notNull(),
    attempt: int().notNull(),
    text: varchar({ length: 200 }).notNull(),
    agrees: boolean().notNull(),
    verdict: document<Verdict>().notNull(),
    /** What the reviewer is told before the reveal. */
    remark: varchar({ length: 400 }).notNull().default(''),
    disputed: boolean().notNull().default(false),
    /** Why the dispute is over; null while it stands or where there is none. */
    settledReason: varchar({ length: 2000 }),
    createdAt: instantNow(),
  },
  (table) => [
    unique('independent_workings_attempt').on(table.reviewId, table.partId, table.attempt),
    check('independent_workings_attempt_positive', sql`attempt >= 1`),
  ],
);

export const comments = mysqlTable(
  'comments',
  {
    id: id(),
    reviewId: reference()
      .notNull()
      .references(() => reviews.id),
    revisionId: reference()
      .notNull()
      .references(() => revisions.id),
    /** A part's id, `stem`, `script`, or empty for the item as a whole. */
    anchor: varchar({ length: 40 }).notNull().default(''),
    authorId: reference()
      .notNull()
      .references(() => people.id),
    text: varchar({ length: 4000 }).notNull(),
    createdAt: instantNow(),
  },
  (table) => [index('comments_review').on(table.reviewId, table.createdAt)],
);
