import { and, eq, inArray } from 'drizzle-orm';

import type { FigureFacts, ItemContent } from '#shared/engine/index.ts';
import type { StoredFigure } from '#shared/sheet/build-item.ts';

import type { Connection } from '../../db/client.ts';
import { figures } from '../../db/schema/index.ts';

const idsOf = (content: ItemContent): number[] => content.figures.map((figure) => figure.figureId);

/** The pictures that a content shows, as the sheet needs them. */
export async function storedFigures(connection: Connection, content: ItemContent): Promise<StoredFigure[]> {
  const ids = idsOf(content);
  if (ids.length === 0) return [];
  const rows = await connection.select().from(figures).where(inArray(figures.id, ids));
  return rows.map((row) => ({
    figureId: row.id,
    mediaType: row.mediaType,
    svg: row.mediaType === 'image/svg+xml' ? row.content.toString('utf8') : null,
    width: row.width,
    height: row.height,
  }));
}

/** What the assay is told of them. */
export async function figureFacts(connection: Connection, content: ItemContent): Promise<FigureFacts[]> {
  return (await storedFigures(connection, content)).map(({ figureId, svg }) => ({ figureId, svg }));
}

/** Ids of figures that a content shows although they are none of the item's own. */
export async function foreignFigures(
  connection: Connection,
  itemId: number,
  content: ItemContent,
): Promise<Set<number>> {
  const ids = idsOf(content);
  if (ids.length === 0) return new Set();
  const own = await connection
    .select({ id: figures.id })
    .from(figures)
    .where(and(eq(figures.itemId, itemId), inArray(figures.id, ids)));
  const known = new Set(own.map((row) => row.id));
  return new Set(ids.filter((id) => !known.has(id)));
}

/** A bitmap as it was stored; `sha256` is that of its bytes. */
export interface StoredBitmap {
  mediaType: string;
  bytes: Uint8Array;
  sha256: string;
}

/** The bitmaps among these figures, by id; SVG stands in the sheet itself. */
export async function bitmapsOf(
  connection: Connection,
  ids: readonly number[],
): Promise<Map<number, StoredBitmap>> {
  if (ids.length === 0) return new Map();
  const rows = await connection
    .select({
      id: figures.id,
      bytes: figures.content,
      mediaType: figures.mediaType,
      sha256: figures.sha256,
    })
    .from(figures)
    .where(and(inArray(figures.id, [...ids]), inArray(figures.mediaType, ['image/png', 'image/jpeg'])));
  return new Map(rows.map(({ id, ...bitmap }) => [id, bitmap]));
}
