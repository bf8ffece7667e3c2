import { sql } from 'drizzle-orm';
import {
  check,
  index,
  int,
  longtext,
  mysqlEnum,
  mysqlTable,
  text,
  unique,
  varchar,
} from 'drizzle-orm/mysql-core';

import { PAPER_STATES } from '#shared/domain/paper-life.ts';
import { drawNumber, id, instant, instantNow, reference } from '../columns.ts';
import { items, revisions } from './items.ts';
import { people } from './people.ts';

export const papers = mysqlTable(
  'papers',
  {
    id: id(),
    code: varchar({ length: 16 }).notNull().unique(),
    title: varchar({ length: 160 }).notNull(),
    subtitle: varchar({ length: 160 }).notNull().default(''),
    targetMarks: int().notNull(),
    durationMinutes: int().notNull(),
    instructions: text().notNull(),
    state: mysqlEnum(PAPER_STATES).notNull().default('assembling'),
    /** Optimistic version of details and places together. */
    version: int().notNull().default(1),
    createdById: reference()
      .notNull()
      .references(() => people.id),
    proposedById: reference().references(() => people.id),
    proposedAt: instant(),
    releasedAt: instant(),
    createdAt: instantNow(),
    updatedAt: instantNow(),
  },
  (table) => [
    index('papers_state').on(table.state, table.updatedAt),
    index('papers_updated').on(table.updatedAt),
    check('papers_targets', sql`target_marks >= 1 and duration_minutes >= 1`),
    check('papers_proposer_known', sql`state = 'assembling' or proposed_by_id is not null`),
  ],
);

/** The running order: which revision stands where, with which values. */
export const paperPlaces = mysqlTable(
  'paper_places',
  {
    id: id(),
    paperId: reference()
      .notNull()
      .references(() => papers.id),
    /** From 1. */
    position: int().notNull(),
    itemId: reference()
      .notNull()
      .references(() => items.id),
    revisionId: reference()
      .notNull()
      .references(() => revisions.id),
    draw: drawNumber().notNull(),
    createdAt: instantNow(),
  },
  (table) => [
    unique('paper_places_position').on(table.paperId, table.position),
    unique('paper_places_item').on(table.paperId, table.itemId),
    index('paper_places_used').on(table.itemId),
    check('paper_places_position_positive', sql`position >= 1`),
  ],
);

/** What a sealed paper is: its canonical text and the hash of it. */
export const seals = mysqlTable(
  'seals',
  {
    id: id(),
    paperId: reference()
      .notNull()
      .references(() => papers.id)
      .unique(),
    canonical: longtext().notNull(),
    sha256: varchar({ length: 64 }).notNull(),
    proposedById: reference()
      .notNull()
      .references(() => people.id),
    confirmedById: reference()
      .notNull()
      .references(() => people.id),
    sealedAt: instant().notNull(),
  },
  () => [check('seals_two_people', sql`proposed_by_id <> confirmed_by_id`)],
);
