import { and, desc, eq } from 'drizzle-orm';

import type { Figure } from '#shared/contracts/figures.ts';
import { AppError } from '#shared/errors/app-error.ts';

import type { AppContext } from '../../context.ts';
import { type Connection, inTransaction } from '../../db/client.ts';
import { sha256 } from '../../db/columns.ts';
import { figures, people } from '../../db/schema/index.ts';
import { demand } from '../../http/demand.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { isReviewerOf, readContent, requireItem, requireRevision, subjectOf } from '../items/service.ts';
import { recordEvent } from '../records/record-event.ts';

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

/** Every picture that was ever added to the item, the newest first. */
export async function listFigures(context: AppContext, actor: SignedIn, itemId: number) {
  const item = await requireItem(context.database, itemId);
  demand(actor, 'item.read', await subjectOf(context.database, item, actor.id));
  return { figures: (await selectFigures(context.database, itemId)).map(present) };
}

/**
 * Stores a picture with the item; the same picture twice is one, and none is ever removed. Throws AppError
 * unsupportedFile or tooLarge, and then nothing is stored.
 */
export async function addFigure(
  context: AppContext,
  actor: SignedIn,
  itemId: number,
  file: { name: string; bytes: Uint8Array },
  signal?: AbortSignal,
): Promise<Figure> {
  const before = await requireItem(context.database, itemId);
  demand(actor, 'item.edit', await subjectOf(context.database, before, actor.id));
  const verdict = await context.pictures.inspect(file.bytes, signal === undefined ? {} : { signal });
  if (!verdict.usable) throw new AppError(verdict.code, verdict.reason);
  const { picture } = verdict;
  const content = Buffer.from(picture.bytes);
  const hash = sha256(content);
  return inTransaction(context.database, async (tx) => {
    const item = await requireItem(tx, itemId, true);
    demand(actor, 'item.edit', await subjectOf(tx, item, actor.id));
    const [known] = await selectFigures(tx, itemId, hash);
    if (known !== undefined) return present(known);
    await tx.insert(figures).values({
      itemId,
      sha256: hash,
      mediaType: picture.mediaType,
      content,
      byteLength: content.length,
      width: picture.width,
      height: picture.height,
      originalName: file.name.slice(0, 255),
      addedById: actor.id,
    });
    const [stored] = await selectFigures(tx, itemId, hash);
    if (stored === undefined) throw new Error('The figure is gone within its transaction.');
    await recordEvent(tx, {
      event: 'figure.added',
      actor,
      subjectType: 'item',
      subjectId: itemId,
      summary: `Added a figure to ${item.code}.`,
      after: { sha256: hash, mediaType: picture.mediaType },
    });
    return present(stored);
  });
}

/**
 * Lets a person see a picture who may open its item, or who reviews it and finds it on the sheet. An SVG before
 * its holes are filled names quantities of the script, so that the reviewer gets it only within the sheet.
 */
async function demandSight(
  context: AppContext,
  actor: SignedIn,
  figure: { id: number; itemId: number; mediaType: string },
): Promise<void> {
  const item = await requireItem(context.database, figure.itemId);
  const subject = await subjectOf(context.database, item, actor.id);
  const isReviewer = await isReviewerOf(context.database, item.latestRevisionId, actor.id);
  if (isReviewer && figure.mediaType !== 'image/svg+xml') {
    const { figures: shown } = readContent(await requireRevision(context.database, item.latestRevisionId));
    if (shown.some((one) => one.figureId === figure.id)) return;
  }
  demand(actor, 'item.read', subject);
}

/** The picture itself. */
export async function figureContent(
  context: AppContext,
  actor: SignedIn,
  figureId: number,
): Promise<{ bytes: Buffer; mediaType: string }> {
  const [figure] = await context.database
    .select({
      id: figures.id,
      content: figures.content,
      mediaType: figures.mediaType,
      itemId: figures.itemId,
    })
    .from(figures)
    .where(eq(figures.id, figureId));
  if (figure === undefined) throw new AppError('notFound', 'There is no such figure.');
  await demandSight(context, actor, figure);
  return { bytes: figure.content, mediaType: figure.mediaType };
}
