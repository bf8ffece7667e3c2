import { z } from 'zod';

import { ACTIONS } from '../domain/permissions.ts';
import { ITEM_STATES } from '../domain/item-life.ts';
import { assayReportSchema, itemContentSchema, SEVERITIES } from '../engine/index.ts';
import { endpoint, idParam, instant, pageOf, pageQuery } from './endpoint.ts';
import { personNameSchema } from './people.ts';
import { topicSchema } from './topics.ts';

export const abilitiesSchema = z.array(z.enum(ACTIONS as [(typeof ACTIONS)[number], ...typeof ACTIONS]));

/** A stored assay of one revision; stale when the content or the engine has moved since. */
export const storedAssaySchema = z.object({
  id: z.number().int(),
  report: assayReportSchema,
  stale: z.boolean(),
  durationMs: z.number(),
  createdAt: instant,
});
export type StoredAssay = z.infer<typeof storedAssaySchema>;

/** One row of the bank. */
export const itemRowSchema = z.object({
  id: z.number().int(),
  code: z.string(),
  title: z.string(),
  topic: topicSchema,
  state: z.enum(ITEM_STATES),
  owner: personNameSchema,
  marks: z.number().int(),
  parts: z.number().int(),
  revision: z.number().int(),
  approvedRevision: z.number().int().nullable(),
  /** Worst finding of the latest assay; null when there is none or no assay. */
  worstFinding: z.enum(SEVERITIES).nullable(),
  assayed: z.enum(['fresh', 'stale', 'never']),
  /** Papers that hold the item; null for people who may not know. */
  usedOn: z.number().int().nullable(),
  updatedAt: instant,
});
export type ItemRow = z.infer<typeof itemRowSchema>;

export const ITEM_SORTS = ['code', 'title', 'topic', 'state', 'owner', 'marks', 'updated'] as const;

export const itemQuerySchema = z.object({
  ...pageQuery,
  search: z.string().trim().max(200).optional(),
  topic: z.coerce.number().int().optional(),
  state: z.enum(ITEM_STATES).optional(),
  owner: z.coerce.number().int().optional(),
  finding: z.enum([...SEVERITIES, 'none']).optional(),
  sort: z.enum(ITEM_SORTS).default('updated'),
  direction: z.enum(['ascending', 'descending']).default('descending'),
});
export type ItemQuery = z.infer<typeof itemQuerySchema>;

export const listItems = endpoint('GET', '/api/items', {
  query: itemQuerySchema,
  response: pageOf(itemRowSchema),
});

export const createItem = endpoint('POST', '/api/items', {
  body: z.object({
    title: z.string().trim().min(1, 'Give the item a title.').max(160),
    topicId: z.number({ error: 'Choose a topic.' }).int(),
  }),
  response: z.object({ id: z.number().int(), code: z.string() }),
});

export const revisionSummarySchema = z.object({
  id: z.number().int(),
  number: z.number().int(),
  state: z.enum(ITEM_STATES),
  author: personNameSchema,
  createdAt: instant,
  updatedAt: instant,
  note: z.string(),
});

/** An item with its latest revision, as the bench opens it. */
export const itemSchema = z.object({
  id: z.number().int(),
  code: z.string(),
  topic: topicSchema,
  owner: personNameSchema,
  state: z.enum(ITEM_STATES),
  revision: revisionSummarySchema.extend({
    content: itemContentSchema,
    /** Optimistic version; send back what you read. */
    version: z.number().int(),
  }),
  approvedRevision: revisionSummarySchema.nullable(),
  /** The running or latest review of this revision. */
  reviewId: z.number().int().nullable(),
  /** The reviewer's reasons when the item was returned. */
  returnedBecause: z.string().nullable(),
  assay: storedAssaySchema.nullable(),
  /** Cautions for the people who write it, when the item describes apparatus that can hurt. */
  cautions: z.array(z.string()),
  abilities: abilitiesSchema,
});
export type Item = z.infer<typeof itemSchema>;

const itemParams = z.object({ itemId: idParam });

export const getItem = endpoint('GET', '/api/items/:itemId', { params: itemParams, response: itemSchema });

/** Autosave. A stale version answers 409 with the stored item as `current`. */
export const saveDraft = endpoint('PUT', '/api/items/:itemId/draft', {
  params: itemParams,
  body: z.object({
    version: z.number().int(),
    content: itemContentSchema,
    topicId: z.number().int().optional(),
  }),
  response: z.object({ version: z.number().int(), savedAt: instant }),
});

/** Begins a new revision from the latest approved or returned one. */
export const startRevision = endpoint('POST', '/api/items/:itemId/revisions', {
  params: itemParams,
  response: itemSchema,
});

export const listRevisions = endpoint('GET', '/api/items/:itemId/revisions', {
  params: itemParams,
  response: z.object({ revisions: z.array(revisionSummarySchema) }),
});

export const getRevision = endpoint('GET', '/api/items/:itemId/revisions/:number', {
  params: itemParams.extend({ number: z.coerce.number().int().positive() }),
  response: revisionSummarySchema.extend({
    content: itemContentSchema,
    assay: storedAssaySchema.nullable(),
  }),
});

/** Runs the full assay on the saved draft and stores it with the revision. */
export const assayItem = endpoint('POST', '/api/items/:itemId/assay', {
  params: itemParams,
  response: storedAssaySchema,
});

export const sendToReview = endpoint('POST', '/api/items/:itemId/send', {
  params: itemParams,
  body: z.object({
    version: z.number().int(),
    note: z.string().trim().max(2_000).default(''),
    reviewerId: z.number().int().nullable().default(null),
    dueOn: z.iso.date().nullable().default(null),
  }),
  response: itemSchema,
});

const withReason = z.object({
  reason: z.string().trim().min(1, 'Say why, in a few words.').max(2_000),
});

/** Takes the item back from review. */
export const recallItem = endpoint('POST', '/api/items/:itemId/recall', {
  params: itemParams,
  body: withReason,
  response: itemSchema,
});

export const withdrawItem = endpoint('POST', '/api/items/:itemId/withdraw', {
  params: itemParams,
  body: withReason,
  response: itemSchema,
});
