import { readFile } from 'node:fs/promises';
import { join } from 'node:path';

import { eq } from 'drizzle-orm';

import { isNumericPart, type ItemContent, itemContentSchema } from '#shared/engine/index.ts';
import type { AppContext } from '../../context.ts';
import { addFigure } from '../../features/figures/service.ts';
import { assayLatest } from '../../features/items/assay-service.ts';
import { recallItem, sendToReview, withdrawItem } from '../../features/items/life-service.ts';
import { createItem, getItem, saveDraft } from '../../features/items/service.ts';
import { decideReview } from '../../features/reviews/decide-service.ts';
import { getReview } from '../../features/reviews/reading-service.ts';
import { addWorking, claimReview, revealReview } from '../../features/reviews/service.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { projectFolder } from '../project-folder.ts';
import { items, reviews, revisions } from '../schema/index.ts';
import type { DemoItem } from './items/demo-item.ts';
import type { DemoRole } from './seed-people.ts';

type People = Record<DemoRole, SignedIn>;

async function addFigures(
  context: AppContext,
  writer: SignedIn,
  itemId: number,
  demo: DemoItem,
): Promise<ItemContent> {
  const figures: ItemContent['figures'] = [];
  for (const figure of demo.figures ?? []) {
    const bytes = await readFile(join(projectFolder(import.meta.url), 'public', 'figures', figure.file));
    const stored = await addFigure(
      context,
      writer,
      itemId,
      { name: figure.file, bytes },
      new AbortController().signal,
    );
    figures.push({
      figureId: stored.id,
      alternativeText: figure.alternativeText,
      caption: figure.caption ?? '',
      widthPercent: figure.widthPercent ?? 60,
      place: figure.place ?? 'stem',
    });
  }
  return itemContentSchema.parse({ ...demo.content, figures });
}

/** The reviewer works every numeric part of the claimed draw, from the mark scheme that the engine holds. */
async function workItem(
  context: AppContext,
  reviewer: SignedIn,
  reviewId: number,
  content: ItemContent,
): Promise<void> {
  const { draw } = await claimReview(context, reviewer, reviewId);
  const { scheme } = await context.engine.viewDraw(content, draw);
  for (const part of content.parts.filter(isNumericPart)) {
    const text = scheme.parts.find((candidate) => candidate.id === part.id)?.answer?.text;
    if (text !== undefined) await addWorking(context, reviewer, reviewId, { partId: part.id, text });
  }
  await revealReview(context, reviewer, reviewId);
}

/** Stands in review although the assay found blockers, as an item taken over from older files does. */
async function forceIntoReview(
  context: AppContext,
  people: People,
  itemId: number,
  remark: string,
): Promise<void> {
  const item = await getItem(context, people.writer, itemId);
  await context.database.transaction(async (tx) => {
    await tx
      .update(revisions)
      .set({ state: 'inReview', note: remark })
      .where(eq(revisions.id, item.revision.id));
    await tx.update(items).set({ state: 'inReview' }).where(eq(items.id, itemId));
    await tx.insert(reviews).values({
      itemId,
      revisionId: item.revision.id,
      requestedById: people.writer.id,
      draw: 1,
      note: remark,
    });
  });
}

async function send(
  context: AppContext,
  people: People,
  itemId: number,
  demo: DemoItem,
  toQueue = false,
): Promise<number> {
  const { revision } = await getItem(context, people.writer, itemId);
  const sent = await sendToReview(context, people.writer, itemId, {
    version: revision.version,
    note: demo.remark ?? '',
    reviewerId: toQueue ? null : people.reviewer.id,
    dueOn: null,
  });
  if (sent.reviewId === null) throw new Error(`${demo.content.title} has no review.`);
  return sent.reviewId;
}

/** Writes one demo item and leads it to its place in life. Returns its id and code. */
export async function seedItem(
  context: AppContext,
  people: People,
  topicId: number,
  demo: DemoItem,
): Promise<{ id: number; code: string }> {
  const { writer, reviewer } = people;
  const title = String(demo.content.title);
  const item = await createItem(
    context,
    writer,
    { title, topicId },
    itemContentSchema.parse({ title }),
    'demo',
  );
  const content = await addFigures(context, writer, item.id, demo);
  await saveDraft(context, writer, item.id, { version: 1, content });
  await assayLatest(context, writer, item.id);
  switch (demo.life) {
    case 'drafting':
      break;
    case 'faulty':
      await forceIntoReview(context, people, item.id, demo.remark ?? '');
      break;
    case 'waiting':
      await send(context, people, item.id, demo, true);
      break;
    case 'working': {
      const reviewId = await send(context, people, item.id, demo);
      await claimReview(context, reviewer, reviewId);
      break;
    }
    case 'withdrawn': {
      await send(context, people, item.id, demo);
      await recallItem(context, writer, item.id, 'Not needed any more.');
      await withdrawItem(context, writer, item.id, demo.remark ?? 'No longer needed.');
      break;
    }
    case 'returned':
    case 'approved': {
      const reviewId = await send(context, people, item.id, demo);
      await workItem(context, reviewer, reviewId, content);
      const { reveal } = await getReview(context, reviewer, reviewId);
      const cautions = reveal?.report.findings.filter((finding) => finding.severity === 'caution') ?? [];
      await decideReview(context, reviewer, reviewId, {
        decision: demo.life,
        reason:
          demo.life === 'returned'
            ? (demo.remark ?? 'Please look again.')
            : 'Worked through; all answers agree.',
        acceptedCautions: Object.fromEntries(
          cautions.map((finding) => [finding.key, 'Looked at with the writer and accepted.']),
        ),
      });
      break;
    }
  }
  return item;
}
