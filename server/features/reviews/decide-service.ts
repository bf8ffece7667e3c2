import type { Review } from '#shared/contracts/reviews.ts';
import { isNumericPart } from '#shared/engine/index.ts';
import { AppError } from '#shared/errors/app-error.ts';

import type { AppContext } from '../../context.ts';
import { inTransaction } from '../../db/client.ts';
import { demand } from '../../http/demand.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { queueMail } from '../../jobs/queue-mail.ts';
import { freshAssay, moveItem, nextState } from '../items/life-service.ts';
import { newestAssayOf, requireItem } from '../items/service.ts';
import { personById } from '../people/service.ts';
import { recordEvent } from '../records/record-event.ts';
import * as queries from './queries.ts';
import { loadReview, requireReview } from './service.ts';

interface Decision {
  decision: 'approved' | 'returned';
  reason: string;
  acceptedCautions: Record<string, string>;
}

/**
 * Approves or returns the revision. Before an approval the assay is run again when it is stale; blockers,
 * cautions without a reason, parts without a working and unsettled disputes refuse it (AppError notPossible).
 */
export async function decideReview(
  context: AppContext,
  actor: SignedIn,
  reviewId: number,
  wanted: Decision,
): Promise<Review> {
  const before = await requireReview(context.database, reviewId);
  demand(actor, 'review.decide', before.subject);
  if (wanted.decision === 'returned' && wanted.reason === '') {
    throw new AppError('invalid', 'Say why you return the item.', {
      fields: [{ path: 'reason', message: 'Say what the writer should change.' }],
    });
  }
  if (wanted.decision === 'approved') await freshAssay(context, actor, before.row.itemId);
  await inTransaction(context.database, async (tx) => {
    const { row, subject, content } = await requireReview(tx, reviewId, true);
    demand(actor, 'review.decide', subject);
    if (row.stage !== 'revealed') {
      throw new AppError('notPossible', 'Work every numeric part and look at the answers before you decide.');
    }
    const item = await requireItem(tx, row.itemId, true);
    const reasons = { ...content.acceptedCautions, ...wanted.acceptedCautions };
    const assay = await newestAssayOf(tx, row.revisionId);
    const findings = assay?.report.findings ?? [];
    const workings = await queries.selectWorkings(tx, reviewId);
    const newest = content.parts
      .filter(isNumericPart)
      .map((part) => workings.filter((one) => one.partId === part.id).at(-1));
    const { state, event } = nextState(
      item.state,
      wanted.decision === 'returned'
        ? { kind: 'return' }
        : {
            kind: 'approve',
            assayFresh: assay !== null && !assay.stale,
            blockers: findings.filter((one) => one.severity === 'blocker').length,
            openCautions: findings.filter(
              (one) => one.severity === 'caution' && (reasons[one.key] ?? '').trim() === '',
            ).length,
            unworkedParts: newest.filter((working) => working === undefined).length,
            disagreements: newest.filter(
              (working) => working !== undefined && !working.agrees && working.settledReason === null,
            ).length,
          },
    );
    const at = context.clock();
    await moveItem(tx, { itemId: item.id, revisionId: row.revisionId, state, at });
    await queries.updateReview(tx, reviewId, {
      stage: 'decided',
      decision: wanted.decision,
      decisionReason: wanted.reason,
      acceptedCautions: wanted.acceptedCautions,
      decidedAt: at,
    });
    const writer = await personById(tx, row.requestedById);
    await queueMail(tx, {
      kind: 'reviewDecided',
      person: writer,
      payload: { reviewId, itemCode: row.itemCode, decision: wanted.decision, decidedBy: actor.name },
      dedupeKey: `reviewDecided:${reviewId}`,
    });
    await recordEvent(tx, {
      event,
      actor,
      subjectType: 'item',
      subjectId: item.id,
      summary: `${wanted.decision === 'approved' ? 'Approved' : 'Returned'} ${row.itemCode} revision ${row.revision}.`,
      after: { reviewId, reason: wanted.reason, acceptedCautions: wanted.acceptedCautions },
    });
  });
  return loadReview(context, context.database, actor, reviewId);
}
