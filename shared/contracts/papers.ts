import { z } from 'zod';

import { PAPER_STATES } from '../domain/paper-life.ts';
import { SEVERITIES } from '../engine/index.ts';
import { paperSchemeSchema, paperSheetSchema } from '../sheet/model.ts';
import { endpoint, idParam, instant } from './endpoint.ts';
import { abilitiesSchema } from './items.ts';
import { personNameSchema } from './people.ts';
import { topicSchema } from './topics.ts';

export const paperDetailsSchema = z.object({
  title: z.string().trim().min(1, 'Give the paper a title.').max(160),
  subtitle: z.string().trim().max(160).default(''),
  targetMarks: z.number({ error: 'Give the total as a whole number.' }).int().min(1).max(400).default(60),
  durationMinutes: z.number({ error: 'Give the time in minutes.' }).int().min(5).max(600).default(75),
  instructions: z.string().max(4_000).default(''),
});
export type PaperDetails = z.infer<typeof paperDetailsSchema>;

export const paperRowSchema = z.object({
  id: z.number().int(),
  code: z.string(),
  title: z.string(),
  state: z.enum(PAPER_STATES),
  items: z.number().int(),
  marks: z.number().int(),
  targetMarks: z.number().int(),
  createdBy: personNameSchema,
  updatedAt: instant,
});
export type PaperRow = z.infer<typeof paperRowSchema>;

export const paperPlaceSchema = z.object({
  id: z.number().int(),
  position: z.number().int(),
  itemId: z.number().int(),
  itemCode: z.string(),
  title: z.string(),
  topic: topicSchema,
  /** The approved revision that the paper took. */
  revision: z.number().int(),
  /** A newer approved revision, if there is one. */
  newerRevision: z.number().int().nullable(),
  marks: z.number().int(),
  draw: z.number(),
  gridSize: z.number(),
});
export type PaperPlace = z.infer<typeof paperPlaceSchema>;

/** One result of the paper's own checks. */
export const paperFindingSchema = z.object({
  code: z.string(),
  severity: z.enum(SEVERITIES),
  statement: z.string(),
  cure: z.string(),
  placeIds: z.array(z.number().int()),
});
export type PaperFinding = z.infer<typeof paperFindingSchema>;

export const sealSchema = z.object({
  sha256: z.string(),
  /** Whether the stored content still has that hash. */
  intact: z.boolean(),
  proposedBy: personNameSchema,
  confirmedBy: personNameSchema,
  sealedAt: instant,
});

export const paperSchema = z.object({
  id: z.number().int(),
  code: z.string(),
  ...paperDetailsSchema.shape,
  state: z.enum(PAPER_STATES),
  version: z.number().int(),
  createdBy: personNameSchema,
  proposedBy: personNameSchema.nullable(),
  places: z.array(paperPlaceSchema),
  marks: z.number().int(),
  marksByTopic: z.array(z.object({ topic: topicSchema, marks: z.number().int() })),
  findings: z.array(paperFindingSchema),
  seal: sealSchema.nullable(),
  abilities: abilitiesSchema,
});
export type Paper = z.infer<typeof paperSchema>;

const params = z.object({ paperId: idParam });

export const listPapers = endpoint('GET', '/api/papers', {
  response: z.object({ papers: z.array(paperRowSchema) }),
});

export const createPaper = endpoint('POST', '/api/papers', {
  body: paperDetailsSchema,
  response: paperSchema,
});

export const getPaper = endpoint('GET', '/api/papers/:paperId', { params, response: paperSchema });

/** A stale version answers 409 with the stored paper as `current`. */
export const savePaperDetails = endpoint('PUT', '/api/papers/:paperId', {
  params,
  body: paperDetailsSchema.extend({ version: z.number().int() }),
  response: paperSchema,
});

/** The whole running order at once: items in order, each with its draw. */
export const savePaperPlaces = endpoint('PUT', '/api/papers/:paperId/places', {
  params,
  body: z.object({
    version: z.number().int(),
    places: z
      .array(
        z.object({
          itemId: z.number().int(),
          /** null lets the server choose a draw that the script keeps. */
          draw: z.number().int().min(0).nullable(),
          /** Takes the newest approved revision instead of the one already taken. */
          takeNewest: z.boolean().default(false),
        }),
      )
      .max(60, 'A paper may hold at most 60 items.'),
  }),
  response: paperSchema,
});

/** Question paper and mark scheme as they would print now (or as sealed). */
export const getPaperSheet = endpoint('GET', '/api/papers/:paperId/sheet', {
  params,
  response: z.object({ sheet: paperSheetSchema, scheme: paperSchemeSchema }),
});

const versioned = z.object({ version: z.number().int() });

export const proposePaper = endpoint('POST', '/api/papers/:paperId/propose', {
  params,
  body: versioned,
  response: paperSchema,
});

export const returnPaper = endpoint('POST', '/api/papers/:paperId/return', {
  params,
  body: versioned.extend({ reason: z.string().trim().min(1, 'Say why, in a few words.').max(2_000) }),
  response: paperSchema,
});

/** The second person's confirmation; freezes and hashes the paper. */
export const sealPaper = endpoint('POST', '/api/papers/:paperId/seal', {
  params,
  body: versioned,
  response: paperSchema,
});

export const releasePaper = endpoint('POST', '/api/papers/:paperId/release', {
  params,
  body: versioned,
  response: paperSchema,
});

export const EXPORT_KINDS = ['question-paper', 'mark-scheme'] as const;
export type ExportKind = (typeof EXPORT_KINDS)[number];

/** The DOCX file itself (not JSON). */
export const exportPaper = endpoint('GET', '/api/papers/:paperId/exports/:kind', {
  params: params.extend({ kind: z.enum(EXPORT_KINDS) }),
  response: z.unknown(),
});
