import type { Item } from '#shared/contracts/items.ts';
import { type ItemAction, itemTransition } from '#shared/domain/item-life.ts';
import { AppError } from '#shared/errors/app-error.ts';

import type { AppContext } from '../../context.ts';
import { inTransaction, type Transaction } from '../../db/client.ts';
import { demand } from '../../http/demand.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { tellingCurrent } from '../../http/telling-current.ts';
import { queueMail } from '../../jobs/queue-mail.ts';
import { personById } from '../people/service.ts';
import { recordEvent } from '../records/record-event.ts';
import { freshAssay } from './assay-service.ts';
import { isFresh } from './present.ts';
import * as queries from './queries.ts';
import { demandVersion, getItem, readContent, requireItem, requireRevision, subjectOf } from './service.ts';
import * as writing from './writing-queries.ts';

/** Asks the item's life for the next state; throws AppError notPossible with the reason why not. */
export function nextState(state: Parameters<typeof itemTransition>[0], action: ItemAction) {
  const transition = itemTransition(state, action);
  if (!transition.possible) throw new AppError('notPossible', transition.reason);
  return transition;
}

/** Begins a new revision with a copy of the latest content. */
export async function startRevision(context: AppContext, actor: SignedIn, itemId: number): Promise<Item> {
  await inTransaction(context.database, async (tx) => {
    const item = await requireItem(tx, itemId, true);
    demand(actor, 'item.edit', await subjectOf(tx, item, actor.id));
    const revision = await requireRevision(tx, item.latestRevisionId);
    const { newRevision, event } = nextState(revision.state, { kind: 'edit' });
    if (newRevision) {
      await writing.insertRevision(tx, {
        itemId,
        number: revision.number + 1,
        authorId: actor.id,
        content: readContent(revision),
        contentHash: revision.contentHash,
      });
      await recordEvent(tx, {
        event,
        actor,
        subjectType: 'item',
        subjectId: itemId,
        summary: `Began revision ${revision.number + 1} of ${item.code}.`,
      });
    }
  });
  return getItem(context, actor, itemId);
}

/** Moves the item and its latest revision to a state that its life allows. */
export const moveItem = writing.updateState;

interface Sending {
  version: number;
  note: string;
  reviewerId: number | null;
  dueOn: string | null;
}

async function requireReviewer(
  tx: Transaction,
  reviewerId: number,
  subject: { authorIds?: readonly number[] },
) {
  const reviewer = await personById(tx, reviewerId);
  if (!reviewer.active || !reviewer.roles.includes('reviewer')) {
    throw new AppError('invalid', `${reviewer.name} is no reviewer.`, {
      fields: [{ path: 'reviewerId', message: 'Choose a reviewer, or send the item to the queue.' }],
    });
  }
  if (subject.authorIds?.includes(reviewerId)) {
    throw new AppError('invalid', `${reviewer.name} wrote some of this item.`, {
      fields: [{ path: 'reviewerId', message: 'Choose somebody who wrote none of it.' }],
    });
  }
  return reviewer;
}

/** Refuses what cannot be sent before an assay is run for it. */
async function demandSendable(
  context: AppContext,
  actor: SignedIn,
  itemId: number,
  version: number,
): Promise<void> {
  const item = await requireItem(context.database, itemId);
  demand(actor, 'item.send', await subjectOf(context.database, item, actor.id));
  const revision = await requireRevision(context.database, item.latestRevisionId);
  nextState(revision.state, { kind: 'send', assayFresh: true, blockers: 0 });
  await tellingCurrent(
    async () => demandVersion(revision, version),
    () => getItem(context, actor, itemId),
  );
}

/**
 * Sends the draft to a reviewer or to the queue. The assay is run first when it is stale; a blocker refuses.
 * Throws AppError conflict for a stale version.
 */
export async function sendToReview(
  context: AppContext,
  actor: SignedIn,
  itemId: number,
  sending: Sending,
): Promise<Item> {
  const send = async (tx: Transaction) => {
    const item = await requireItem(tx, itemId, true);
    const subject = await subjectOf(tx, item, actor.id);
    demand(actor, 'item.send', subject);
    const revision = await requireRevision(tx, item.latestRevisionId);
    demandVersion(revision, sending.version);
    const assay = await queries.selectNewestAssay(tx, revision.id);
    const { state, event } = nextState(revision.state, {
      kind: 'send',
      assayFresh: isFresh(assay, revision.contentHash),
      blockers: assay?.report.findings.filter((one) => one.severity === 'blocker').length ?? 0,
    });
    const reviewer =
      sending.reviewerId === null ? null : await requireReviewer(tx, sending.reviewerId, subject);
    const at = context.clock();
    await writing.updateState(tx, { itemId, revisionId: revision.id, state, note: sending.note, at });
    const reviewId = await writing.insertReview(tx, {
      itemId,
      revisionId: revision.id,
      requestedById: actor.id,
      reviewerId: sending.reviewerId,
      note: sending.note,
      dueOn: sending.dueOn,
    });
    if (reviewer !== null) {
      await queueMail(tx, {
        kind: 'reviewRequested',
        person: reviewer,
        payload: { reviewId, itemCode: item.code, requestedBy: actor.name, dueOn: sending.dueOn },
        dedupeKey: `reviewRequested:${reviewId}`,
      });
    }
    await recordEvent(tx, {
      event,
      actor,
      subjectType: 'item',
      subjectId: itemId,
      summary: `Sent ${item.code} revision ${revision.number} to ${reviewer?.name ?? 'the review queue'}.`,
    });
  };
  await demandSendable(context, actor, itemId, sending.version);
  await freshAssay(context, actor, itemId);
  await tellingCurrent(
    () => inTransaction(context.database, send),
    () => getItem(context, actor, itemId),
  );
  return getItem(context, actor, itemId);
}

/** Takes the item back from review; its review ends without a decision on the merits. */
export async function recallItem(
  context: AppContext,
  actor: SignedIn,
  itemId: number,
  reason: string,
): Promise<Item> {
  await inTransaction(context.database, async (tx) => {
    const item = await requireItem(tx, itemId, true);
    demand(actor, 'item.recall', await subjectOf(tx, item, actor.id));
    const revision = await requireRevision(tx, item.latestRevisionId);
    const { state, event } = nextState(revision.state, { kind: 'recall' });
    const at = context.clock();
    await writing.updateState(tx, { itemId, revisionId: revision.id, state, at });
    await writing.closeRecalledReview(tx, revision.id, reason, at);
    await recordEvent(tx, {
      event,
      actor,
      subjectType: 'item',
      subjectId: itemId,
      summary: `Took ${item.code} revision ${revision.number} back from review.`,
      after: { reason },
    });
  });
  return getItem(context, actor, itemId);
}

/** Withdraws the item: no new paper can take it. Papers that hold a revision keep it. */
export async function withdrawItem(
  context: AppContext,
  actor: SignedIn,
  itemId: number,
  reason: string,
): Promise<Item> {
  await inTransaction(context.database, async (tx) => {
    const item = await requireItem(tx, itemId, true);
    demand(actor, 'item.withdraw', await subjectOf(tx, item, actor.id));
    const revision = await requireRevision(tx, item.latestRevisionId);
    const { state, event } = nextState(revision.state, { kind: 'withdraw' });
    await writing.updateState(tx, {
      itemId,
      revisionId: revision.id,
      state,
      note: reason,
      at: context.clock(),
    });
    await recordEvent(tx, {
      event,
      actor,
      subjectType: 'item',
      subjectId: itemId,
      summary: `Withdrew ${item.code}.`,
      after: { reason },
    });
  });
  return getItem(context, actor, itemId);
}
