import { rational, type Rational } from '../units/dimension.ts';
import type { ExpressionTree } from './expression-tree.ts';

function combine(operator: string, a: Rational, b: Rational): Rational | null {
  switch (operator) {
    case '+':
      return rational(a[0] * b[1] + b[0] * a[1], a[1] * b[1]);
    case '-':
      return rational(a[0] * b[1] - b[0] * a[1], a[1] * b[1]);
    case '*':
      return rational(a[0] * b[0], a[1] * b[1]);
    case '/':
      return b[0] === 0 ? null : rational(a[0] * b[1], a[1] * b[0]);
    default:
      return null;
  }
}

/** Fractions beyond this size are not exponents that anyone means. */
const LARGEST_PART = 1_000_000;

/** The exact fraction that a tree of plain number literals stands for, as 3/2, 0.5 or -1; null when it is none. */
export function exactFraction(tree: ExpressionTree): Rational | null {
  if (tree.kind === 'number') {
    if (tree.unit.text !== '') return null;
    const decimals = /^(\d{0,6})\.?(\d{0,6})$/.exec(tree.literal);
    if (decimals === null) return null;
    const [, whole = '', part = ''] = decimals;
    return rational(Number(whole + part), 10 ** part.length);
  }
  if (tree.kind === 'negate') {
    const value = exactFraction(tree.operand);
    return value === null ? null : rational(-value[0], value[1]);
  }
  if (tree.kind !== 'binary') return null;
  const left = exactFraction(tree.left);
  const right = exactFraction(tree.right);
  const result = left === null || right === null ? null : combine(tree.operator, left, right);
  return result !== null && Math.abs(result[0]) <= LARGEST_PART && result[1] <= LARGEST_PART ? result : null;
}
