import type { Diagnostic, Span } from '../diagnostics/diagnostic.ts';
import { errorAt, hasError, joinSpans } from '../diagnostics/spans.ts';
import { CONSTANTS } from '../physics/constants.ts';
import { findUnitSymbol } from '../units/unit.ts';
import type { ExpressionTree } from './expression-tree.ts';
import { DRAWING_TABLE, FUNCTION_TABLE, isFunctionName } from './functions.ts';
import { SCRIPT_LIMITS } from './limits.ts';
import { readMathTree } from './math-tree.ts';
import type { NormalisedExpression } from './normalised-expression.ts';
import { mostSimilar } from './similar.ts';
import type { Token } from './tokens.ts';
import { joinUnitLiterals, type Item } from './unit-literals.ts';

/** Functions by the names they have elsewhere. */
const OTHER_NAMES: ReadonlyMap<string, string> = new Map([
  ['log', 'ln or log10'],
  ['lg', 'log10'],
  ['arcsin', 'asin'],
  ['arccos', 'acos'],
  ['arctan', 'atan'],
  ['pow', 'the sign ^'],
  ['root', 'sqrt or cbrt'],
  ['average', 'mean'],
  ['average_of', 'mean'],
  ['gradient', 'slope'],
  ['linspace', 'spread'],
  ['fabs', 'abs'],
]);

function describeItem(item: Item): string {
  return item.kind === 'literal' ? item.tree.literal : item.written;
}

/** Whether the item can stand where a value is expected, and whether a value then has been read. */
function isOperand(item: Item): boolean {
  return item.kind === 'literal' || item.kind === 'name';
}

const PREFIX_OPERATORS: ReadonlySet<string> = new Set(['-', '+', 'not']);
const NESTING_OPERATORS: ReadonlySet<string> = new Set(['^', '?', 'not']);

/** Walks the items once, so that what mathjs then reads has no implied product, no stray sign and no open end. */
function normalise(
  items: readonly Item[],
  variables: ReadonlySet<string>,
  whole: Span,
): { normalised: NormalisedExpression; diagnostics: Diagnostic[] } {
  const diagnostics: Diagnostic[] = [];
  const itemAt: number[] = [];
  const partner = new Map<number, number>();
  const brackets: number[] = [];
  let text = '';
  let expectOperand = true;
  let nesting = 0;
  const emit = (piece: string, index: number): void => {
    text += piece;
    for (let count = 0; count < piece.length; count += 1) itemAt.push(index);
  };
  const stop = (span: Span, code: string, message: string): boolean => {
    diagnostics.push(errorAt(span, code, message));
    return false;
  };

  const step = (item: Item, index: number): boolean => {
    const next = items[index + 1];
    if (isOperand(item) || item.kind === 'open') {
      const opensIndex = item.kind === 'open' && item.text === '[' && !expectOperand;
      if (!expectOperand && !opensIndex) return missingOperator(item, items[index - 1]);
    }
    if (item.kind === 'literal') {
      emit(`L${index} `, index);
      expectOperand = false;
    } else if (item.kind === 'name') {
      if (next?.kind === 'open' && next.text === '(') {
        if (!isFunctionName(item.text) && item.text !== 'spread') return unknownFunction(item);
        emit(`F${index}`, index);
      } else {
        emit(`L${index} `, index);
        expectOperand = false;
      }
    } else if (item.kind === 'open') {
      brackets.push(index);
      emit(item.text, index);
      expectOperand = true;
    } else if (item.kind === 'close') {
      if (expectOperand)
        return stop(item.span, 'value-missing', `A value is missing before “${item.written}”.`);
      const opener = brackets.pop();
      if (opener !== undefined) partner.set(opener, index);
      emit(item.text, index);
    } else if (item.kind === 'comma') {
      if (expectOperand) return stop(item.span, 'value-missing', 'A value is missing before this comma.');
      if (!separates(brackets.at(-1))) {
        return stop(
          item.span,
          'stray-comma',
          'A comma stands only between the values of a function or a list; a decimal number has a point, as 0.5.',
        );
      }
      emit(',', index);
      expectOperand = true;
    } else if (item.kind === 'operator') {
      const prefix = expectOperand && PREFIX_OPERATORS.has(item.text);
      if (expectOperand && !prefix)
        return stop(item.span, 'value-missing', `A value is missing before “${item.written}”.`);
      if (!expectOperand && item.text === 'not') {
        return stop(item.span, 'stray-not', 'Write `not` before a condition in brackets, as not (a < b).');
      }
      if (prefix || NESTING_OPERATORS.has(item.text)) nesting += 1;
      if (nesting > SCRIPT_LIMITS.nestedOperators) {
        return stop(
          item.span,
          'nesting-too-deep',
          'This statement nests too deep: split it into several named steps.',
        );
      }
      emit(` ${item.text} `, index);
      expectOperand = true;
    } else if (item.kind === 'assign') {
      return stop(
        item.span,
        'assign-in-expression',
        'One equals sign gives a name its value; to compare two values write ==.',
      );
    }
    return true;
  };

  /** Whether a comma has a meaning inside the bracket at `opener`. */
  const separates = (opener: number | undefined): boolean => {
    const bracket = opener === undefined ? undefined : items[opener];
    if (opener === undefined || bracket?.kind !== 'open') return false;
    const before = items[opener - 1];
    return bracket.text === '[' || before?.kind === 'name';
  };

  const missingOperator = (item: Item, before: Item | undefined): boolean => {
    const left = before === undefined ? '' : describeItem(before);
    const right = describeItem(item);
    const known =
      item.kind !== 'name' ||
      variables.has(item.text) ||
      CONSTANTS.has(item.text) ||
      isFunctionName(item.text);
    const afterNumber = before?.kind === 'literal';
    if (item.kind === 'name' && findUnitSymbol(item.written) !== null && !known) {
      return stop(
        item.span,
        'unit-not-after-number',
        `The unit ${right} must stand straight after a number, as 1 ${right}: multiply by it, as ${left} * 1 ${right}.`,
      );
    }
    if (!known && afterNumber) {
      return stop(item.span, 'unknown-unit', `“${right}” is neither a unit nor a name of this script.`);
    }
    diagnostics.push(
      errorAt(
        item.span,
        'operator-missing',
        `A sign is missing between “${left}” and “${right}”: to multiply, write * between them.`,
        {
          label: 'Multiply',
          span: { ...item.span, end: item.span.start },
          replacement: '* ',
        },
      ),
    );
    return false;
  };

  const unknownFunction = (item: Token): boolean => {
    const name = item.text;
    if (DRAWING_TABLE.has(name)) {
      return stop(
        item.span,
        'drawing-not-alone',
        `${name}(...) must stand alone: give it a line of its own and use its name here.`,
      );
    }
    if (variables.has(name) || CONSTANTS.has(name)) {
      return stop(
        item.span,
        'operator-missing',
        `A sign is missing between “${name}” and “(”: to multiply, write ${name} * (...).`,
      );
    }
    const instead =
      OTHER_NAMES.get(name.toLowerCase()) ?? mostSimilar(name, [...FUNCTION_TABLE.keys(), 'spread']);
    return stop(
      item.span,
      'unknown-function',
      `There is no function “${name}”.${instead === null ? '' : ` Write ${instead}.`}`,
    );
  };

  for (const [index, item] of items.entries()) if (!step(item, index)) break;
  if (expectOperand && diagnostics.length === 0) {
    const last = items.at(-1);
    stop(
      last?.span ?? whole,
      'value-missing',
      last === undefined
        ? 'An expression is missing here.'
        : `A value is missing after “${describeItem(last)}”.`,
    );
  }
  return { normalised: { text, items, itemAt, partner }, diagnostics };
}

/**
 * Reads the tokens of one expression into a tree. `variables` are all names that the script defines, `whole`
 * is where an empty expression is reported.
 */
export function parseExpression(
  tokens: readonly Token[],
  variables: ReadonlySet<string>,
  whole: Span,
): { tree: ExpressionTree | null; diagnostics: Diagnostic[] } {
  const joined = joinUnitLiterals(tokens, variables);
  if (hasError(joined.diagnostics)) return { tree: null, diagnostics: joined.diagnostics };
  const first = tokens[0];
  const last = tokens.at(-1);
  const span = first === undefined || last === undefined ? whole : joinSpans(first.span, last.span);
  const { normalised, diagnostics } = normalise(joined.items, variables, span);
  if (diagnostics.length > 0) return { tree: null, diagnostics };
  return readMathTree(normalised, span);
}
