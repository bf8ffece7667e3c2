import type { StoredAssay } from '#shared/contracts/items.ts';
import { type ItemContent, worstSeverity } from '#shared/engine/index.ts';

import type { AppContext } from '../../context.ts';
import { inTransaction } from '../../db/client.ts';
import { demand } from '../../http/demand.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { figureFacts } from '../figures/stored-figures.ts';
import { recordEvent } from '../records/record-event.ts';
import { isFresh, presentAssay } from './present.ts';
import * as queries from './queries.ts';
import { readContent, requireItem, requireRevision, subjectOf } from './service.ts';
import { insertAssay } from './writing-queries.ts';

/** Assays the content of a revision in the pool, outside any transaction. */
async function runAssay(context: AppContext, content: ItemContent) {
  const figures = await figureFacts(context.database, content);
  const started = performance.now();
  const report = await context.engine.assay(content, { figures });
  return { report, durationMs: Math.round((performance.now() - started) * 10) / 10 };
}

/**
 * Runs the full assay on the latest revision and keeps it with the content that it was run on; when the draft
 * has moved meanwhile, the reply says that it is stale.
 */
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
    await insertAssay(tx, {
      itemId: item.id,
      revisionId: revision.id,
      report,
      durationMs,
      requestedById: actor.id,
      worst: worstSeverity(report.findings),
      at: context.clock(),
    });
    const stored = await queries.selectNewestAssay(tx, revision.id);
    if (stored === null) throw new Error('The assay is gone within its transaction.');
    const now = await requireRevision(tx, revision.id);
    await recordEvent(tx, {
      event: 'item.assayed',
      actor,
      subjectType: 'item',
      subjectId: item.id,
      summary: `Assayed ${item.code} revision ${revision.number}: ${report.findings.length} findings.`,
    });
    return presentAssay(stored, now.contentHash);
  });
}

/** Assays the latest revision unless that was done and nothing has moved since; keeps the result. */
export async function freshAssay(context: AppContext, actor: SignedIn, itemId: number): Promise<void> {
  const item = await requireItem(context.database, itemId);
  const revision = await requireRevision(context.database, item.latestRevisionId);
  const stored = await queries.selectNewestAssay(context.database, revision.id);
  if (isFresh(stored, revision.contentHash)) return;
  const { report, durationMs } = await runAssay(context, readContent(revision));
  await inTransaction(context.database, async (tx) => {
    await requireItem(tx, itemId, true);
    await insertAssay(tx, {
      itemId,
      revisionId: revision.id,
      report,
      durationMs,
      requestedById: actor.id,
      worst: worstSeverity(report.findings),
      at: context.clock(),
    });
  });
}
