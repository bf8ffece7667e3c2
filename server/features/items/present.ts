import type { z } from 'zod';

import type { Item, ItemRow, revisionSummarySchema, StoredAssay } from '#shared/contracts/items.ts';
import { abilitiesFor, type Action, type Actor, type Subject } from '#shared/domain/permissions.ts';
import { ENGINE_VERSION, type ItemContent } from '#shared/engine/index.ts';

import type { assays } from '../../db/schema/index.ts';
import type { selectItemPage } from './list-queries.ts';
import type { ItemRecord, RevisionRow } from './queries.ts';

const ITEM_ACTIONS: readonly Action[] = [
  'item.read',
  'item.edit',
  'item.send',
  'item.recall',
  'item.assay',
  'item.withdraw',
];

type PageRow = Awaited<ReturnType<typeof selectItemPage>>['rows'][number];
type AssayRow = typeof assays.$inferSelect;

/**
 * A row of the bank. Where the item is used is told only to those who may see papers, findings not to those who
 * are to work the item independently.
 */
export function presentRow(row: PageRow, maySeePapers: boolean): ItemRow {
  const fresh = row.assayHash === row.contentHash && row.assayEngine === ENGINE_VERSION;
  return {
    id: row.id,
    code: row.code,
    title: row.title,
    topic: { id: row.topicId, code: row.topicCode, name: row.topicName },
    state: row.state,
    owner: { id: row.ownerId, name: row.ownerName },
    marks: row.marks,
    parts: row.parts,
    revision: row.revision,
    approvedRevision: row.approvedRevision,
    worstFinding: row.findingsHidden ? null : row.worstFinding,
    assayed: row.assayHash === null ? 'never' : fresh ? 'fresh' : 'stale',
    usedOn: maySeePapers ? row.usedOn : null,
    updatedAt: row.updatedAt.toISOString(),
  };
}

export function presentRevision(row: RevisionRow): z.infer<typeof revisionSummarySchema> {
  return {
    id: row.id,
    number: row.number,
    state: row.state,
    author: { id: row.authorId, name: row.authorName },
    createdAt: row.createdAt.toISOString(),
    updatedAt: row.updatedAt.toISOString(),
    note: row.note,
  };
}

/** Whether an assay still speaks of this content and this engine. */
export function isFresh(assay: AssayRow | null, contentHash: string): assay is AssayRow {
  return assay !== null && assay.contentHash === contentHash && assay.engineVersion === ENGINE_VERSION;
}

export function presentAssay(row: AssayRow, contentHash: string): StoredAssay {
  return {
    id: row.id,
    report: row.report,
    stale: !isFresh(row, contentHash),
    durationMs: row.durationMs,
    createdAt: row.createdAt.toISOString(),
  };
}

interface WholeItem {
  item: ItemRecord;
  revision: RevisionRow;
  content: ItemContent;
  approved: RevisionRow | null;
  assay: AssayRow | null;
  review: { id: number } | null;
  returnReason: string | null;
  cautions: string[];
  actor: Actor;
  subject: Subject;
}

/** An item as the bench opens it, with what this person may do to it. */
export function presentItem({
  item,
  revision,
  content,
  approved,
  assay,
  review,
  returnReason,
  cautions,
  actor,
  subject,
}: WholeItem): Item {
  return {
    id: item.id,
    code: item.code,
    topic: { id: item.topicId, code: item.topicCode, name: item.topicName },
    owner: { id: item.ownerId, name: item.ownerName },
    state: revision.state,
    revision: { ...presentRevision(revision), content, version: revision.version },
    approvedRevision: approved === null ? null : presentRevision(approved),
    reviewId: review?.id ?? null,
    // The reasons stay in sight while the next revision answers them.
    returnedBecause: ['returned', 'drafting'].includes(revision.state) ? returnReason : null,
    assay: assay === null ? null : presentAssay(assay, revision.contentHash),
    cautions,
    abilities: abilitiesFor(actor, ITEM_ACTIONS, subject),
  };
}
