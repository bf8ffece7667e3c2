import { and, desc, eq, inArray } from 'drizzle-orm';

import type { Figure } from '#shared/contracts/figures.ts';
import type { FigureFacts, ItemContent } from '#shared/engine/index.ts';
import { AppError } from '#shared/errors/app-error.ts';
import type { StoredFigure } from '#shared/sheet/build-item.ts';

import { sha256 } from '../../db/columns.ts';
import type { AppContext } from '../../context.ts';
import { type Connection, inTransaction } from '../../db/client.ts';
import { figures, items, people, reviews } from '../../db/schema/index.ts';
import { demand } from '../../http/demand.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { recordEvent } from '../records/record-event.ts';
import { inspectPicture } from './inspect-picture.ts';

const columns = {
  id: figures.id,
  itemId: figures.itemId,
  fileName: figures.originalName,
  mediaType: figures.mediaType,
  byteLength: figures.byteLength,
  width: figures.width,
  height: figures.height,
  createdAt: figures.createdAt,
  addedById: people.id,
  addedByName: people.name,
};

function selectFigures(connection: Connection, itemId: number, hash?: string) {
  return connection
    .select(columns)
    .from(figures)
    .innerJoin(people, eq(people.id, figures.addedById))
    .where(and(eq(figures.itemId, itemId), hash === undefined ? undefined : eq(figures.sha256, hash)))
    .orderBy(desc(figures.id));
}

function present(row: Awaited<ReturnType<typeof selectFigures>>[number]): Figure {
  const { addedById, addedByName, createdAt, ...figure } = row;
  return { ...figure, addedBy: { id: addedById, name: addedByName }, createdAt: createdAt.toISOString() };
}

async function ownerOf(
  connection: Connection,
  itemId: number,
  lock = false,
): Promise<{ ownerId: number; code: string }> {
  const select = connection
    .select({ ownerId: items.ownerId, code: items.code })
    .from(items)
    .where(eq(items.id, itemId));
  const [item] = await (lock ? select.for('update') : select);
  if (item === undefined) throw new AppError('notFound', 'There is no such item in the bank.');
  return item;
}

/** Every picture that was ever added to the item, the newest first. */
export async function listFigures(context: AppContext, actor: SignedIn, itemId: number) {
  const item = await ownerOf(context.database, itemId);
  demand(actor, 'item.read', { ownerId: item.ownerId });
  return { figures: (await selectFigures(context.database, itemId)).map(present) };
}

/** Stores a picture with the item; the same picture twice is one. Throws unsupportedFile or tooLarge. */
export async function addFigure(
  context: AppContext,
  actor: SignedIn,
  itemId: number,
  file: { name: string; bytes: Buffer },
): Promise<Figure> {
  const owner = await ownerOf(context.database, itemId);
  demand(actor, 'item.edit', { ownerId: owner.ownerId });
  const picture = inspectPicture(file.bytes);
  const hash = sha256(picture.bytes);
  return inTransaction(context.database, async (tx) => {
    const item = await ownerOf(tx, itemId, true);
    demand(actor, 'item.edit', { ownerId: item.ownerId });
    const [known] = await selectFigures(tx, itemId, hash);
    if (known !== undefined) return present(known);
    await tx.insert(figures).values({
      itemId,
      sha256: hash,
      mediaType: picture.mediaType,
      content: picture.bytes,
      byteLength: picture.bytes.length,
      width: picture.width,
      height: picture.height,
      originalName: file.name.slice(0, 255),
      addedById: actor.id,
    });
    await recordEvent(tx, {
      event: 'figure.added',
      actor,
      subjectType: 'item',
      subjectId: itemId,
      summary: `Added a figure to ${item.code}.`,
      after: { sha256: hash, mediaType: picture.mediaType },
    });
    const [stored] = await selectFigures(tx, itemId, hash);
    if (stored === undefined) throw new Error('The figure is gone within its transaction.');
    return present(stored);
  });
}

/** The picture itself. People who review the item may see it, as its candidates do. */
export async function figureContent(
  context: AppContext,
  actor: SignedIn,
  figureId: number,
): Promise<{ bytes: Buffer; mediaType: string }> {
  const [figure] = await context.database
    .select({ content: figures.content, mediaType: figures.mediaType, itemId: figures.itemId })
    .from(figures)
    .where(eq(figures.id, figureId));
  if (figure === undefined) throw new AppError('notFound', 'There is no such figure.');
  const [mine] = await context.database
    .select({ id: reviews.id })
    .from(reviews)
    .where(and(eq(reviews.itemId, figure.itemId), eq(reviews.reviewerId, actor.id)))
    .limit(1);
  if (mine === undefined) demand(actor, 'item.read');
  return { bytes: figure.content, mediaType: figure.mediaType };
}

/** The pictures that a content shows, as the sheet needs them. */
export async function storedFigures(connection: Connection, content: ItemContent): Promise<StoredFigure[]> {
  const ids = content.figures.map((figure) => figure.figureId);
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

/** Bytes of bitmaps, by id, for the exports. */
export async function figureBytes(
  connection: Connection,
  ids: readonly number[],
): Promise<Map<number, { bytes: Uint8Array; mediaType: string }>> {
  if (ids.length === 0) return new Map();
  const rows = await connection
    .select({ id: figures.id, content: figures.content, mediaType: figures.mediaType })
    .from(figures)
    .where(inArray(figures.id, [...ids]));
  return new Map(rows.map((row) => [row.id, { bytes: row.content, mediaType: row.mediaType }]));
}
