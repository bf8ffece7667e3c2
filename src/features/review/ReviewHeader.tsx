import { Link } from 'react-router';

import type { Review } from '#shared/contracts/reviews.ts';
import { countOf, formatDay } from '#src/lib/format.ts';

const STAGES: Readonly<Record<Review['stage'], string>> = {
  waiting: 'Waiting for a reviewer',
  working: 'Working, answers hidden',
  revealed: 'Answers shown',
  decided: 'Decided',
};
const DECISIONS = {
  approved: 'Approved',
  returned: 'Returned to the writer',
  recalled: 'Taken back by the writer',
} as const;

/** What is under review, at which stage, for whom and until when; and the writer's note. */
export function ReviewHeader({ review, itemPath }: { review: Review; itemPath: string | null }) {
  const stage = review.decision === null ? STAGES[review.stage] : DECISIONS[review.decision];
  return (
    <header className="mb-6">
      <h1 className="text-xl font-semibold">
        <span className="font-mono text-base font-normal text-muted">{review.itemCode}</span>{' '}
        {review.itemTitle}
      </h1>
      <p className="flex flex-wrap items-baseline gap-x-4 text-sm">
        <span>{stage}</span>
        <span className="text-muted">Revision {review.revision}</span>
        <span className="text-muted">{review.topic.name}</span>
        <span className="text-muted">{countOf(review.marks, 'mark')}</span>
        <span className="text-muted">
          sent by {review.requestedBy.name}, {formatDay(review.requestedAt)}
        </span>
        {itemPath !== null && (
          <Link className="link" to={itemPath}>
            Open on the bench
          </Link>
        )}
        {review.dueOn !== null && <span>wanted by {formatDay(review.dueOn)}</span>}
      </p>
      {review.note !== '' && <p className="mt-2 max-w-prose">{review.note}</p>}
      {review.decision !== null && review.decisionReason !== '' && (
        <p className="notice">
          <span className="font-semibold">{stage}.</span> {review.decisionReason}
        </p>
      )}
    </header>
  );
}
