import { useState } from 'react';

import type { Finding, ItemContent, Severity } from '#shared/engine/index.ts';
import { Sentence } from '#src/components/ui/Sentence.tsx';
import { findingTarget, groupFindings, isAccepted, type FindingTarget } from './group-findings.ts';

const GROUPS: Readonly<Record<Severity, { title: string; sign: string; tone: string }>> = {
  blocker: { title: 'Blockers', sign: '■', tone: 'text-lead' },
  caution: { title: 'Cautions', sign: '▲', tone: 'text-brass' },
  note: { title: 'Notes', sign: '·', tone: 'text-muted' },
};

interface FindingsListProps {
  findings: readonly Finding[];
  content: ItemContent;
  /** Whether cautions may be accepted here. */
  canAccept: boolean;
  onVisit: (target: FindingTarget) => void;
  onVisitDraw: (draw: number) => void;
  /** Accepts a caution with a reason; an empty reason takes the acceptance back. */
  onAccept: (key: string, reason: string) => void;
}

/** Findings as sentences, the most serious first, each leading to what it is about and to its worst draw. */
export function FindingsList(props: FindingsListProps) {
  const groups = groupFindings(props.findings);
  if (groups.length === 0) return <p className="text-muted">The checker found nothing to say.</p>;
  return (
    <div className="grid gap-4">
      {groups.map(({ severity, findings }) => (
        <section key={severity} aria-label={GROUPS[severity].title}>
          <h3 className={`font-semibold ${GROUPS[severity].tone}`}>
            {GROUPS[severity].title} <span className="font-normal">{findings.length}</span>
          </h3>
          <ul className="grid gap-3">
            {findings.map((finding) => (
              <FindingEntry key={finding.key} finding={finding} {...props} />
            ))}
          </ul>
        </section>
      ))}
    </div>
  );
}

function drawsSentence(finding: Finding): string {
  if (finding.drawCount === 1) return 'one draw';
  return `${finding.drawCount.toLocaleString('en-GB')} draws`;
}

function FindingEntry({ finding, ...props }: FindingsListProps & { finding: Finding }) {
  const { content, canAccept, onVisit, onVisitDraw, onAccept } = props;
  const [reason, setReason] = useState<string | null>(null);
  const target = findingTarget(finding, content);
  const { sign, tone } = GROUPS[finding.severity];
  const accepted = isAccepted(finding, content);
  return (
    <li className="grid grid-cols-[1rem_1fr] gap-x-2">
      <span aria-hidden="true" className={accepted ? 'text-muted' : tone}>
        {accepted ? '✓' : sign}
      </span>
      <div>
        <p className={accepted ? 'text-muted' : undefined}>
          <Sentence text={finding.statement} />
        </p>
        {finding.cure !== '' && (
          <p className="text-sm text-muted">
            <Sentence text={finding.cure} />
          </p>
        )}
        <p className="flex flex-wrap gap-x-4 text-sm">
          {target !== null && (
            <button type="button" className="link" onClick={() => onVisit(target)}>
              Go to {target.label}
            </button>
          )}
          {finding.worstDraw !== null && (
            <button type="button" className="link" onClick={() => onVisitDraw(finding.worstDraw ?? 1)}>
              Worst draw {finding.worstDraw.toLocaleString('en-GB')}
            </button>
          )}
          {finding.drawCount > 0 && <span className="text-muted">{drawsSentence(finding)}</span>}
          {finding.severity === 'caution' && canAccept && !accepted && reason === null && (
            <button type="button" className="link" onClick={() => setReason('')}>
              Accept with a reason
            </button>
          )}
        </p>
        {accepted && (
          <p className="text-sm text-muted">
            Accepted: {content.acceptedCautions[finding.key]}{' '}
            {canAccept && (
              <button type="button" className="link" onClick={() => onAccept(finding.key, '')}>
                Take back
              </button>
            )}
          </p>
        )}
        {reason !== null && (
          <form
            className="mt-1 flex flex-wrap items-end gap-2"
            onSubmit={(event) => {
              event.preventDefault();
              if (reason.trim() === '') return;
              onAccept(finding.key, reason.trim());
              setReason(null);
            }}
          >
            <label className="min-w-48 flex-1">
              <span className="field-label">Why may this stand?</span>
              <input
                className="field w-full"
                value={reason}
                maxLength={1000}
                autoFocus
                onChange={(event) => setReason(event.target.value)}
              />
            </label>
            <button type="submit" className="button" disabled={reason.trim() === ''}>
              Accept
            </button>
            <button type="button" className="link" onClick={() => setReason(null)}>
              Cancel
            </button>
          </form>
        )}
      </div>
    </li>
  );
}
