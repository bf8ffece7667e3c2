import type { Item, ItemQuery, StoredAssay } from '#shared/contracts/items.ts';
import { itemTransition } from '#shared/domain/item-life.ts';
import { permit, type Subject } from '#shared/domain/permissions.ts';
import { assayedHash, type ItemContent, itemContentSchema } from '#shared/engine/index.ts';
import { AppError, type FieldProblem } from '#shared/errors/app-error.ts';
import { cautionsFor } from '#shared/sheet/cautions.ts';

import type { AppContext } from '../../context.ts';
import { type Connection, inTransaction, type Transaction } from '../../db/client.ts';
import { takeNumber } from '../../db/take-number.ts';
import { demand } from '../../http/demand.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { tellingCurrent } from '../../http/telling-current.ts';
import { foreignFigures } from '../figures/stored-figures.ts';
import { recordEvent } from '../records/record-event.ts';
import { topicById } from '../topics/service.ts';
import { selectItemPage } from './list-queries.ts';
import { presentAssay, presentItem, presentRevision, presentRow } from './present.ts';
import * as queries from './queries.ts';
import { searchText } from './search-text.ts';
import * as writing from './writing-queries.ts';

/** What ownership rules ask about an item. */
export async function subjectOf(
  connection: Connection,
  item: Pick<queries.ItemRecord, 'id' | 'ownerId'>,
  actorId: number,
): Promise<Subject> {
  return {
    ownerId: item.ownerId,
    authorIds: await queries.selectAuthorIds(connection, item.id),
    workingBlind: await queries.isWorkingBlind(connection, item.id, actorId),
  };
}

/** The item's row; throws AppError notFound. */
export async function requireItem(
  connection: Connection,
  itemId: number,
  lock = false,
): Promise<queries.ItemRecord & { latestRevisionId: number }> {
  const item = await queries.selectItem(connection, itemId, lock);
  if (item?.latestRevisionId == null) throw new AppError('notFound', 'There is no such item in the bank.');
  return { ...item, latestRevisionId: item.latestRevisionId };
}

/** One revision; throws AppError notFound. */
export async function requireRevision(
  connection: Connection,
  revisionId: number,
): Promise<queries.RevisionRow> {
  const revision = await queries.selectRevision(connection, revisionId);
  if (revision === null) throw new AppError('notFound', 'There is no such revision of this item.');
  return revision;
}

/** Stored content in today's form. */
export function readContent(revision: Pick<queries.RevisionRow, 'content'>): ItemContent {
  return itemContentSchema.parse(revision.content);
}

export const authorIdsOf = queries.selectAuthorIds;
export const authorIdsOfItems = queries.selectAuthorsOfItems;
export const isReviewerOf = queries.isReviewerOf;

/** The newest assay of a revision with whether it is stale; null when there is none. */
export async function newestAssayOf(connection: Connection, revisionId: number): Promise<StoredAssay | null> {
  const assay = await queries.selectNewestAssay(connection, revisionId);
  if (assay === null) return null;
  const revision = await requireRevision(connection, revisionId);
  return presentAssay(assay, revision.contentHash);
}

/** The approved revision before `number`, to show what has changed since; null for a first one. */
export async function previousApproved(
  connection: Connection,
  itemId: number,
  number: number,
): Promise<{ revision: number; content: ItemContent } | null> {
  const earlier = (await queries.selectRevisions(connection, itemId)).find(
    (row) => row.number < number && row.state === 'approved',
  );
  return earlier === undefined ? null : { revision: earlier.number, content: readContent(earlier) };
}

export async function listItems(context: AppContext, actor: SignedIn, query: ItemQuery) {
  const viewer = { id: actor.id, opensItems: permit(actor, 'item.read').allowed };
  const { rows, total } = await selectItemPage(context.database, query, viewer);
  const maySeePapers = permit(actor, 'paper.list').allowed;
  return {
    rows: rows.map((row) => presentRow(row, maySeePapers)),
    total,
    page: query.page,
    pageSize: query.pageSize,
  };
}

/** Cautions by words and values; by words alone while the engine cannot answer. */
async function cautionsOf(context: AppContext, content: ItemContent): Promise<string[]> {
  try {
    return await context.engine.cautions(content);
  } catch (error) {
    if (error instanceof AppError) return cautionsFor(content, null, null);
    throw error;
  }
}

/** The whole item as this person may see it. */
export async function getItem(context: AppContext, actor: SignedIn, itemId: number): Promise<Item> {
  const { database } = context;
  const item = await requireItem(database, itemId);
  const subject = await subjectOf(database, item, actor.id);
  demand(actor, 'item.read', subject);
  const revision = await requireRevision(database, item.latestRevisionId);
  const content = readContent(revision);
  return presentItem({
    item,
    revision,
    content,
    approved:
      item.approvedRevisionId === null
        ? null
        : await queries.selectRevision(database, item.approvedRevisionId),
    assay: await queries.selectNewestAssay(database, revision.id),
    review: await queries.selectReviewOf(database, revision.id),
    returnReason: await queries.selectReturnReason(database, itemId),
    cautions: await cautionsOf(context, content),
    actor,
    subject,
  });
}

/** Stores a new item with an empty first revision, coded by its topic and the next number. */
export async function createItem(
  context: AppContext,
  actor: SignedIn,
  wanted: { title: string; topicId: number },
  content: ItemContent = itemContentSchema.parse({ title: wanted.title }),
  origin: 'written' | 'demo' = 'written',
): Promise<{ id: number; code: string }> {
  return inTransaction(context.database, async (tx) => {
    demand(actor, 'item.create');
    const topic = await topicById(tx, wanted.topicId);
    const number = await takeNumber(tx, `item:${topic.code}`);
    const code = `${topic.code}-${String(number).padStart(3, '0')}`;
    const { itemId } = await writing.insertItem(tx, {
      code,
      topicId: topic.id,
      ownerId: actor.id,
      content,
      contentHash: assayedHash(content),
      searchText: searchText(code, content),
      origin,
    });
    await recordEvent(tx, {
      event: 'item.created',
      actor,
      subjectType: 'item',
      subjectId: itemId,
      summary: `Began ${code}.`,
    });
    return { id: itemId, code };
  });
}

/** Insists that the draft is the one that the person looked at; throws AppError conflict. */
export function demandVersion(revision: queries.RevisionRow, version: number): void {
  if (revision.version !== version) {
    throw new AppError(
      'conflict',
      'This draft was changed elsewhere since you opened it. Compare the two; nothing of either is lost.',
    );
  }
}

/** What no schema can see of a content by itself. Throws AppError invalid with the fields' problems. */
async function demandSoundContent(tx: Transaction, itemId: number, content: ItemContent): Promise<void> {
  const ids = content.parts.map((part) => part.id);
  const problems: FieldProblem[] = ids.flatMap((id, index) =>
    ids.indexOf(id) === index
      ? []
      : [{ path: `content.parts.${index}.id`, message: 'Another part has this id already.' }],
  );
  const foreign = await foreignFigures(tx, itemId, content);
  content.figures.forEach(({ figureId }, index) => {
    if (!foreign.has(figureId)) return;
    problems.push({
      path: `content.figures.${index}.figureId`,
      message: 'This figure does not belong to the item. Add the picture to this item first.',
    });
  });
  if (problems.length > 0) {
    throw new AppError('invalid', problems[0]?.message ?? '', { fields: problems });
  }
}

/**
 * Saves the draft. Throws AppError conflict (with the item as stored) when the version is stale, notPossible
 * when the item is not being drafted, and invalid for parts that share an id or figures of another item;
 * nothing is changed then.
 */
export async function saveDraft(
  context: AppContext,
  actor: SignedIn,
  itemId: number,
  wanted: { version: number; content: ItemContent; topicId?: number | undefined },
): Promise<{ version: number; savedAt: string }> {
  const save = async (tx: Transaction) => {
    const item = await requireItem(tx, itemId, true);
    demand(actor, 'item.edit', await subjectOf(tx, item, actor.id));
    const revision = await requireRevision(tx, item.latestRevisionId);
    demandVersion(revision, wanted.version);
    const transition = itemTransition(revision.state, { kind: 'edit' });
    if (!transition.possible) throw new AppError('notPossible', transition.reason);
    if (transition.newRevision) {
      throw new AppError(
        'notPossible',
        'This revision can no longer be edited. Start a new one; papers keep the revision that they took.',
      );
    }
    await demandSoundContent(tx, itemId, wanted.content);
    const topicId = wanted.topicId === undefined ? item.topicId : (await topicById(tx, wanted.topicId)).id;
    const at = context.clock();
    await writing.updateDraft(tx, {
      itemId,
      revisionId: revision.id,
      version: revision.version,
      content: wanted.content,
      contentHash: assayedHash(wanted.content),
      searchText: searchText(item.code, wanted.content),
      topicId,
      personId: actor.id,
      at,
    });
    return { version: revision.version + 1, savedAt: at.toISOString() };
  };
  return tellingCurrent(
    () => inTransaction(context.database, save),
    () => getItem(context, actor, itemId),
  );
}

export async function listRevisions(context: AppContext, actor: SignedIn, itemId: number) {
  const item = await requireItem(context.database, itemId);
  demand(actor, 'item.read', await subjectOf(context.database, item, actor.id));
  return { revisions: (await queries.selectRevisions(context.database, itemId)).map(presentRevision) };
}

export async function getRevision(context: AppContext, actor: SignedIn, itemId: number, number: number) {
  const item = await requireItem(context.database, itemId);
  demand(actor, 'item.read', await subjectOf(context.database, item, actor.id));
  const revision = (await queries.selectRevisions(context.database, itemId)).find(
    (row) => row.number === number,
  );
  if (revision === undefined) throw new AppError('notFound', 'There is no such revision of this item.');
  const assay = await queries.selectNewestAssay(context.database, revision.id);
  return {
    ...presentRevision(revision),
    content: readContent(revision),
    assay: assay === null ? null : presentAssay(assay, revision.contentHash),
  };
}
