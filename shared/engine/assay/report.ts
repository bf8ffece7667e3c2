import { z } from 'zod';

/** The ten checks of an assay, in the order they are told. */
export const CHECKS = [
  'defined',
  'limits',
  'laws',
  'validity',
  'dependence',
  'routes',
  'uniqueness',
  'band',
  'variety',
  'print',
] as const;
export type Check = (typeof CHECKS)[number];

export const SEVERITIES = ['blocker', 'caution', 'note'] as const;
export type Severity = (typeof SEVERITIES)[number];

const spanSchema = z.object({
  start: z.number(),
  end: z.number(),
  line: z.number(),
  column: z.number(),
});

/** Where a finding points: a stretch of the script, a part, a quantity, or a text with a hole in it. */
const findingPlaceSchema = z.object({
  span: spanSchema.optional(),
  partId: z.string().optional(),
  quantity: z.string().optional(),
  field: z.string().optional(),
});

const findingSchema = z.object({
  /** Stable name of the finding within an item, by which a caution is accepted. */
  key: z.string(),
  check: z.enum(CHECKS),
  code: z.string(),
  severity: z.enum(SEVERITIES),
  /** One sentence with numbers and units. */
  statement: z.string(),
  /** What would cure it, one sentence; empty when nothing need be done. */
  cure: z.string(),
  place: findingPlaceSchema,
  worstDraw: z.number().nullable(),
  otherDraws: z.array(z.number()).max(5),
  /** How many of the assayed draws show it. */
  drawCount: z.number(),
});
export type Finding = z.infer<typeof findingSchema>;

/** A value's spread over the assayed draws, in the printed unit. */
const distributionSchema = z.object({
  name: z.string(),
  unit: z.string(),
  least: z.number(),
  median: z.number(),
  greatest: z.number(),
  /** Counts in equal bins from least to greatest. */
  bins: z.array(z.number()),
});
export type Distribution = z.infer<typeof distributionSchema>;

/** One mark on a scale strip; relative errors are fractions of the model answer (0.02 is 2 %). */
const stripMarkSchema = z.object({
  kind: z.enum(['route', 'slip', 'nearMiss']),
  label: z.string(),
  /** Closest approach to the model answer over the draws. */
  relativeError: z.number(),
  /** Furthest from the model answer over the draws. */
  furthest: z.number(),
  draw: z.number(),
  insideBand: z.boolean(),
});
export type StripMark = z.infer<typeof stripMarkSchema>;

/** What the scale strip of one numeric part shows. */
const partScaleSchema = z.object({
  partId: z.string(),
  quantity: z.string(),
  unit: z.string(),
  /** Narrowest band over the draws, as relative errors below and above the model answer. */
  band: z.object({ below: z.number(), above: z.number() }),
  /** Extremes of the rounding routes, as relative errors (signed). */
  routeSpread: z.object({ below: z.number(), above: z.number() }),
  /** The worst route in words a candidate would use; empty when no route moves the answer. */
  worstRoute: z.string(),
  worstRouteDraw: z.number().nullable(),
  marks: z.array(stripMarkSchema),
  /** The narrowest tidy band, percent, and how the writer's own compares. */
  recommended: z.object({
    percent: z.number().nullable(),
    verdict: z.enum(['sound', 'tooTight', 'wide', 'impossible']),
    reason: z.string(),
  }),
  /** Percent by which the answer changes for one percent in each printed value, the median over some draws. */
  sensitivities: z.array(z.object({ name: z.string(), percent: z.number() })).optional(),
  /** Chance that of two draws the answer to one earns the mark of the other; null for a single draw. */
  sharedAnswers: z.number().nullable().optional(),
});
export type PartScale = z.infer<typeof partScaleSchema>;

export const assayReportSchema = z.object({
  engineVersion: z.string(),
  /** Hash of everything in the item that the assay reads. */
  contentHash: z.string(),
  gridSize: z.number(),
  exhaustive: z.boolean(),
  drawsAssayed: z.number(),
  drawsDiscarded: z.number(),
  /** As "all 4,320 draws" or "20,000 of 3.1 × 10^9; fewer than 1 in 6,600 fails, 95 % confidence". */
  coverage: z.string(),
  findings: z.array(findingSchema),
  distributions: z.array(distributionSchema),
  scales: z.array(partScaleSchema),
});
export type AssayReport = z.infer<typeof assayReportSchema>;

/** The most serious severity among the findings, or null for none. */
export function worstSeverity(findings: readonly Finding[]): Severity | null {
  return SEVERITIES.find((severity) => findings.some((finding) => finding.severity === severity)) ?? null;
}
