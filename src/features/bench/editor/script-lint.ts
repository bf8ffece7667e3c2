import type { Finding } from '#shared/engine/index.ts';
import type { PlacedDiagnostic } from '#shared/contracts/checking.ts';

/** A replacement in the script, by offsets. */
export interface ScriptFix {
  label: string;
  from: number;
  to: number;
  replacement: string;
}

/** A stretch of the script to underline, with what to say and how to cure it. */
export interface Underline {
  from: number;
  to: number;
  severity: 'error' | 'warning' | 'info';
  message: string;
  fix: ScriptFix | null;
}

const SEVERITY = { blocker: 'error', caution: 'warning', note: 'info' } as const;

/** A stretch held within a text that may have become shorter since; at least one character wide where it can be. */
function held(start: number, end: number, length: number): { from: number; to: number } {
  const from = Math.min(Math.max(0, start), length);
  const to = Math.min(Math.max(from, end), length);
  return from === to && to < length ? { from, to: to + 1 } : { from, to };
}

/**
 * What to underline in a script of `length` characters: mistakes that the reader of scripts found in it, and
 * findings of the assay that point into it.
 */
export function underlines(
  diagnostics: readonly PlacedDiagnostic[],
  findings: readonly Finding[],
  length: number,
): Underline[] {
  const mistakes = diagnostics
    .filter((diagnostic) => diagnostic.field === '')
    .map((diagnostic): Underline => {
      const { fix } = diagnostic;
      return {
        ...held(diagnostic.span.start, diagnostic.span.end, length),
        severity: diagnostic.severity,
        message: diagnostic.message,
        fix:
          fix === undefined
            ? null
            : {
                label: fix.label,
                from: Math.min(fix.span.start, length),
                to: Math.min(fix.span.end, length),
                replacement: fix.replacement,
              },
      };
    });
  const found = findings.flatMap((finding): Underline[] => {
    const { span, field } = finding.place;
    if (span === undefined || (field !== undefined && field !== '')) return [];
    return [
      {
        ...held(span.start, span.end, length),
        severity: SEVERITY[finding.severity],
        message: `${finding.statement} ${finding.cure}`.trim(),
        fix: null,
      },
    ];
  });
  const told = new Set<string>();
  return [...mistakes, ...found].filter((underline) => {
    const key = `${underline.from} ${underline.to} ${underline.message}`;
    if (told.has(key)) return false;
    told.add(key);
    return true;
  });
}
