import type { BinaryOperator, ExpressionTree } from '../script/expression-tree.ts';
import type { FunctionName } from '../script/functions.ts';
import { roundInUnit } from '../units/rounding.ts';
import { compares, power, spreadValue, UNARY_FUNCTIONS } from './scalar-math.ts';
import { interceptOf, meanOf, quantumOf, slopeOf, sumOf } from './series-math.ts';

/** A number, or the values of a series; a condition is 1 or 0. */
export type PlainValue = number | readonly number[];

/** What names and constants stand for. */
export interface PlainScope {
  name(name: string): PlainValue;
  constant(name: string): number;
}

function apply(operator: BinaryOperator, a: number, b: number): number {
  switch (operator) {
    case '+':
      return a + b;
    case '-':
      return a - b;
    case '*':
      return a * b;
    case '/':
      return a / b;
    case '^':
      return power(a, b);
  }
}

function one(value: PlainValue): number {
  return typeof value === 'number' ? value : NaN;
}

function many(value: PlainValue): readonly number[] {
  return typeof value === 'number' ? [value] : value;
}

/** Elementwise work on values of which some may be series. */
function elementwise(values: readonly PlainValue[], work: (...numbers: number[]) => number): PlainValue {
  const series = values.find((value) => typeof value !== 'number');
  if (series === undefined || typeof series === 'number') return work(...values.map(one));
  return series.map((_, index) =>
    work(...values.map((value) => (typeof value === 'number' ? value : (value[index] ?? NaN)))),
  );
}

function call(name: FunctionName, values: readonly PlainValue[]): PlainValue {
  const unary = UNARY_FUNCTIONS.get(name);
  if (unary !== undefined) return elementwise(values, (x = NaN) => unary(x));
  const [first = NaN, second = NaN] = values;
  switch (name) {
    case 'min':
      return elementwise(values, Math.min);
    case 'max':
      return elementwise(values, Math.max);
    case 'mean':
      return meanOf(many(first));
    case 'least':
      return Math.min(...many(first));
    case 'greatest':
      return Math.max(...many(first));
    case 'sum':
      return sumOf(many(first));
    case 'slope':
      return slopeOf(many(first), many(second));
    case 'intercept':
      return interceptOf(many(first), many(second));
    case 'quantum':
      return quantumOf(many(first));
    default:
      return NaN;
  }
}

function holds(value: PlainValue): boolean {
  return typeof value === 'number' && value !== 0 && !Number.isNaN(value);
}

/** Evaluates a tree for one draw, one node at a time: the reference that the block evaluator must equal. */
export function evaluateTree(tree: ExpressionTree, scope: PlainScope): PlainValue {
  const of = (part: ExpressionTree): PlainValue => evaluateTree(part, scope);
  switch (tree.kind) {
    case 'number':
      return tree.value;
    case 'name':
      return scope.name(tree.name);
    case 'constant':
      return scope.constant(tree.name);
    case 'negate':
      return elementwise([of(tree.operand)], (x = NaN) => -x);
    case 'rounded':
      return elementwise([of(tree.operand)], (x = NaN) => roundInUnit(x, tree.figures, tree.unit));
    case 'binary':
      return elementwise([of(tree.left), of(tree.right)], (a = NaN, b = NaN) => apply(tree.operator, a, b));
    case 'call':
      return call(tree.function, tree.arguments.map(of));
    case 'compare': {
      const operands = tree.operands.map(of);
      const all = tree.operators.every((operator, index) => {
        const pair = elementwise([operands[index] ?? NaN, operands[index + 1] ?? NaN], (a = NaN, b = NaN) =>
          compares(operator, a, b) ? 1 : 0,
        );
        return many(pair).every((value) => value === 1);
      });
      return all ? 1 : 0;
    }
    case 'logic': {
      const left = holds(of(tree.left));
      const right = holds(of(tree.right));
      return (tree.operator === 'and' ? left && right : left || right) ? 1 : 0;
    }
    case 'not':
      return holds(of(tree.operand)) ? 0 : 1;
    case 'choose': {
      const condition = holds(of(tree.condition));
      return elementwise([of(tree.whenTrue), of(tree.whenFalse)], (yes = NaN, no = NaN) =>
        condition ? yes : no,
      );
    }
    case 'list':
      return tree.elements.map((element) => one(of(element)));
    case 'spread': {
      const from = one(of(tree.from));
      const to = one(of(tree.to));
      return Array.from({ length: tree.count }, (_, index) => spreadValue(from, to, tree.count, index));
    }
    case 'element':
      return many(of(tree.series))[tree.index - 1] ?? NaN;
  }
}
