import type { Review, ReviewStage } from '#shared/contracts/reviews.ts';
import { isNumericPart } from '#shared/engine/index.ts';
import { AppError } from '#shared/errors/app-error.ts';

import type { AppContext } from '../../context.ts';
import { inTransaction } from '../../db/client.ts';
import { demand } from '../../http/demand.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { queueMail } from '../../jobs/queue-mail.ts';
import { freshAssay } from '../items/assay-service.ts';
import { moveItem, nextState } from '../items/life-service.ts';
import { newestAssayOf, requireItem } from '../items/service.ts';
import { personById } from '../people/service.ts';
import { recordEvent } from '../records/record-event.ts';
import * as queries from './queries.ts';
import { currentWorkings, getReview, requireReview } from './reading-service.ts';

interface Decision {
  decision: 'approved' | 'returned';
  reason: string;
  acceptedCautions: Record<string, string>;
}

/** An item can come back as soon as somebody works it: one that cannot be worked must. */
function demandDecidable(stage: ReviewStage, decision: Decision['decision']): void {
  if (stage === 'revealed' || (stage === 'working' && decision === 'returned')) return;
  throw new AppError(
    'notPossible',
    stage === 'decided'
      ? 'This review is over.'
      : 'Work every numeric part and look at the answers before you decide.',
  );
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
  demandDecidable(before.row.stage, wanted.decision);
  if (wanted.decision === 'approved') await freshAssay(context, actor, before.row.itemId);
  await inTransaction(context.database, async (tx) => {
    // The item first, as everything else that changes its state locks it, so that no two wait for each other.
    const item = await requireItem(tx, before.row.itemId, true);
    const { row, subject, content } = await requireReview(tx, reviewId, true);
    demand(actor, 'review.decide', subject);
    demandDecidable(row.stage, wanted.decision);
    const accepted = Object.fromEntries(
      Object.entries(wanted.acceptedCautions)
        .map(([key, reason]) => [key, reason.trim()] as const)
        .filter(([, reason]) => reason !== ''),
    );
    const reasons: Record<string, string> = { ...content.acceptedCautions, ...accepted };
    const assay = await newestAssayOf(tx, row.revisionId);
    const findings = assay?.report.findings ?? [];
    const workings = await currentWorkings(tx, row);
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
      acceptedCautions: accepted,
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
      after: { reviewId, reason: wanted.reason, acceptedCautions: accepted },
    });
  });
  return getReview(context, actor, reviewId);
}
