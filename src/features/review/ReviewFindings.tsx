import { partLetter, SEVERITIES, type ItemContent } from '#shared/engine/index.ts';
import { Sentence } from '#src/components/ui/Sentence.tsx';
import type { AssayReport, Severity } from '#shared/engine/index.ts';

const NAMES: Readonly<Record<Severity, { title: string; sign: string; tone: string }>> = {
  blocker: { title: 'Blocker', sign: '■', tone: 'text-lead' },
  caution: { title: 'Caution', sign: '▲', tone: 'text-brass' },
  note: { title: 'Note', sign: '·', tone: 'text-muted' },
};

/** The assay's findings as the reviewer reads them, each with the writer's reason where there is one. */
export function ReviewFindings({ report, content }: { report: AssayReport; content: ItemContent }) {
  const findings = SEVERITIES.flatMap((severity) =>
    report.findings.filter((finding) => finding.severity === severity),
  );
  if (findings.length === 0) return <p className="text-muted">The checker found nothing to say.</p>;
  return (
    <ul className="grid gap-3">
      {findings.map((finding) => {
        const { title, sign, tone } = NAMES[finding.severity];
        const part = content.parts.findIndex((one) => one.id === finding.place.partId);
        const reason = content.acceptedCautions[finding.key];
        const where = part >= 0 ? `part (${partLetter(part)})` : (finding.place.quantity ?? null);
        return (
          <li key={finding.key} className="grid grid-cols-[1rem_1fr] gap-x-2">
            <span aria-hidden="true" className={tone}>
              {sign}
            </span>
            <div>
              <p>
                <span className={`font-semibold ${tone}`}>{title}</span>
                {where === null ? '' : `, ${where}`}: <Sentence text={finding.statement} />
              </p>
              {finding.cure !== '' && (
                <p className="text-sm text-muted">
                  <Sentence text={finding.cure} />
                </p>
              )}
              {reason !== undefined && reason !== '' && (
                <p className="text-sm">The writer lets this stand: {reason}</p>
              )}
            </div>
          </li>
        );
      })}
    </ul>
  );
}
