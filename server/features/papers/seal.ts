import { z } from 'zod';

import { canonicalJson, itemContentSchema } from '#shared/engine/index.ts';
import { paperSchemeSchema, paperSheetSchema } from '#shared/sheet/model.ts';

import { sha256 } from '../../db/columns.ts';

/**
 * Everything that a seal freezes: what prints (sheet with data sheet, mark scheme) and what it was made from.
 * Raise `form` when the shape changes; old forms stay readable.
 */
const sealedPaperSchema = z.object({
  form: z.literal(1),
  engineVersion: z.string(),
  sheet: paperSheetSchema,
  scheme: paperSchemeSchema,
  items: z.array(
    z.object({
      code: z.string(),
      revision: z.number().int(),
      draw: z.number(),
      content: itemContentSchema,
      /** Accepted intervals of the numeric parts, SI. */
      bands: z.array(
        z.object({ partId: z.string(), answerSI: z.number(), fromSI: z.number(), toSI: z.number() }),
      ),
      /** Bitmaps by the SHA-256 of their bytes, which are kept for ever; SVG stands in the sheet itself. */
      bitmaps: z.array(z.object({ figureId: z.number().int(), sha256: z.string() })),
    }),
  ),
});
export type SealedPaper = z.infer<typeof sealedPaperSchema>;

/** The canonical text of a paper (keys in order, no spaces) and the SHA-256 of it. */
export function sealText(paper: SealedPaper): { canonical: string; hash: string } {
  const canonical = canonicalJson(paper);
  return { canonical, hash: sha256(canonical) };
}

/** Whether the stored text still has the hash that was sealed. */
export const isIntact = (seal: { canonical: string; sha256: string }): boolean =>
  sha256(seal.canonical) === seal.sha256;

/** What was sealed; null when the text no longer has its hash, and then nothing of it may be trusted. */
export function openSeal(seal: { canonical: string; sha256: string }): SealedPaper | null {
  return isIntact(seal) ? sealedPaperSchema.parse(JSON.parse(seal.canonical)) : null;
}

/** Characters of the hash that are printed on each page. */
export const SHORT_HASH = 12;
