import { partLetter, readResponse } from '#shared/engine/index.ts';
import type { Review } from '#shared/contracts/reviews.ts';
import { ReviewFindings } from './ReviewFindings.tsx';
import { partsProgress } from './review-progress.ts';
import { SettlementForm } from './SettlementForm.tsx';
import type { ReviewSlots } from './slots.ts';

interface ReviewRevealProps {
  review: Review;
  canDecide: boolean;
  onSettle: (partId: string, reason: string) => Promise<void>;
  slots: ReviewSlots;
}

/** The answers: my working beside the scale of each part, the mark scheme, findings, and what changed. */
export function ReviewReveal({ review, canDecide, onSettle, slots }: ReviewRevealProps) {
  const { reveal } = review;
  if (reveal === null) return null;
  const parts = partsProgress(review);
  return (
    <div className="grid gap-8">
      <section aria-labelledby="reveal-scheme">
        <h2 id="reveal-scheme" className="section-title">
          Mark scheme
        </h2>
        {slots.scheme(reveal.scheme)}
      </section>
      {parts.length > 0 && (
        <section aria-labelledby="reveal-answers">
          <h2 id="reveal-answers" className="section-title">
            Answers, routes and slips
          </h2>
          {parts.map((part) => {
            const scale = reveal.report.scales.find((one) => one.partId === part.partId);
            const text = reveal.scheme.parts.find((one) => one.id === part.partId)?.answer?.text;
            const reading = text === undefined ? null : readResponse(text);
            const unsettled = part.state === 'disagrees' || part.state === 'disputed';
            return (
              <div key={part.partId} className="grid gap-2 border-t border-rule py-3">
                <h3 className="font-semibold">Part ({part.letter})</h3>
                {part.tries.length > 0 && (
                  <p>
                    Mine: {part.tries.map((working) => working.text).join(', then ')}{' '}
                    <span className={unsettled ? 'text-brass' : 'text-accent'}>
                      {unsettled ? '✕ does not agree' : part.state === 'settled' ? '✓ settled' : '✓ agrees'}
                    </span>
                  </p>
                )}
                {part.tries.at(-1)?.settledReason != null && (
                  <p className="text-sm">Settled: {part.tries.at(-1)?.settledReason}</p>
                )}
                {canDecide && unsettled && <SettlementForm part={part} onSettle={onSettle} />}
                {scale !== undefined &&
                  slots.scale({
                    scale,
                    name: `Part (${part.letter})`,
                    answer: reading?.ok === true ? reading.value : null,
                  })}
              </div>
            );
          })}
        </section>
      )}
      <section aria-labelledby="reveal-findings">
        <h2 id="reveal-findings" className="section-title">
          Findings
        </h2>
        <p className="mb-2 text-sm text-muted">
          Checked over {reveal.report.coverage}
          {reveal.assayStale ? '; this assay is stale' : ''}.
        </p>
        <ReviewFindings report={reveal.report} content={reveal.content} />
      </section>
      <section aria-labelledby="reveal-script">
        <h2 id="reveal-script" className="section-title">
          Script
        </h2>
        <pre className="script-still" tabIndex={0}>
          {reveal.content.script}
        </pre>
      </section>
      {reveal.previous !== null && (
        <section aria-labelledby="reveal-changes">
          <h2 id="reveal-changes" className="section-title">
            Changed since revision {reveal.previous.revision}
          </h2>
          {slots.changes(reveal.previous.content, reveal.content)}
        </section>
      )}
    </div>
  );
}

/** Places that a comment can be about: the item, its stem and script, and each part of the sheet. */
export function anchorsOf(review: Review): { value: string; name: string }[] {
  const parts = review.sheet?.parts ?? review.reveal?.content.parts ?? [];
  return [
    { value: '', name: 'the item as a whole' },
    { value: 'stem', name: 'the stem' },
    ...(review.reveal === null ? [] : [{ value: 'script', name: 'the script' }]),
    ...parts.map((part, index) => ({ value: part.id, name: `part (${partLetter(index)})` })),
  ];
}
