import { sql } from 'drizzle-orm';
import {
  type AnyMySqlColumn,
  check,
  double,
  index,
  int,
  longtext,
  mysqlEnum,
  mysqlTable,
  primaryKey,
  unique,
  varchar,
} from 'drizzle-orm/mysql-core';

import { ITEM_STATES } from '#shared/domain/item-life.ts';
import type { AssayReport, ItemContent } from '#shared/engine/index.ts';
import { bytes, document, id, instantNow, reference } from '../columns.ts';
import { people } from './people.ts';
import { topics } from './topics.ts';

/** The bank; what its list shows of the latest revision is held here, so that one table is sorted and searched. */
export const items = mysqlTable(
  'items',
  {
    id: id(),
    code: varchar({ length: 16 }).notNull().unique(),
    topicId: reference()
      .notNull()
      .references(() => topics.id),
    ownerId: reference()
      .notNull()
      .references(() => people.id),
    /** State of the latest revision. */
    state: mysqlEnum(ITEM_STATES).notNull().default('drafting'),
    title: varchar({ length: 160 }).notNull(),
    marks: int().notNull().default(0),
    partsCount: int().notNull().default(0),
    /** Code, title and all printed text, for the full-text search. */
    searchText: longtext().notNull(),
    latestRevisionId: reference().references((): AnyMySqlColumn => revisions.id),
    approvedRevisionId: reference().references((): AnyMySqlColumn => revisions.id),
    /**
     * The last stored assay of the latest revision. It is fresh while its content hash is the revision's and
     * its engine version the server's.
     */
    latestAssayId: reference().references((): AnyMySqlColumn => assays.id),
    /** Worst finding of that assay; null when it has none. */
    worstFinding: mysqlEnum(['blocker', 'caution', 'note']),
    origin: mysqlEnum(['written', 'imported', 'demo']).notNull().default('written'),
    createdAt: instantNow(),
    updatedAt: instantNow(),
  },
  (table) => [
    index('items_updated').on(table.updatedAt),
    index('items_title').on(table.title),
    index('items_marks').on(table.marks),
    index('items_state').on(table.state, table.updatedAt),
    index('items_topic').on(table.topicId, table.state, table.updatedAt),
    index('items_owner').on(table.ownerId, table.state, table.updatedAt),
    index('items_finding').on(table.worstFinding, table.updatedAt),
    check('items_marks_range', sql`marks >= 0 and parts_count >= 0`),
  ],
);

/** Versions of an item; a revision changes only while it is being drafted. */
export const revisions = mysqlTable(
  'revisions',
  {
    id: id(),
    itemId: reference()
      .notNull()
      .references((): AnyMySqlColumn => items.id),
    number: int().notNull(),
    state: mysqlEnum(ITEM_STATES).notNull().default('drafting'),
    content: document<ItemContent>().notNull(),
    /** The engine's hash of everything that an assay reads. */
    contentHash: varchar({ length: 64 }).notNull(),
    /** Optimistic version, raised by every save. */
    version: int().notNull().default(1),
    authorId: reference()
      .notNull()
      .references(() => people.id),
    updatedById: reference()
      .notNull()
      .references(() => people.id),
    note: varchar({ length: 2000 }).notNull().default(''),
    createdAt: instantNow(),
    updatedAt: instantNow(),
  },
  (table) => [
    unique('revisions_number').on(table.itemId, table.number),
    check('revisions_number_positive', sql`number >= 1 and version >= 1`),
  ],
);

/** Everyone who edited a revision; none of them may review it. */
export const revisionAuthors = mysqlTable(
  'revision_authors',
  {
    revisionId: reference()
      .notNull()
      .references(() => revisions.id),
    personId: reference()
      .notNull()
      .references(() => people.id),
    firstEditedAt: instantNow(),
  },
  (table) => [
    primaryKey({ name: 'revision_authors_key', columns: [table.revisionId, table.personId] }),
    index('revision_authors_person').on(table.personId),
  ],
);

export const figures = mysqlTable(
  'figures',
  {
    id: id(),
    itemId: reference()
      .notNull()
      .references(() => items.id),
    sha256: varchar({ length: 64 }).notNull(),
    mediaType: mysqlEnum(['image/png', 'image/jpeg', 'image/svg+xml']).notNull(),
    content: bytes().notNull(),
    byteLength: int().notNull(),
    /** Pixels, or user units of an SVG. */
    width: double().notNull(),
    height: double().notNull(),
    originalName: varchar({ length: 255 }).notNull(),
    addedById: reference()
      .notNull()
      .references(() => people.id),
    createdAt: instantNow(),
  },
  (table) => [
    unique('figures_content').on(table.itemId, table.sha256),
    check('figures_size', sql`width > 0 and height > 0 and byte_length > 0`),
  ],
);

/** Stored checks; several of one revision are kept, the newest counts. */
export const assays = mysqlTable(
  'assays',
  {
    id: id(),
    revisionId: reference()
      .notNull()
      .references(() => revisions.id),
    engineVersion: varchar({ length: 40 }).notNull(),
    contentHash: varchar({ length: 64 }).notNull(),
    report: document<AssayReport>().notNull(),
    durationMs: double().notNull(),
    requestedById: reference().references(() => people.id),
    createdAt: instantNow(),
  },
  (table) => [index('assays_revision').on(table.revisionId, table.createdAt)],
);
