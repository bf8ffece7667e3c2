import type { Item, ItemQuery, StoredAssay } from '#shared/contracts/items.ts';
import { permit, type Subject } from '#shared/domain/permissions.ts';
import { assayedHash, type ItemContent, itemContentSchema, worstSeverity } from '#shared/engine/index.ts';
import { AppError } from '#shared/errors/app-error.ts';

import type { AppContext } from '../../context.ts';
import { type Connection, inTransaction } from '../../db/client.ts';
import { takeNumber } from '../../db/take-number.ts';
import { demand } from '../../http/demand.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { figureFacts } from '../figures/service.ts';
import { recordEvent } from '../records/record-event.ts';
import { topicById } from '../topics/service.ts';
import { presentAssay, presentItem, presentRevision, presentRow } from './present.ts';
import * as queries from './queries.ts';

/** Every text of the item that a search looks through. */
export function searchText(code: string, content: ItemContent): string {
  return [
    code,
    content.title,
    content.stem,
    ...content.parts.flatMap((part) => [part.text, ...part.scheme.map((line) => line.text)]),
    content.script,
  ].join('\n');
}

/** What ownership rules ask about an item. */
export async function subjectOf(
  connection: Connection,
  item: queries.ItemRecord,
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
export function readContent(revision: queries.RevisionRow): ItemContent {
  return itemContentSchema.parse(revision.content);
}

export const authorIdsOf = queries.selectAuthorIds;

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
  const { rows, total } = await queries.selectItemPage(context.database, query);
  const maySeePapers = permit(actor, 'paper.list').allowed;
  return {
    rows: rows.map((row) => presentRow(row, maySeePapers)),
    total,
    page: query.page,
    pageSize: query.pageSize,
  };
}

/** The whole item as this person may see it. */
export async function loadItem(connection: Connection, actor: SignedIn, itemId: number): Promise<Item> {
  const item = await requireItem(connection, itemId);
  const subject = await subjectOf(connection, item, actor.id);
  demand(actor, 'item.read', subject);
  const revision = await requireRevision(connection, item.latestRevisionId);
  const approved =
    item.approvedRevisionId === null
      ? null
      : await queries.selectRevision(connection, item.approvedRevisionId);
  return presentItem({
    item,
    revision,
    content: readContent(revision),
    approved,
    assay: await queries.selectNewestAssay(connection, revision.id),
    review: await queries.selectReviewOf(connection, revision.id),
    actor,
    subject,
  });
}

export const getItem = (context: AppContext, actor: SignedIn, itemId: number): Promise<Item> =>
  loadItem(context.database, actor, itemId);

/** Stores a new item with an empty first revision. */
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
    const { itemId } = await queries.insertItem(tx, {
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

/**
 * Saves the draft. Throws AppError conflict (with the item as stored) when the version is stale, and
 * notPossible when the item is not being drafted; nothing is changed then.
 */
export async function saveDraft(
  context: AppContext,
  actor: SignedIn,
  itemId: number,
  wanted: { version: number; content: ItemContent; topicId?: number | undefined },
): Promise<{ version: number; savedAt: string }> {
  return inTransaction(context.database, async (tx) => {
    const item = await requireItem(tx, itemId, true);
    demand(actor, 'item.edit', await subjectOf(tx, item, actor.id));
    const revision = await requireRevision(tx, item.latestRevisionId);
    if (revision.version !== wanted.version) {
      throw new AppError(
        'conflict',
        'This draft was changed elsewhere since you opened it. Compare the two.',
        {
          current: await loadItem(tx, actor, itemId),
        },
      );
    }
    if (revision.state !== 'drafting') {
      throw new AppError('notPossible', 'This revision can no longer be edited. Start a new one.');
    }
    const topicId = wanted.topicId === undefined ? item.topicId : (await topicById(tx, wanted.topicId)).id;
    const at = context.clock();
    await queries.updateDraft(tx, {
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
  });
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

/** Assays the content of a revision in the pool, outside any transaction. */
export async function runAssay(context: AppContext, content: ItemContent, signal?: AbortSignal) {
  const figures = await figureFacts(context.database, content);
  const started = performance.now();
  const report = await context.engine.assay(content, {
    figures,
    ...(signal === undefined ? {} : { signal }),
  });
  return { report, durationMs: Math.round((performance.now() - started) * 10) / 10 };
}

/** Runs the full assay on the latest revision and keeps it. Throws conflict when the draft moved meanwhile. */
export async function assayLatest(
  context: AppContext,
  actor: SignedIn,
  itemId: number,
): Promise<StoredAssay> {
  const before = await requireItem(context.database, itemId);
  demand(actor, 'item.assay', await subjectOf(context.database, before, actor.id));
  const revision = await requireRevision(context.database, before.latestRevisionId);
  const { report, durationMs } = await runAssay(context, readContent(revision));
  return inTransaction(context.database, async (tx) => {
    const item = await requireItem(tx, itemId, true);
    await queries.insertAssay(tx, {
      itemId: item.id,
      revisionId: revision.id,
      report,
      durationMs,
      requestedById: actor.id,
      worst: worstSeverity(report.findings),
      at: context.clock(),
    });
    await recordEvent(tx, {
      event: 'item.assayed',
      actor,
      subjectType: 'item',
      subjectId: item.id,
      summary: `Assayed ${item.code} revision ${revision.number}: ${report.findings.length} findings.`,
    });
    const stored = await queries.selectNewestAssay(tx, revision.id);
    if (stored === null) throw new Error('The assay is gone within its transaction.');
    const now = await requireRevision(tx, revision.id);
    return presentAssay(stored, now.contentHash);
  });
}
