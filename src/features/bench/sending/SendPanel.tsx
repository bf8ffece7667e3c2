import { useEffect, useEffectEvent, useState } from 'react';

import type { StoredAssay } from '#shared/contracts/items.ts';
import type { PersonName } from '#shared/contracts/people.ts';
import type { ItemContent } from '#shared/engine/index.ts';
import { sentenceOf } from '#src/lib/api.ts';
import { Sentence } from '#src/components/ui/Sentence.tsx';
import { findingTarget, isAccepted, type FindingTarget } from '../findings/group-findings.ts';
import { SendForm, type Sending } from './SendForm.tsx';

interface SendPanelProps {
  content: ItemContent;
  reviewers: readonly PersonName[];
  /** Saves what is not saved and runs the full assay on it; throws with a sentence. */
  onAssay: () => Promise<StoredAssay>;
  onSend: (sending: Sending) => Promise<void>;
  onCancel: () => void;
  onVisit: (target: FindingTarget) => void;
}

type Stage =
  { kind: 'assaying' } | { kind: 'failed'; message: string } | { kind: 'ready'; assay: StoredAssay };

/** Runs the assay on the saved draft, then shows what blocks the item, or the form that sends it. */
export function SendPanel(props: SendPanelProps) {
  const { content, reviewers, onSend, onCancel, onVisit } = props;
  const [stage, setStage] = useState<Stage>({ kind: 'assaying' });
  const assay = useEffectEvent(async (isCurrent: () => boolean) => {
    try {
      const stored = await props.onAssay();
      if (isCurrent()) setStage({ kind: 'ready', assay: stored });
    } catch (error) {
      const message = sentenceOf(error);
      if (isCurrent()) setStage({ kind: 'failed', message });
    }
  });
  useEffect(() => {
    let current = true;
    void assay(() => current);
    return () => {
      current = false;
    };
  }, []);

  if (stage.kind === 'assaying') {
    return (
      <p role="status">
        Saving the draft and checking every draw <progress aria-label="Assay running" />
      </p>
    );
  }
  if (stage.kind === 'failed') {
    return (
      <>
        <p role="alert" className="text-lead">
          {stage.message}
        </p>
        <p className="mt-4">
          <button type="button" className="button" onClick={onCancel}>
            Close
          </button>
        </p>
      </>
    );
  }
  const { findings, coverage } = stage.assay.report;
  const blockers = findings.filter((finding) => finding.severity === 'blocker');
  if (blockers.length > 0) {
    return (
      <>
        <p>
          {blockers.length === 1 ? 'A blocker keeps' : `${blockers.length} blockers keep`} this item from
          review:
        </p>
        <ul className="my-3 grid gap-2">
          {blockers.map((finding) => {
            const target = findingTarget(finding, content);
            return (
              <li key={finding.key}>
                <span aria-hidden="true" className="text-lead">
                  ■
                </span>{' '}
                <Sentence text={finding.statement} />{' '}
                {target !== null && (
                  <button type="button" className="link" onClick={() => onVisit(target)}>
                    Go to {target.label}
                  </button>
                )}
              </li>
            );
          })}
        </ul>
        <button type="button" className="button" onClick={onCancel}>
          Back to the item
        </button>
      </>
    );
  }
  const open = findings.filter((finding) => finding.severity === 'caution' && !isAccepted(finding, content));
  return (
    <>
      <p className="mb-4">
        Assayed over {coverage}; no blocker.{' '}
        {open.length > 0 &&
          `${open.length === 1 ? 'One caution has' : `${open.length} cautions have`} no reason yet; the reviewer will ask.`}
      </p>
      <SendForm reviewers={reviewers} onSend={onSend} onCancel={onCancel} />
    </>
  );
}
