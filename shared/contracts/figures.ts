import { z } from 'zod';

import { endpoint, idParam, instant } from './endpoint.ts';
import { personNameSchema } from './people.ts';

export const FIGURE_MAX_BYTES = 4 * 1024 * 1024;
export const FIGURE_TYPES = ['image/png', 'image/jpeg', 'image/svg+xml'] as const;

export const figureSchema = z.object({
  id: z.number().int(),
  itemId: z.number().int(),
  fileName: z.string(),
  mediaType: z.enum(FIGURE_TYPES),
  byteLength: z.number().int(),
  width: z.number(),
  height: z.number(),
  addedBy: personNameSchema,
  createdAt: instant,
});
export type Figure = z.infer<typeof figureSchema>;

export const listFigures = endpoint('GET', '/api/items/:itemId/figures', {
  params: z.object({ itemId: idParam }),
  response: z.object({ figures: z.array(figureSchema) }),
});

/** multipart/form-data with one field `file`; the content decides the type, not the name. */
export const uploadFigure = endpoint('POST', '/api/items/:itemId/figures', {
  params: z.object({ itemId: idParam }),
  response: figureSchema,
});

/** The picture itself (not JSON). */
export const getFigureContent = endpoint('GET', '/api/figures/:figureId/content', {
  params: z.object({ figureId: idParam }),
  response: z.unknown(),
});
