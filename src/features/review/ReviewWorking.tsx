import type { Review } from '#shared/contracts/reviews.ts';
import { partsProgress, revealHindrance } from './review-progress.ts';
import { WorkingForm } from './WorkingForm.tsx';

interface ReviewWorkingProps {
  review: Review;
  busy: boolean;
  onTry: (partId: string, text: string) => Promise<void>;
  onDispute: (partId: string) => void;
  onReveal: () => void;
  onRelease: () => void;
}

/** The reviewer's own working, part by part, until the answers are shown. */
export function ReviewWorking({ review, busy, onTry, onDispute, onReveal, onRelease }: ReviewWorkingProps) {
  const parts = partsProgress(review);
  const hindrance = revealHindrance(parts);
  return (
    <section aria-labelledby="my-working">
      <h2 id="my-working" className="section-title">
        My working
      </h2>
      <p className="mb-2 text-sm text-muted">
        Work each part from the sheet alone. You are told only whether your answer agrees; the answers follow
        when every part has a working.
      </p>
      {parts.length === 0 && <p>No part of this item asks for a number.</p>}
      {parts.map((part) => (
        <WorkingForm key={part.partId} part={part} busy={busy} onTry={onTry} onDispute={onDispute} />
      ))}
      <div className="mt-4 grid gap-2 border-t border-rule pt-4">
        <p className="flex flex-wrap items-center gap-3">
          <button
            type="button"
            className="button button-primary"
            disabled={busy || hindrance !== null}
            aria-describedby={hindrance === null ? undefined : 'reveal-hindrance'}
            onClick={onReveal}
          >
            Show the answers
          </button>
          <button type="button" className="link" disabled={busy} onClick={onRelease}>
            Give it back to the queue
          </button>
        </p>
        {hindrance !== null && (
          <p id="reveal-hindrance" className="text-sm text-muted">
            {hindrance}
          </p>
        )}
      </div>
    </section>
  );
}
