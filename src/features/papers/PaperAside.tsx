import type { ReactNode } from 'react';

import type { Paper, PaperFinding } from '#shared/contracts/papers.ts';
import { SeverityWord } from '#src/components/ui/SeverityWord.tsx';
import { Ticks } from '#src/components/ui/Ticks.tsx';
import { countOf, formatDayAndTime } from '#src/lib/format.ts';

function Section({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section>
      <h2 className="mb-2 border-b border-ink pb-1 text-lg font-semibold">{title}</h2>
      {children}
    </section>
  );
}

function Totals({ paper }: { paper: Paper }) {
  const off = paper.marks - paper.targetMarks;
  const verdict =
    off === 0 ? 'as planned' : off < 0 ? `${countOf(-off, 'mark')} short` : `${countOf(off, 'mark')} over`;
  return (
    <Section title="Marks">
      <p>
        <span className="text-2xl tabular-nums">{paper.marks}</span> of {paper.targetMarks},{' '}
        <span className={off === 0 ? 'text-accent' : 'text-lead'}>{verdict}</span>
      </p>
      <Ticks count={paper.marks} target={paper.targetMarks} />
      {paper.marksByTopic.length > 0 && (
        <table className="mt-4 w-full text-sm">
          <caption className="sr-only">Marks by topic</caption>
          <tbody>
            {paper.marksByTopic.map(({ topic, marks }) => (
              <tr key={topic.id}>
                <th scope="row" className="py-0.5 pr-3 text-left font-normal whitespace-nowrap">
                  {topic.name}
                </th>
                <td className="w-8 pr-3 text-right">{marks}</td>
                <td className="w-2/5">
                  <Ticks count={marks} />
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </Section>
  );
}

/** Brings the row of a place into view and gives it the keyboard. */
function goToPlace(placeId: number): void {
  const row = document.getElementById(`place-${placeId}`);
  row?.scrollIntoView({ block: 'center' });
  row?.focus({ preventScroll: true });
}

function Finding({ finding, paper, onShowOrder }: { finding: PaperFinding } & PaperAsideProps) {
  const places = paper.places.filter((place) => finding.placeIds.includes(place.id));
  return (
    <li className="border-b border-rule/50 py-2">
      <SeverityWord severity={finding.severity} /> {finding.statement}
      <span className="block text-sm text-muted">
        {finding.cure}{' '}
        {places.map((place) => (
          <button
            key={place.id}
            type="button"
            className="link mr-2"
            onClick={() => {
              onShowOrder();
              requestAnimationFrame(() => goToPlace(place.id));
            }}
          >
            Go to {place.itemCode}
          </button>
        ))}
      </span>
    </li>
  );
}

function Seal({ seal }: { seal: NonNullable<Paper['seal']> }) {
  return (
    <Section title="Seal">
      <p>
        Proposed by {seal.proposedBy.name}, confirmed by {seal.confirmedBy.name},{' '}
        {formatDayAndTime(seal.sealedAt)}.
      </p>
      <p className={seal.intact ? 'text-accent' : 'text-lead'}>
        {seal.intact
          ? '✓ The content still has the hash that was sealed.'
          : '■ The content no longer has the hash that was sealed. Tell the administrator before anything is printed.'}
      </p>
      <p className="mt-2 break-all font-mono text-sm text-muted">SHA-256 {seal.sha256}</p>
    </Section>
  );
}

interface PaperAsideProps {
  paper: Paper;
  /** Brings the running order to the front. */
  onShowOrder: () => void;
}

/** Marks, findings and seal of a paper, beside whatever view of it is open. */
export function PaperAside({ paper, onShowOrder }: PaperAsideProps) {
  return (
    <>
      <Totals paper={paper} />
      {paper.seal === null ? (
        <Section title="Findings">
          {paper.findings.length === 0 && (
            <p>
              <SeverityWord severity={null} />. The paper’s own checks found nothing.
            </p>
          )}
          <ul>
            {paper.findings.map((finding, index) => (
              <Finding key={index} finding={finding} paper={paper} onShowOrder={onShowOrder} />
            ))}
          </ul>
        </Section>
      ) : (
        <Seal seal={paper.seal} />
      )}
    </>
  );
}
