import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';

import type { Review } from '#shared/contracts/reviews.ts';
import { tell } from '#src/components/ui/notices.ts';
import { sentenceOf } from '#src/lib/api.ts';
import { reviewCalls, reviewQuery } from './api.ts';
import { CommentsPanel } from './CommentsPanel.tsx';
import { DecisionForm } from './DecisionForm.tsx';
import { ReviewHeader } from './ReviewHeader.tsx';
import { anchorsOf, ReviewReveal } from './ReviewReveal.tsx';
import { ReviewWorking } from './ReviewWorking.tsx';
import './review.css';
import type { ReviewSlots } from './slots.ts';

export interface ReviewDeskProps {
  review: Review;
  /** Where the item stands on the bench, for those who may open it there. */
  itemPath: string | null;
  /** Called when the review is given back and can no longer be open here. */
  onReleased: () => void;
  slots: ReviewSlots;
}

/** One review, from claiming it over one's own working and the reveal to the decision. */
export function ReviewDesk({ review, itemPath, onReleased, slots }: ReviewDeskProps) {
  const queries = useQueryClient();
  const [calls] = useState(() => reviewCalls(review.id));
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);
  const can = (ability: Review['abilities'][number]): boolean => review.abilities.includes(ability);

  /** Does something to the review and shows it as it then stands; rejects with a sentence. */
  const act = async (request: () => Promise<Review>): Promise<void> => {
    const next = await request();
    queries.setQueryData(reviewQuery(review.id).queryKey, next);
    void queries.invalidateQueries({ queryKey: ['reviews'] });
    void queries.invalidateQueries({ queryKey: ['desk'] });
  };
  /** The same for a plain button: a refusal is shown as a sentence under the header. */
  const press = (request: () => Promise<unknown>, after?: () => void): void => {
    setBusy(true);
    setProblem(null);
    request()
      .then(() => after?.())
      .catch((error: unknown) => setProblem(sentenceOf(error)))
      .finally(() => setBusy(false));
  };

  return (
    <div className="review">
      <ReviewHeader review={review} itemPath={itemPath} />
      {problem !== null && (
        <p role="alert" className="notice text-lead">
          {problem}
        </p>
      )}
      {review.stage === 'waiting' &&
        (can('review.claim') ? (
          <div className="grid max-w-prose gap-3">
            <p>
              Claim this review to see the sheet. You work every numeric part before the answers are shown,
              and the item itself stays closed to you until then.
            </p>
            <p>
              <button
                type="button"
                className="button button-primary"
                disabled={busy}
                onClick={() => press(() => act(calls.claim))}
              >
                Claim and begin
              </button>
            </p>
          </div>
        ) : (
          <p>Nobody has claimed this review yet.</p>
        ))}
      <div className={review.sheet === null ? undefined : 'review-columns'}>
        {review.sheet !== null && (
          <section aria-label="Sheet" className="review-sheet">
            <p className="mb-2 text-sm text-muted">Draw {review.draw.toLocaleString('en-GB')}</p>
            {slots.sheet(review.sheet)}
          </section>
        )}
        <div className="grid content-start gap-8">
          {review.stage === 'working' && can('review.work') && (
            <ReviewWorking
              review={review}
              busy={busy}
              onTry={(partId, text) => act(() => calls.work(partId, text))}
              onDispute={(partId) => press(() => act(() => calls.dispute(partId)))}
              onReveal={() => press(() => act(calls.reveal))}
              onRelease={() => press(calls.release, onReleased)}
            />
          )}
          {review.stage === 'working' && !can('review.work') && (
            <p>
              {review.reviewer?.name ?? 'The reviewer'} is working this item. The findings follow when that is
              done.
            </p>
          )}
          <ReviewReveal
            review={review}
            canDecide={review.stage === 'revealed' && can('review.decide')}
            onSettle={(partId, reason) => act(() => calls.settle(partId, reason))}
            slots={slots}
          />
          {(review.stage !== 'waiting' || review.comments.length > 0) && (
            <section aria-labelledby="review-comments">
              <h2 id="review-comments" className="section-title">
                Comments
              </h2>
              <CommentsPanel
                comments={review.comments}
                anchors={anchorsOf(review)}
                canComment={can('review.comment')}
                onComment={(anchor, text) => act(() => calls.comment(anchor, text))}
              />
            </section>
          )}
          {review.stage === 'revealed' && can('review.decide') && (
            <section aria-labelledby="review-decision">
              <h2 id="review-decision" className="section-title">
                Decision
              </h2>
              <DecisionForm
                review={review}
                onDecide={async (decision) => {
                  await act(() => calls.decide(decision));
                  tell(
                    `${review.itemCode} is ${decision.decision === 'approved' ? 'approved' : 'returned to its writer'}.`,
                  );
                }}
              />
            </section>
          )}
        </div>
      </div>
    </div>
  );
}
