import type { DeskEntry, DeskReply } from '#shared/contracts/desk.ts';
import type { Role } from '#shared/domain/roles.ts';

import type { AppContext } from '../../context.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import {
  selectAssembling,
  selectOwnItems,
  selectReviewQueue,
  selectReviewsFor,
  selectToConfirm,
} from './queries.ts';

type Group = DeskReply['groups'][number];

function group<Row extends { total: number }>(
  name: Group['group'],
  rows: readonly Row[],
  entry: (row: Row) => DeskEntry,
): Group {
  return { group: name, total: rows[0]?.total ?? 0, entries: rows.map(entry) };
}

type OwnItem = Awaited<ReturnType<typeof selectOwnItems>>[number];
type ReviewEntry = Awaited<ReturnType<typeof selectReviewsFor>>[number];

function returnedEntry(row: OwnItem): DeskEntry {
  const byReviewer = row.decision === 'returned' && row.decidedBy !== null;
  return {
    path: `/items/${row.id}`,
    code: row.code,
    title: row.title,
    reason: byReviewer ? `returned by ${row.decidedBy}` : 'taken back from review',
    since: (row.decidedAt ?? row.updatedAt).toISOString(),
    dueOn: null,
  };
}

function draftEntry(row: OwnItem): DeskEntry {
  return {
    path: `/items/${row.id}`,
    code: row.code,
    title: row.title,
    reason: row.revision === 1 ? 'draft' : `draft of revision ${row.revision}`,
    since: row.updatedAt.toISOString(),
    dueOn: null,
  };
}

function reviewReason(row: ReviewEntry): string {
  if (row.stage === 'working') return 'your working is not finished';
  if (row.stage === 'revealed') return 'waits for your decision';
  return `sent to you by ${row.requestedBy}`;
}

function reviewEntry(row: ReviewEntry, reason: string): DeskEntry {
  return {
    path: `/reviews/${row.id}`,
    code: row.code,
    title: row.title,
    reason,
    since: (row.claimedAt ?? row.createdAt).toISOString(),
    dueOn: row.dueOn,
  };
}

/** What waits for one person, by the roles they hold: groups in the order they are read, empty ones included. */
export async function readDesk(context: AppContext, actor: SignedIn): Promise<Group[]> {
  const { database } = context;
  const holds = (...roles: Role[]) => roles.some((role) => actor.roles.includes(role));
  const groups: Group[] = [];
  if (holds('writer')) {
    groups.push(
      group('returnedToMe', await selectOwnItems(database, actor.id, 'returned'), returnedEntry),
      group('myDrafts', await selectOwnItems(database, actor.id, 'drafting'), draftEntry),
    );
  }
  if (holds('reviewer')) {
    groups.push(
      group('reviewsForMe', await selectReviewsFor(database, actor.id), (row) =>
        reviewEntry(row, reviewReason(row)),
      ),
      group('reviewQueue', await selectReviewQueue(database, actor.id), (row) =>
        reviewEntry(row, `sent by ${row.requestedBy}`),
      ),
    );
  }
  if (holds('setter')) {
    groups.push(
      group('papersAssembling', await selectAssembling(database), (row) => ({
        path: `/papers/${row.id}`,
        code: row.code,
        title: row.title,
        reason: row.places === 1 ? '1 item so far' : `${row.places} items so far`,
        since: row.updatedAt.toISOString(),
        dueOn: null,
      })),
    );
  }
  if (holds('setter', 'moderator')) {
    groups.push(
      group('papersToConfirm', await selectToConfirm(database, actor.id), (row) => ({
        path: `/papers/${row.id}`,
        code: row.code,
        title: row.title,
        reason: `proposed by ${row.proposedBy}`,
        since: (row.proposedAt ?? row.updatedAt).toISOString(),
        dueOn: null,
      })),
    );
  }
  return groups;
}
