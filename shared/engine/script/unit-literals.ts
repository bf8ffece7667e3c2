import type { Diagnostic } from '../diagnostics/diagnostic.ts';
import { errorAt, joinSpans } from '../diagnostics/spans.ts';
import { CONSTANTS } from '../physics/constants.ts';
import { literalToSI } from '../units/convert.ts';
import { rational, type Rational } from '../units/dimension.ts';
import { findUnitSymbol, NO_UNIT, unitFromTerms, type UnitTerm } from '../units/unit.ts';
import type { NumberTree } from './expression-tree.ts';
import type { Token } from './tokens.ts';

/** A token, or a number with the unit beside it as one leaf. */
export type Item = Token | { kind: 'literal'; tree: NumberTree; span: Token['span'] };

interface ExponentReading {
  exponent: Rational;
  next: number;
}

const WHOLE = /^\d{1,2}$/;

/** Reads `^2`, `^-2` or `^(1/2)` at `index`; null when no power stands there, `bad` when it is not a number. */
function readPower(tokens: readonly Token[], index: number): ExponentReading | 'bad' | null {
  if (tokens[index]?.text !== '^') return null;
  let at = index + 1;
  const bracket = tokens[at]?.kind === 'open';
  if (bracket) at += 1;
  const negative = tokens[at]?.text === '-';
  if (negative) at += 1;
  const numerator = tokens[at];
  if (numerator?.kind !== 'number' || !WHOLE.test(numerator.text)) return 'bad';
  at += 1;
  let denominator = 1;
  if (bracket && tokens[at]?.text === '/') {
    const below = tokens[at + 1];
    if (below?.kind !== 'number' || !WHOLE.test(below.text) || Number(below.text) === 0) return 'bad';
    denominator = Number(below.text);
    at += 2;
  }
  if (bracket) {
    if (tokens[at]?.text !== ')') return 'bad';
    at += 1;
  }
  const value = Number(numerator.text) * (negative ? -1 : 1);
  return value === 0 ? 'bad' : { exponent: rational(value, denominator), next: at };
}

/** Reads the tokens after a number literal as its unit. */
class UnitReader {
  readonly terms: UnitTerm[] = [];
  readonly diagnostics: Diagnostic[] = [];
  next: number;

  private readonly tokens: readonly Token[];
  private readonly variables: ReadonlySet<string>;
  private readonly start: number;

  constructor(tokens: readonly Token[], variables: ReadonlySet<string>, numberIndex: number) {
    this.tokens = tokens;
    this.variables = variables;
    this.start = numberIndex;
    this.next = numberIndex + 1;
  }

  /** Takes units that stand straight after the number, then those after slashes. */
  read(): void {
    while (this.isUnit(this.next)) if (!this.take(1)) return;
    while (this.terms.length > 0 && this.tokens[this.next]?.text === '/') {
      if (this.isBracketOfUnits(this.next + 1)) {
        this.next += 2;
        while (this.tokens[this.next]?.text !== ')') if (!this.take(-1)) return;
        this.next += 1;
      } else if (this.isUnit(this.next + 1)) {
        this.next += 1;
        if (this.isConstantAfterSlash() || !this.take(-1)) return;
      } else return;
      const follower = this.tokens[this.next];
      if (follower !== undefined && this.isUnit(this.next)) {
        this.diagnostics.push(
          errorAt(
            follower.span,
            'unit-after-slash',
            'Two units after a slash can be read two ways: write negative powers, as J kg^-1 K^-1, or brackets, as J/(kg K).',
          ),
        );
        return;
      }
    }
  }

  private isUnit(index: number): boolean {
    const token = this.tokens[index];
    return (
      token?.kind === 'name' && this.tokens[index + 1]?.text !== '(' && findUnitSymbol(token.written) !== null
    );
  }

  /** Whether `(kg K)` or the like stands here: nothing but units and powers, none of which is a variable or constant. */
  private isBracketOfUnits(index: number): boolean {
    if (this.tokens[index]?.text !== '(') return false;
    let at = index + 1;
    while (this.tokens[at]?.text !== ')') {
      const token = this.tokens[at];
      if (token === undefined || !this.isUnit(at)) return false;
      if (this.variables.has(token.text) || CONSTANTS.has(token.text)) return false;
      const power = readPower(this.tokens, at + 1);
      if (power === 'bad') return false;
      at = power?.next ?? at + 1;
    }
    return at > index + 1;
  }

  private isConstantAfterSlash(): boolean {
    const token = this.tokens[this.next];
    if (token === undefined || !CONSTANTS.has(token.text)) return false;
    const number = this.written(this.next - 1);
    this.diagnostics.push(
      errorAt(
        token.span,
        'unit-or-constant',
        `After the slash, “${token.text}” could be the unit ${token.text} or the constant ${token.text}: write ${number} ${token.text}^-1 for the unit, or (${number}) / ${token.text} for the constant.`,
      ),
    );
    return true;
  }

  private written(end: number): string {
    return this.tokens
      .slice(this.start, end)
      .map((token) => token.written)
      .join(' ')
      .replace(/ \^ /g, '^')
      .replace(/\^- /g, '^-');
  }

  /** Takes the unit at `next` with its power; false after a mistake. */
  private take(sign: 1 | -1): boolean {
    const token = this.tokens[this.next];
    const found = token === undefined ? null : findUnitSymbol(token.written);
    if (token === undefined || found === null) return false;
    if (this.variables.has(token.text)) {
      const number = this.tokens[this.start]?.written ?? '';
      const cure =
        sign === 1 && this.next === this.start + 1
          ? `write ${number} * ${token.text} for the variable, or rename the variable to use the unit`
          : `put the number and its unit in brackets before the variable, or rename the variable to use the unit`;
      this.diagnostics.push(
        errorAt(
          token.span,
          'unit-or-variable',
          `“${token.text}” is a unit and also a variable of this script: ${cure}.`,
        ),
      );
      return false;
    }
    const power = readPower(this.tokens, this.next + 1);
    if (power === 'bad') {
      this.diagnostics.push(
        errorAt(
          token.span,
          'unit-power',
          `The power of the unit ${token.written} must be a whole number other than 0, as ${token.written}^-2.`,
        ),
      );
      return false;
    }
    const [numerator, denominator] = power?.exponent ?? [1, 1];
    this.terms.push({
      prefix: found.prefix,
      symbol: found.definition.symbol,
      exponent: [numerator * sign, denominator],
    });
    this.next = power?.next ?? this.next + 1;
    return true;
  }
}

/**
 * Joins every number literal with the unit beside it into one leaf. `variables` are all names that the script
 * defines: a unit that is also a variable is an error that says how to write either.
 */
export function joinUnitLiterals(
  tokens: readonly Token[],
  variables: ReadonlySet<string>,
): { items: Item[]; diagnostics: Diagnostic[] } {
  const items: Item[] = [];
  const diagnostics: Diagnostic[] = [];
  let index = 0;
  while (index < tokens.length) {
    const token = tokens[index];
    if (token === undefined) break;
    if (token.kind !== 'number') {
      items.push(token);
      index += 1;
      continue;
    }
    const reader = new UnitReader(tokens, variables, index);
    reader.read();
    diagnostics.push(...reader.diagnostics);
    const last = tokens[reader.next - 1] ?? token;
    const span = joinSpans(token.span, last.span);
    const unit = reader.terms.length === 0 ? NO_UNIT : unitFromTerms(reader.terms);
    const value = literalToSI(token.text, unit);
    if (!Number.isFinite(value) || (value === 0 && /[1-9]/.test(token.text.split(/[eE]/)[0] ?? ''))) {
      diagnostics.push(
        errorAt(span, 'number-out-of-range', `${token.written} is too large or too small to calculate with.`),
      );
    }
    if (reader.terms.length > 0 && isPlainFraction(tokens, index)) {
      diagnostics.push(
        errorAt(
          span,
          'fraction-with-unit',
          `A fraction with a unit can be read two ways: write it as one decimal number with the unit, or put ${token.written} and its unit in brackets.`,
        ),
      );
    }
    items.push({ kind: 'literal', tree: { kind: 'number', value, unit, literal: token.text, span }, span });
    index = Math.max(reader.next, index + 1);
  }
  return { items, diagnostics };
}

/** Whether the number at `index` is the lower part of a fraction of two plain numbers, as the 2 of `1/2 m`. */
function isPlainFraction(tokens: readonly Token[], index: number): boolean {
  return (
    tokens[index - 1]?.text === '/' && tokens[index - 2]?.kind === 'number' && tokens[index - 3]?.text !== '^'
  );
}
