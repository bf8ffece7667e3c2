import type { Diagnostic, Span } from '../diagnostics/diagnostic.ts';
import { errorAt } from '../diagnostics/spans.ts';

export type TokenKind = 'number' | 'name' | 'operator' | 'open' | 'close' | 'comma' | 'assign' | 'newline';

/** One word, number or sign of a script. */
export interface Token {
  kind: TokenKind;
  /** In the notation that the parser knows: `−` becomes `-`, `≤` becomes `<=`, letters are normalised (NFKC). */
  text: string;
  /** As written. */
  written: string;
  span: Span;
}

const LEXEME =
  /(?<newline>\r\n|[\n\r])|(?<space>[ \t\u00A0\u2009\u202F]+)|(?<comment>\/\/[^\n\r]*)|(?<number>(?:\d+\.?\d*|\.\d+)(?:[eE][+\-−]?\d+)?)|(?<superscript>[⁺⁻]?[⁰¹²³⁴⁵⁶⁷⁸⁹]+)|(?<name>[°º%]|[\p{L}_][\p{L}\p{M}\p{Nd}_₀-₉]*)|(?<operator>\*\*|<=|>=|==|!=|[+\-−–*×·⋅/÷^<>≤≥≠?:])|(?<assign>=)|(?<open>[([])|(?<close>[)\]])|(?<comma>,)/uy;

const OPERATOR_SPELLINGS: ReadonlyMap<string, string> = new Map([
  ['−', '-'],
  ['–', '-'],
  ['×', '*'],
  ['·', '*'],
  ['⋅', '*'],
  ['÷', '/'],
  ['**', '^'],
  ['≤', '<='],
  ['≥', '>='],
  ['≠', '!='],
]);
const WORD_OPERATORS: ReadonlySet<string> = new Set(['and', 'or', 'not']);
const SUPERSCRIPTS: ReadonlyMap<string, string> = new Map([
  ...Array.from('⁰¹²³⁴⁵⁶⁷⁸⁹', (sign, digit): [string, string] => [sign, String(digit)]),
  ['⁻', '-'],
  ['⁺', ''],
]);

const HINTS: ReadonlyMap<string, string> = new Map([
  [';', 'A statement ends with its line: leave the semicolon out.'],
  ['&', 'Write `and` between two conditions.'],
  ['|', 'Write `or` between two conditions.'],
  ['!', 'Write `not` before a condition in brackets, or `!=` for “is not equal to”.'],
  ['#', 'A comment begins with two slashes: //'],
  ['"', 'There are no texts in a script: it works with numbers alone.'],
  ["'", 'There are no texts in a script: it works with numbers alone.'],
  ['`', 'There are no texts in a script: it works with numbers alone.'],
  ['{', 'Group with round brackets: ( and ).'],
  ['}', 'Group with round brackets: ( and ).'],
  ['.', 'A dot stands only inside a number, as 0.5.'],
]);

/** Offsets at which lines begin. */
function lineStarts(source: string): number[] {
  const starts = [0];
  for (const match of source.matchAll(/\r\n|[\n\r]/g)) starts.push(match.index + match[0].length);
  return starts;
}

/** The tokens that one lexeme stands for: none for space and comments, several for a superscript. */
function tokensOf(groups: Readonly<Record<string, string>>, written: string, span: Span): Token[] {
  const token = (kind: TokenKind, text: string): Token => ({ kind, text, written, span });
  if (groups['space'] !== undefined || groups['comment'] !== undefined) return [];
  if (groups['newline'] !== undefined) return [token('newline', '\n')];
  if (groups['number'] !== undefined) return [token('number', written.replace('−', '-'))];
  if (groups['name'] !== undefined) {
    const text = written.normalize('NFKC');
    return [token(WORD_OPERATORS.has(text) ? 'operator' : 'name', text)];
  }
  if (groups['operator'] !== undefined)
    return [token('operator', OPERATOR_SPELLINGS.get(written) ?? written)];
  if (groups['assign'] !== undefined) return [token('assign', '=')];
  if (groups['open'] !== undefined) return [token('open', written)];
  if (groups['close'] !== undefined) return [token('close', written)];
  if (groups['comma'] !== undefined) return [token('comma', ',')];
  const digits = Array.from(written, (sign) => SUPERSCRIPTS.get(sign) ?? '').join('');
  const sign = digits.startsWith('-') ? [token('operator', '-')] : [];
  return [token('operator', '^'), ...sign, token('number', digits.replace('-', ''))];
}

/** Splits a text into tokens; signs that have no meaning become diagnostics and are left out. */
export function tokenise(source: string): { tokens: Token[]; diagnostics: Diagnostic[] } {
  const tokens: Token[] = [];
  const diagnostics: Diagnostic[] = [];
  const starts = lineStarts(source);
  let line = 0;
  const spanOf = (start: number, end: number): Span => {
    while ((starts[line + 1] ?? Infinity) <= start) line += 1;
    return { start, end, line: line + 1, column: start - (starts[line] ?? 0) + 1 };
  };
  let position = 0;
  while (position < source.length) {
    LEXEME.lastIndex = position;
    const match = LEXEME.exec(source);
    const groups = match?.groups;
    if (match === null || groups === undefined) {
      const sign = Array.from(source.slice(position, position + 2))[0] ?? '';
      const hint =
        HINTS.get(sign) ??
        'Only numbers, names, units and the signs + - * / ^ ( ) [ ] , < > = ? : have a meaning here.';
      diagnostics.push(
        errorAt(
          spanOf(position, position + sign.length),
          'unknown-sign',
          `“${sign}” has no meaning here. ${hint}`,
        ),
      );
      position += sign.length;
      continue;
    }
    const written = match[0];
    const span = spanOf(position, position + written.length);
    position += written.length;
    tokens.push(...tokensOf(groups, written, span));
  }
  return { tokens, diagnostics };
}
