import type { Diagnostic, Span, SuggestedFix } from './diagnostic.ts';

/** The span from the beginning of one to the end of the other. */
export function joinSpans(first: Span, last: Span): Span {
  return first.start <= last.start
    ? { ...first, end: Math.max(first.end, last.end) }
    : { ...last, end: Math.max(first.end, last.end) };
}

/** An error at a place, with a code that never changes and one sentence that says the cure. */
export function errorAt(span: Span, code: string, message: string, fix?: SuggestedFix): Diagnostic {
  return { code, severity: 'error', span, message, ...(fix === undefined ? {} : { fix }) };
}

/** A warning at a place. */
export function warningAt(span: Span, code: string, message: string): Diagnostic {
  return { code, severity: 'warning', span, message };
}

/** Whether any of the diagnostics stops the script. */
export function hasError(diagnostics: readonly Diagnostic[]): boolean {
  return diagnostics.some((diagnostic) => diagnostic.severity === 'error');
}
