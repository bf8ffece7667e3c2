import type { ComparisonOperator } from '../script/expression-tree.ts';
import type { FunctionName } from '../script/functions.ts';

/**
 * x to the power y. The powers that formulas are full of are products and roots: one correctly rounded step
 * each, and the same in every evaluator.
 */
export function power(x: number, y: number): number {
  switch (y) {
    case 1:
      return x;
    case 2:
      return x * x;
    case 3:
      return x * x * x;
    case 4:
      return x * x * (x * x);
    case -1:
      return 1 / x;
    case -2:
      return 1 / (x * x);
    case 0.5:
      return Math.sqrt(x);
    default:
      return x ** y;
  }
}

/** The nearest whole number, halves away from zero. */
function roundHalfAway(x: number): number {
  const size = Math.abs(x);
  const whole = Math.floor(size);
  return Math.sign(x) * (size - whole >= 0.5 ? whole + 1 : whole);
}

/** Functions of one number, by name. */
export const UNARY_FUNCTIONS: ReadonlyMap<FunctionName, (x: number) => number> = new Map([
  ['sqrt', Math.sqrt],
  ['cbrt', Math.cbrt],
  ['exp', Math.exp],
  ['ln', Math.log],
  ['log10', Math.log10],
  ['sin', Math.sin],
  ['cos', Math.cos],
  ['tan', Math.tan],
  ['asin', Math.asin],
  ['acos', Math.acos],
  ['atan', Math.atan],
  ['abs', Math.abs],
  ['floor', Math.floor],
  ['ceil', Math.ceil],
  ['round', roundHalfAway],
]);

/** Whether a comparison holds; any comparison with NaN but `!=` fails. */
export function compares(operator: ComparisonOperator, a: number, b: number): boolean {
  switch (operator) {
    case '<':
      return a < b;
    case '<=':
      return a <= b;
    case '>':
      return a > b;
    case '>=':
      return a >= b;
    case '==':
      return a === b;
    case '!=':
      return a !== b;
  }
}

/** `count` values in equal steps, both ends exact. */
export function spreadValue(from: number, to: number, count: number, index: number): number {
  return index === count - 1 ? to : from + ((to - from) * index) / (count - 1);
}
