import { z } from 'zod';

import { assayReportSchema, itemContentSchema } from '../engine/index.ts';
import { itemSchemeSchema, itemSheetSchema } from '../sheet/model.ts';
import { endpoint, idParam } from './endpoint.ts';

const spanSchema = z.object({
  start: z.number(),
  end: z.number(),
  line: z.number(),
  column: z.number(),
});

/** A mistake in a script or a text, placed. `field` is empty for the script, else as `parts.0.text`. */
export const diagnosticSchema = z.object({
  code: z.string(),
  severity: z.enum(['error', 'warning']),
  span: spanSchema,
  message: z.string(),
  field: z.string().default(''),
  fix: z.object({ label: z.string(), span: spanSchema, replacement: z.string() }).optional(),
});
export type PlacedDiagnostic = z.infer<typeof diagnosticSchema>;

/** One named value of the script as the quantities table and the editor's hover show it. */
export const quantityRowSchema = z.object({
  name: z.string(),
  kind: z.enum(['drawn', 'given', 'computed']),
  /** In plain words and unit, as "potential difference (V)". */
  dimension: z.string(),
  unit: z.string(),
  line: z.number(),
  /** Printed value at the current draw, as "1.25 kV"; empty when undefined. */
  value: z.string(),
  /** The same as LaTeX. */
  valueLatex: z.string(),
});
export type QuantityRow = z.infer<typeof quantityRowSchema>;

/** What one draw of an item looks like on paper and in the mark scheme. */
export const drawViewSchema = z.object({
  draw: z.number(),
  /** Whether every `require` holds on this draw. */
  kept: z.boolean(),
  gridSize: z.number(),
  /** True when the script has no finite grid. */
  open: z.boolean(),
  diagnostics: z.array(diagnosticSchema),
  quantities: z.array(quantityRowSchema),
  sheet: itemSheetSchema,
  scheme: itemSchemeSchema,
});
export type DrawView = z.infer<typeof drawViewSchema>;

const checkRequest = {
  params: z.object({ itemId: idParam }),
  body: z.object({
    content: itemContentSchema,
    /** null asks for the first draw that every `require` keeps. */
    draw: z.number().int().min(0).nullable().default(null),
  }),
};

/** The sheet, mark scheme and values at one draw of unsaved content; quick. */
export const viewDraw = endpoint('POST', '/api/items/:itemId/draw', {
  ...checkRequest,
  response: drawViewSchema,
});

/** The same with a full assay of the unsaved content, which is not stored. */
export const checkItem = endpoint('POST', '/api/items/:itemId/check', {
  ...checkRequest,
  response: z.object({ view: drawViewSchema, report: assayReportSchema }),
});
export type CheckReply = z.infer<typeof checkItem.response>;
