import { create, parseDependencies, type MathNode } from 'mathjs';
import type { Diagnostic, Span } from '../diagnostics/diagnostic.ts';
import { errorAt, joinSpans } from '../diagnostics/spans.ts';
import { CONSTANTS } from '../physics/constants.ts';
import type { BinaryOperator, ComparisonOperator, ExpressionTree } from './expression-tree.ts';
import { isFunctionName } from './functions.ts';
import { SCRIPT_LIMITS } from './limits.ts';
import type { NormalisedExpression } from './normalised-expression.ts';

const { parse } = create(parseDependencies ?? {});

const BINARY: ReadonlyMap<string, BinaryOperator> = new Map([
  ['add', '+'],
  ['subtract', '-'],
  ['multiply', '*'],
  ['divide', '/'],
  ['pow', '^'],
]);
const COMPARISONS: ReadonlyMap<string, ComparisonOperator> = new Map([
  ['smaller', '<'],
  ['smallerEq', '<='],
  ['larger', '>'],
  ['largerEq', '>='],
  ['equal', '=='],
  ['unequal', '!='],
]);

/** The parts of mathjs's nodes that are read here; its own types say no more of a node whose kind is not known. */
interface NodeView {
  type: string;
  name?: string;
  fn?: string | NodeView;
  args?: NodeView[];
  content?: NodeView;
  condition?: NodeView;
  trueExpr?: NodeView;
  falseExpr?: NodeView;
  items?: NodeView[];
  object?: NodeView;
  index?: NodeView;
  dimensions?: NodeView[];
  conditionals?: string[];
  params?: NodeView[];
}

/** A mistake found while walking the tree; thrown and caught in this file alone. */
class TreeProblem extends Error {
  readonly diagnostic: Diagnostic;

  constructor(diagnostic: Diagnostic) {
    super(diagnostic.message);
    this.diagnostic = diagnostic;
  }
}

/** Turns mathjs's tree into ours; a node's span is the union of its leaves' spans, with the brackets round them. */
class TreeReader {
  private readonly source: NormalisedExpression;
  private readonly whole: Span;

  constructor(source: NormalisedExpression, whole: Span) {
    this.source = source;
    this.whole = whole;
  }

  read(node: NodeView | undefined): ExpressionTree {
    switch (node?.type) {
      case 'ParenthesisNode':
        return this.read(node.content);
      case 'SymbolNode':
        return this.leaf(node);
      case 'OperatorNode':
        return this.operator(node);
      case 'RelationalNode':
        return this.compare(node.conditionals ?? [], node.params ?? []);
      case 'ConditionalNode': {
        const condition = this.read(node.condition);
        const whenTrue = this.read(node.trueExpr);
        const whenFalse = this.read(node.falseExpr);
        return {
          kind: 'choose',
          condition,
          whenTrue,
          whenFalse,
          span: joinSpans(condition.span, whenFalse.span),
        };
      }
      case 'FunctionNode':
        return this.call(node);
      case 'ArrayNode':
        return this.list(node);
      case 'AccessorNode':
        return this.element(node);
      default:
        return this.fail(
          this.whole,
          'unreadable',
          'This expression cannot be read: split it into several named steps.',
        );
    }
  }

  private fail(span: Span, code: string, message: string): never {
    throw new TreeProblem(errorAt(span, code, message));
  }

  /** Index of the item that a leaf or function of mathjs's tree stands for. */
  private itemIndex(name: string | undefined): number {
    return Number((name ?? '').slice(1));
  }

  private leaf(node: NodeView): ExpressionTree {
    const item = this.source.items[this.itemIndex(node.name)];
    if (item?.kind === 'literal') return item.tree;
    if (item?.kind === 'name') {
      return { kind: CONSTANTS.has(item.text) ? 'constant' : 'name', name: item.text, span: item.span };
    }
    return this.fail(this.whole, 'unreadable', 'This expression cannot be read.');
  }

  private operator(node: NodeView): ExpressionTree {
    const name = typeof node.fn === 'string' ? node.fn : '';
    const [first, second] = (node.args ?? []).map((argument) => this.read(argument));
    if (first === undefined) return this.fail(this.whole, 'unreadable', 'This expression cannot be read.');
    if (second === undefined) {
      if (name === 'unaryPlus') return first;
      if (name === 'not') return { kind: 'not', operand: first, span: first.span };
      return { kind: 'negate', operand: first, span: this.withSignBefore(first.span) };
    }
    const span = joinSpans(first.span, second.span);
    const binary = BINARY.get(name);
    if (binary !== undefined) return { kind: 'binary', operator: binary, left: first, right: second, span };
    const comparison = COMPARISONS.get(name);
    if (comparison !== undefined) {
      return { kind: 'compare', operators: [comparison], operands: [first, second], span };
    }
    if (name === 'and' || name === 'or') {
      return { kind: 'logic', operator: name, left: first, right: second, span };
    }
    return this.fail(span, 'unreadable', 'This sign has no meaning here.');
  }

  /** The span with the minus sign that stands straight before it. */
  private withSignBefore(span: Span): Span {
    const index = this.source.items.findIndex((item) => item.span.start === span.start);
    const sign = this.source.items[index - 1];
    return sign?.kind === 'operator' && sign.text === '-' ? joinSpans(sign.span, span) : span;
  }

  /** The span from the square bracket that opens before `first` to its partner. */
  private withSquareBrackets(first: Span, last: Span): Span {
    const { items, partner } = this.source;
    let index = items.findIndex((item) => item.span.start === first.start) - 1;
    for (; index >= 0; index -= 1) {
      const item = items[index];
      const close = items[partner.get(index) ?? -1];
      if (item?.kind === 'open' && item.text === '[' && close !== undefined && close.span.start >= last.end) {
        return joinSpans(item.span, close.span);
      }
    }
    return joinSpans(first, last);
  }

  private compare(conditionals: readonly string[], params: readonly NodeView[]): ExpressionTree {
    const operands = params.map((param) => this.read(param));
    const operators = conditionals.flatMap((name) => COMPARISONS.get(name) ?? []);
    const first = operands[0];
    const last = operands.at(-1);
    const span = first === undefined || last === undefined ? this.whole : joinSpans(first.span, last.span);
    return { kind: 'compare', operators, operands, span };
  }

  private call(node: NodeView): ExpressionTree {
    const index = this.itemIndex(typeof node.fn === 'object' ? node.fn.name : node.name);
    const item = this.source.items[index];
    const close = this.source.items[this.source.partner.get(index + 1) ?? index];
    const callArguments = (node.args ?? []).map((argument) => this.read(argument));
    if (item?.kind !== 'name' || close === undefined) {
      return this.fail(this.whole, 'unreadable', 'This expression cannot be read.');
    }
    const span = joinSpans(item.span, close.span);
    if (isFunctionName(item.text))
      return { kind: 'call', function: item.text, arguments: callArguments, span };
    const [from, to, count] = callArguments;
    if (from === undefined || to === undefined || count === undefined || callArguments.length !== 3) {
      return this.fail(span, 'argument-count', 'spread takes three values: spread(from, to, count).');
    }
    return {
      kind: 'spread',
      from,
      to,
      count: this.wholeNumber(count, 2, SCRIPT_LIMITS.seriesElements, 'The count of a spread'),
      span,
    };
  }

  private list(node: NodeView): ExpressionTree {
    const elements = (node.items ?? []).map((element) => this.read(element));
    const first = elements[0];
    const last = elements.at(-1);
    if (first === undefined || last === undefined)
      return this.fail(this.whole, 'list-empty', 'A list holds at least one value.');
    const span = this.withSquareBrackets(first.span, last.span);
    if (elements.length > SCRIPT_LIMITS.seriesElements) {
      return this.fail(
        span,
        'series-too-long',
        `A series may have at most ${SCRIPT_LIMITS.seriesElements} values.`,
      );
    }
    return { kind: 'list', elements, span };
  }

  private element(node: NodeView): ExpressionTree {
    const series = this.read(node.object);
    const places = node.index?.dimensions ?? [];
    const place = places[0];
    if (place === undefined || places.length !== 1) {
      return this.fail(
        series.span,
        'index',
        'One number in square brackets picks a value of a series, as q[2].',
      );
    }
    const tree = this.read(place);
    const index = this.wholeNumber(tree, 1, SCRIPT_LIMITS.seriesElements, 'The place of a value in a series');
    const { end } = this.withSquareBrackets(tree.span, tree.span);
    return { kind: 'element', series, index, span: { ...joinSpans(series.span, tree.span), end } };
  }

  private wholeNumber(tree: ExpressionTree, least: number, greatest: number, what: string): number {
    if (tree.kind === 'number' && tree.unit.text === '' && Number.isInteger(tree.value)) {
      if (tree.value >= least && tree.value <= greatest) return tree.value;
    }
    return this.fail(tree.span, 'whole-number', `${what} is a whole number from ${least} to ${greatest}.`);
  }
}

/** Reads a normalised expression by mathjs and gives our tree, or the mistake and its place. */
export function readMathTree(
  source: NormalisedExpression,
  whole: Span,
): { tree: ExpressionTree | null; diagnostics: Diagnostic[] } {
  let node: MathNode;
  try {
    node = parse(source.text);
  } catch (error) {
    if (!(error instanceof SyntaxError)) throw error;
    const at = 'char' in error && typeof error.char === 'number' ? error.char - 1 : source.text.length - 1;
    const item = source.items[source.itemAt[at] ?? -1];
    const conditional = source.text.includes('?') || source.text.includes(':');
    const message = conditional
      ? 'This choice cannot be read: write condition ? value when true : value when false.'
      : 'This expression cannot be read here: check the signs and brackets.';
    return { tree: null, diagnostics: [errorAt(item?.span ?? whole, 'unreadable', message)] };
  }
  try {
    return { tree: new TreeReader(source, whole).read(node), diagnostics: [] };
  } catch (error) {
    if (error instanceof TreeProblem) return { tree: null, diagnostics: [error.diagnostic] };
    throw error;
  }
}
