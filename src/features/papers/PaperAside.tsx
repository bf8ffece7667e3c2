import type { Paper } from '#shared/contracts/papers.ts';
import { SeverityWord } from '#src/components/ui/SeverityWord.tsx';
import { countOf, formatDayAndTime } from '#src/lib/format.ts';

function Totals({ paper }: { paper: Paper }) {
  const off = paper.marks - paper.targetMarks;
  const verdict =
    off === 0 ? 'as planned' : off < 0 ? `${countOf(-off, 'mark')} short` : `${countOf(off, 'mark')} over`;
  const greatest = Math.max(paper.targetMarks, paper.marks, 1);
  return (
    <section>
      <h2 className="border-b border-ink pb-1 text-lg font-semibold">Totals</h2>
      <p className="pt-2">
        <span className="text-2xl tabular-nums">{paper.marks}</span> of {paper.targetMarks} marks,{' '}
        <span className={off === 0 ? 'text-accent' : 'text-lead'}>{verdict}</span>
      </p>
      <table className="mt-2 w-full text-sm">
        <caption className="sr-only">Marks by topic</caption>
        <tbody>
          {paper.marksByTopic.map(({ topic, marks }) => (
            <tr key={topic.id}>
              <th scope="row" className="w-2/5 py-0.5 pr-2 text-left font-normal">
                {topic.name}
              </th>
              <td>
                <span
                  aria-hidden="true"
                  className="inline-block h-2 bg-accent/60 align-middle"
                  style={{ width: `${(marks / greatest) * 100}%` }}
                />
              </td>
              <td className="w-8 text-right tabular-nums">{marks}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}

function Findings({ paper }: { paper: Paper }) {
  return (
    <section>
      <h2 className="border-b border-ink pb-1 text-lg font-semibold">Findings</h2>
      {paper.findings.length === 0 && (
        <p className="pt-2">
          <SeverityWord severity={null} />. The paper’s own checks found nothing.
        </p>
      )}
      <ul>
        {paper.findings.map((finding, index) => (
          <li key={index} className="border-b border-rule/50 py-2">
            <SeverityWord severity={finding.severity} /> {finding.statement}
            <span className="block text-sm text-muted">{finding.cure}</span>
          </li>
        ))}
      </ul>
    </section>
  );
}

function Seal({ seal }: { seal: NonNullable<Paper['seal']> }) {
  return (
    <section>
      <h2 className="border-b border-ink pb-1 text-lg font-semibold">Seal</h2>
      <p className="pt-2">
        Proposed by {seal.proposedBy.name}, confirmed by {seal.confirmedBy.name},{' '}
        {formatDayAndTime(seal.sealedAt)}.
      </p>
      <p className={seal.intact ? 'text-accent' : 'text-lead'}>
        {seal.intact
          ? '✓ The content still has the hash that was sealed.'
          : '■ The content no longer has the hash that was sealed. Tell the administrator before anything is printed.'}
      </p>
      <p className="mt-1 break-all font-mono text-sm text-muted">SHA-256 {seal.sha256}</p>
    </section>
  );
}

/** Totals, findings and seal of a paper, beside its running order. */
export function PaperAside({ paper }: { paper: Paper }) {
  return (
    <div className="grid content-start gap-8">
      <Totals paper={paper} />
      {paper.seal === null ? <Findings paper={paper} /> : <Seal seal={paper.seal} />}
    </div>
  );
}
