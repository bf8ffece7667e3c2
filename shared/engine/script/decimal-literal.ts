import type { Unit } from '../units/unit.ts';
import type { ExpressionTree } from './expression-tree.ts';

/** A signed number literal taken apart exactly: `digits × 10^exponent` of its unit. */
export interface DecimalLiteral {
  digits: number;
  exponent: number;
  unit: Unit;
}

/** Takes a literal or a negated literal apart; null for anything else, or for more digits than doubles hold. */
export function decimalLiteral(tree: ExpressionTree): DecimalLiteral | null {
  if (tree.kind === 'negate') {
    const inner = decimalLiteral(tree.operand);
    return inner === null ? null : { ...inner, digits: 0 - inner.digits };
  }
  if (tree.kind !== 'number') return null;
  const match = /^(\d*)\.?(\d*)(?:[eE]([+-]?\d+))?$/.exec(tree.literal);
  if (match === null) return null;
  const [, whole = '', decimals = '', exponent = '0'] = match;
  const digits = Number(whole + decimals);
  return Number.isSafeInteger(digits)
    ? { digits, exponent: Number(exponent) - decimals.length, unit: tree.unit }
    : null;
}
