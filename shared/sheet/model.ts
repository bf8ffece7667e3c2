import { z } from 'zod';

/** What a reader sees inside a line of text. */
export type Inline =
  | { kind: 'text'; text: string }
  | { kind: 'strong'; children: Inline[] }
  | { kind: 'emphasis'; children: Inline[] }
  | { kind: 'maths'; latex: string }
  /** A value of the draw, with its unit, ready for either way of printing. */
  | { kind: 'value'; name: string; text: string; latex: string }
  | { kind: 'break' };

export const inlineSchema: z.ZodType<Inline> = z.lazy(() =>
  z.discriminatedUnion('kind', [
    z.object({ kind: z.literal('text'), text: z.string() }),
    z.object({ kind: z.literal('strong'), children: z.array(inlineSchema) }),
    z.object({ kind: z.literal('emphasis'), children: z.array(inlineSchema) }),
    z.object({ kind: z.literal('maths'), latex: z.string() }),
    z.object({ kind: z.literal('value'), name: z.string(), text: z.string(), latex: z.string() }),
    z.object({ kind: z.literal('break') }),
  ]),
);

/** A figure as it prints at one draw. */
export const sheetFigureSchema = z.object({
  figureId: z.number().int(),
  mediaType: z.enum(['image/png', 'image/jpeg', 'image/svg+xml']),
  /** The picture with its holes filled, for SVG; null for a bitmap, which is fetched by its id. */
  svg: z.string().nullable(),
  width: z.number(),
  height: z.number(),
  alternativeText: z.string(),
  caption: z.string(),
  widthPercent: z.number(),
});
export type SheetFigure = z.infer<typeof sheetFigureSchema>;

/** A paragraph, list, table, displayed formula or figure. */
export type Block =
  | { kind: 'paragraph'; children: Inline[] }
  | { kind: 'list'; ordered: boolean; items: Block[][] }
  | { kind: 'table'; header: Inline[][]; rows: Inline[][][] }
  | { kind: 'maths'; latex: string }
  | { kind: 'figure'; figure: SheetFigure };

export const blockSchema: z.ZodType<Block> = z.lazy(() =>
  z.discriminatedUnion('kind', [
    z.object({ kind: z.literal('paragraph'), children: z.array(inlineSchema) }),
    z.object({ kind: z.literal('list'), ordered: z.boolean(), items: z.array(z.array(blockSchema)) }),
    z.object({
      kind: z.literal('table'),
      header: z.array(z.array(inlineSchema)),
      rows: z.array(z.array(z.array(inlineSchema))),
    }),
    z.object({ kind: z.literal('maths'), latex: z.string() }),
    z.object({ kind: z.literal('figure'), figure: sheetFigureSchema }),
  ]),
);

/** One lettered part as the candidate sees it. */
export const sheetPartSchema = z.object({
  id: z.string(),
  letter: z.string(),
  kind: z.enum(['numeric', 'showThat', 'written']),
  blocks: z.array(blockSchema),
  marks: z.number().int(),
  /** Unit printed at the end of the answer line; null where no answer line is printed. */
  answerUnit: z.string().nullable(),
  /** Ruled lines for working or writing. */
  lines: z.number().int(),
});
export type SheetPart = z.infer<typeof sheetPartSchema>;

/** An item as the candidate sees it: nothing of the answers is in here. */
export const itemSheetSchema = z.object({
  title: z.string(),
  blocks: z.array(blockSchema),
  parts: z.array(sheetPartSchema),
  marks: z.number().int(),
  /** Cautions printed with practical work; empty otherwise. */
  cautions: z.array(z.string()),
});
export type ItemSheet = z.infer<typeof itemSheetSchema>;

/** One part of the mark scheme. */
export const schemePartSchema = z.object({
  id: z.string(),
  letter: z.string(),
  kind: z.enum(['numeric', 'showThat', 'written']),
  marks: z.number().int(),
  lines: z.array(z.object({ children: z.array(inlineSchema), marks: z.number().int() })),
  /** The model answer with unit; null for a written part. */
  answer: z.object({ text: z.string(), latex: z.string() }).nullable(),
  /** Accepted answers as an interval with unit, as "1.72 × 10¹¹ to 1.80 × 10¹¹ C kg⁻¹". */
  accepted: z.string().nullable(),
  /** As "3 significant figures"; with "required" when they are enforced. */
  figures: z.string().nullable(),
  /** What a marker does with known wrong workings. */
  guidance: z.array(
    z.object({
      name: z.string(),
      /** The answer that this wrong working gives. */
      value: z.string(),
      children: z.array(inlineSchema),
      marks: z.number().int(),
    }),
  ),
});
export type SchemePart = z.infer<typeof schemePartSchema>;

export const itemSchemeSchema = z.object({
  title: z.string(),
  marks: z.number().int(),
  parts: z.array(schemePartSchema),
});
export type ItemScheme = z.infer<typeof itemSchemeSchema>;

/** One constant as the data sheet prints it. */
export const dataSheetRowSchema = z.object({
  name: z.string(),
  symbolLatex: z.string(),
  valueText: z.string(),
  valueLatex: z.string(),
});
export type DataSheetRow = z.infer<typeof dataSheetRowSchema>;

export const paperSheetSchema = z.object({
  organisation: z.string(),
  code: z.string(),
  title: z.string(),
  subtitle: z.string(),
  durationMinutes: z.number().int(),
  marks: z.number().int(),
  instructions: z.array(z.string()),
  dataSheet: z.array(dataSheetRowSchema),
  items: z.array(z.object({ number: z.number().int(), code: z.string(), sheet: itemSheetSchema })),
  /** First characters of the seal's hash; null for a draft. */
  sealHash: z.string().nullable(),
});
export type PaperSheet = z.infer<typeof paperSheetSchema>;

export const paperSchemeSchema = z.object({
  organisation: z.string(),
  code: z.string(),
  title: z.string(),
  subtitle: z.string(),
  marks: z.number().int(),
  items: z.array(z.object({ number: z.number().int(), code: z.string(), scheme: itemSchemeSchema })),
  sealHash: z.string().nullable(),
});
export type PaperScheme = z.infer<typeof paperSchemeSchema>;
