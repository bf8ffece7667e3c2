import {
  partLetter,
  SEVERITIES,
  type Finding,
  type ItemContent,
  type Severity,
} from '#shared/engine/index.ts';

/** Findings of one severity, in the order of the checks. */
export interface FindingGroup {
  severity: Severity;
  findings: Finding[];
}

/** Findings by severity, the most serious first; severities without any are left out. */
export function groupFindings(findings: readonly Finding[]): FindingGroup[] {
  return SEVERITIES.map((severity) => ({
    severity,
    findings: findings.filter((finding) => finding.severity === severity),
  })).filter((group) => group.findings.length > 0);
}

/** Whether the finding is a caution that its writer has accepted with a reason. */
export function isAccepted(finding: Finding, content: ItemContent): boolean {
  return finding.severity === 'caution' && (content.acceptedCautions[finding.key] ?? '').trim() !== '';
}

/** Where a click on a finding leads. */
export type FindingTarget =
  | { kind: 'script'; start: number; end: number; label: string }
  | { kind: 'part'; partId: string; label: string }
  | { kind: 'quantity'; name: string; label: string }
  | { kind: 'stem'; label: string };

/** What a finding points at: its part before its line before its quantity; null for the item as a whole. */
export function findingTarget(finding: Finding, content: ItemContent): FindingTarget | null {
  const { partId, span, quantity, field } = finding.place;
  const named = partId ?? fieldPart(field, content);
  const index = content.parts.findIndex((part) => part.id === named);
  if (named !== undefined && index >= 0) {
    return { kind: 'part', partId: named, label: `part (${partLetter(index)})` };
  }
  if (span !== undefined && (field === undefined || field === '')) {
    return { kind: 'script', start: span.start, end: span.end, label: `line ${span.line}` };
  }
  if (quantity !== undefined) return { kind: 'quantity', name: quantity, label: quantity };
  return field === 'stem' ? { kind: 'stem', label: 'the stem' } : null;
}

/** The part that a dotted field, as `parts.2.text`, lies in. */
function fieldPart(field: string | undefined, content: ItemContent): string | undefined {
  const index = /^parts\.(\d+)\b/.exec(field ?? '')?.[1];
  return index === undefined ? undefined : content.parts[Number(index)]?.id;
}

/** “2 blockers, 1 caution”: the counts as they stand beside the title; accepted cautions are not counted. */
export function countSentence(findings: readonly Finding[], content: ItemContent): string {
  const open = findings.filter((finding) => !isAccepted(finding, content));
  const counts = SEVERITIES.flatMap((severity) => {
    const number = open.filter((finding) => finding.severity === severity).length;
    return number === 0 ? [] : [`${number} ${severity}${number === 1 ? '' : 's'}`];
  });
  return counts.length === 0 ? 'Nothing found' : counts.join(', ');
}

/** The draw that shows the most serious finding worst; null when no finding names one. */
export function worstDrawOf(findings: readonly Finding[]): number | null {
  const ordered = groupFindings(findings).flatMap((group) => group.findings);
  return ordered.find((finding) => finding.worstDraw !== null)?.worstDraw ?? null;
}
