import { z } from 'zod';

/**
 * One item as the team stores, exchanges and checks it: a single JSON document per revision.
 * Raise ITEM_CONTENT_SCHEMA and add a migration function whenever a stored document would no longer parse.
 */
export const ITEM_CONTENT_SCHEMA = 1;

/** Limits of one item; the same numbers stand in the messages a writer sees. */
export const ITEM_LIMITS = {
  titleLength: 160,
  textLength: 8_000,
  scriptLength: 20_000,
  quantities: 200,
  parts: 16,
  slips: 16,
  schemeLines: 24,
  figures: 8,
  marksPerPart: 40,
} as const;

const shortText = z.string().max(400);
const printedText = z
  .string()
  .max(
    ITEM_LIMITS.textLength,
    `A text may have at most ${ITEM_LIMITS.textLength.toLocaleString('en-GB')} characters.`,
  );
const localId = z.string().regex(/^[A-Za-z0-9_-]{1,40}$/);

/** How a named value of the script is written for people, and what it stands for in physics. */
const quantitySchema = z.object({
  /** The script's own name, as `Va`. */
  name: z.string().min(1).max(60),
  /** LaTeX, as `V_a`; empty means the name itself. */
  symbol: z.string().max(120).default(''),
  /** Printed unit, as `kV` or `m s^-1`; empty means what the script wrote, or the coherent SI unit. */
  unit: z.string().max(60).default(''),
  /** Significant figures when printed; null means those of the draw's step or of `given`. */
  figures: z.number().int().min(1).max(12).nullable().default(null),
  /** Id of a row of the roles table (what the value stands for), or null. */
  role: z.string().max(60).nullable().default(null),
  /** Tells two things of a kind apart: roles bind to laws only within one set. */
  set: z.string().max(40).default(''),
});
export type Quantity = z.infer<typeof quantitySchema>;

/** The interval of answers that earn the mark, as its writer states it. */
const bandSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('percent'), percent: z.number().min(0).max(100) }),
  z.object({ kind: z.literal('absolute'), plusMinus: z.number().min(0), unit: z.string().max(60) }),
  z.object({ kind: z.literal('lastFigure'), units: z.number().min(0).max(50) }),
  z.object({ kind: z.literal('limits'), from: z.number(), to: z.number(), unit: z.string().max(60) }),
]);
export type Band = z.infer<typeof bandSchema>;

/** A known wrong working: an expression over the script's names, and what a marker does when it appears. */
const slipSchema = z.object({
  id: localId,
  name: shortText,
  expression: z.string().max(400),
  guidance: z.string().max(1_000).default(''),
  /** Marks that this wrong working still earns. */
  marks: z.number().int().min(0).max(ITEM_LIMITS.marksPerPart).default(0),
});
export type Slip = z.infer<typeof slipSchema>;

const schemeLineSchema = z.object({
  text: printedText,
  marks: z.number().int().min(0).max(ITEM_LIMITS.marksPerPart),
});
export type SchemeLine = z.infer<typeof schemeLineSchema>;

const answerSchema = z.object({
  /** Name of the script's quantity that is the right answer. */
  quantity: z.string().max(60),
  unit: z.string().max(60).default(''),
  figures: z.number().int().min(1).max(12).default(3),
  /** Whether an answer with other figures loses the mark. */
  enforceFigures: z.boolean().default(false),
  band: bandSchema.default({ kind: 'percent', percent: 2 }),
  /** Whether a candidate's own wrong earlier answer is carried forward into this part. */
  carryForward: z.boolean().default(true),
  slips: z.array(slipSchema).max(ITEM_LIMITS.slips).default([]),
});
export type Answer = z.infer<typeof answerSchema>;

const partBase = {
  id: localId,
  /** Markdown with maths and holes. */
  text: printedText.default(''),
  marks: z.number().int().min(0).max(ITEM_LIMITS.marksPerPart).default(1),
  /** Lines of the mark scheme; their marks add up to the part's. */
  scheme: z.array(schemeLineSchema).max(ITEM_LIMITS.schemeLines).default([]),
};

const partSchema = z.discriminatedUnion('kind', [
  z.object({ ...partBase, kind: z.literal('numeric'), answer: answerSchema }),
  z.object({
    ...partBase,
    kind: z.literal('showThat'),
    answer: answerSchema,
    /** Significant figures of the value that the text states. */
    statedFigures: z.number().int().min(1).max(6).default(2),
  }),
  z.object({
    ...partBase,
    kind: z.literal('written'),
    /** Ruled lines printed for the answer. */
    answerLines: z.number().int().min(0).max(40).default(3),
  }),
]);
export type Part = z.infer<typeof partSchema>;
export type NumericPart = Extract<Part, { kind: 'numeric' | 'showThat' }>;

const itemFigureSchema = z.object({
  /** Id of the stored figure. */
  figureId: z.number().int().positive(),
  alternativeText: z.string().max(1_000).default(''),
  caption: z.string().max(400).default(''),
  /** Share of the text width, percent. */
  widthPercent: z.number().int().min(20).max(100).default(60),
  /** `stem`, or the id of the part that it stands under. */
  place: z.string().max(40).default('stem'),
});
export type ItemFigure = z.infer<typeof itemFigureSchema>;

/** Simplifications that the stem states, so that the checker does not hold them against the item. */
export const ASSUMPTIONS = [
  'nonRelativistic',
  'stokesLaw',
  'noUpthrust',
  'noSlipCorrection',
  'uniformField',
  'fromRest',
] as const;

/** Things that the text claims, which the checker then holds on every draw. */
export const CLAIMS = ['beamClearsPlates', 'electronsEmitted', 'noElectronsEmitted'] as const;

export const itemContentSchema = z.object({
  schema: z.literal(ITEM_CONTENT_SCHEMA).default(ITEM_CONTENT_SCHEMA),
  title: z.string().trim().max(ITEM_LIMITS.titleLength),
  stem: printedText.default(''),
  script: z
    .string()
    .max(ITEM_LIMITS.scriptLength, 'A script may have at most 20,000 characters.')
    .default(''),
  quantities: z.array(quantitySchema).max(ITEM_LIMITS.quantities).default([]),
  parts: z.array(partSchema).max(ITEM_LIMITS.parts).default([]),
  figures: z.array(itemFigureSchema).max(ITEM_LIMITS.figures).default([]),
  assumptions: z.array(z.enum(ASSUMPTIONS)).default([]),
  claims: z.array(z.enum(CLAIMS)).default([]),
  /** Practical work prints the usual cautions with the item. */
  practical: z.boolean().default(false),
  /** The writer's reasons for cautions that stand, by finding key. */
  acceptedCautions: z.record(z.string().max(200), z.string().max(1_000)).default({}),
});
export type ItemContent = z.infer<typeof itemContentSchema>;

/** True for the parts whose answer is a number. */
export function isNumericPart(part: Part): part is NumericPart {
  return part.kind !== 'written';
}

/** The letter of the part at `index` (0 gives `a`). */
export function partLetter(index: number): string {
  return String.fromCharCode(97 + index);
}
