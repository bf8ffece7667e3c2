import { z } from 'zod';

import { canonicalJson, itemContentSchema } from '#shared/engine/index.ts';
import { paperSchemeSchema, paperSheetSchema } from '#shared/sheet/model.ts';

import { sha256 } from '../../db/columns.ts';

/** Everything that a seal freezes. Raise `form` when the shape changes; old forms stay readable. */
export const sealedPaperSchema = z.object({
  form: z.literal(1),
  sheet: paperSheetSchema,
  scheme: paperSchemeSchema,
  items: z.array(
    z.object({
      code: z.string(),
      revision: z.number().int(),
      draw: z.number(),
      content: itemContentSchema,
      /** Bitmaps by their SHA-256; SVG stands in the sheet itself. */
      figures: z.array(z.object({ figureId: z.number().int(), mediaType: z.string(), base64: z.string() })),
    }),
  ),
});
export type SealedPaper = z.infer<typeof sealedPaperSchema>;

/** The canonical text of a paper (keys in order, no spaces) and the SHA-256 of it. */
export function sealText(paper: SealedPaper): { canonical: string; hash: string } {
  const canonical = canonicalJson(paper);
  return { canonical, hash: sha256(canonical) };
}

/** Opens a seal; `intact` tells whether the text still has the hash that was sealed. */
export function openSeal(canonical: string, hash: string): { paper: SealedPaper; intact: boolean } {
  return { paper: sealedPaperSchema.parse(JSON.parse(canonical)), intact: sha256(canonical) === hash };
}

/** Characters of the hash that are printed on each page. */
export const SHORT_HASH = 12;
