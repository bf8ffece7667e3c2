/** A stretch of a script's text: offsets from the start of the script, end exclusive, and where it begins. */
export interface Span {
  start: number;
  end: number;
  /** 1 for the first line. */
  line: number;
  /** 1 for the first column of the line. */
  column: number;
}

export type DiagnosticSeverity = 'error' | 'warning';

/** A replacement of the text in `span` that would cure the mistake. */
export interface SuggestedFix {
  label: string;
  span: Span;
  replacement: string;
}

/** A writer's mistake, as a value: what is wrong (one sentence with its cure), and where. */
export interface Diagnostic {
  code: string;
  severity: DiagnosticSeverity;
  span: Span;
  message: string;
  fix?: SuggestedFix;
}
