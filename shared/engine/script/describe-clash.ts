import { divideDimensions } from '../units/dimension.ts';
import { describeDimension, kindOfDimension } from '../units/quantity-kinds.ts';
import { expressionText } from './expression-text.ts';
import type { ExpressionTree } from './expression-tree.ts';
import type { Scope, ValueType } from './scope.ts';
import { suggestUnitFor } from './suggest-unit.ts';

/** An expression with what it was found to be. */
export interface TypedTree {
  tree: ExpressionTree;
  type: ValueType;
}

/** The longest piece of an expression that a message quotes. */
const QUOTED_LENGTH = 48;

/** A piece of the script between backticks, shortened. */
export function quote(tree: ExpressionTree): string {
  const text = expressionText(tree);
  return `\`${text.length > QUOTED_LENGTH ? `${text.slice(0, QUOTED_LENGTH)}…` : text}\``;
}

/** A value in words with its own unit: `Va` is a potential difference (kV). */
export function describeValue(tree: ExpressionTree, type: ValueType, scope: Scope): string {
  if (type.shape.kind === 'condition') return `${quote(tree)} is a condition`;
  const unit = suggestUnitFor(tree, scope, type.dimension)?.text;
  return `${quote(tree)} is ${describeDimension(type.dimension, unit)}`;
}

function withArticle(kind: string): string {
  return `${/^[aeiou]/.test(kind) ? 'an' : 'a'} ${kind}`;
}

/** What two values of different dimension are, what therefore cannot be done, and what would most likely cure it. */
export function describeClash(left: TypedTree, right: TypedTree, what: string, scope: Scope): string {
  const said = `${describeValue(left.tree, left.type, scope)}; ${describeValue(right.tree, right.type, scope)}: ${what}.`;
  return `${said} ${cureFor(left, right)}`;
}

function cureFor(left: TypedTree, right: TypedTree): string {
  for (const { tree } of [left, right]) {
    const bare = tree.kind === 'negate' ? tree.operand : tree;
    if (bare.kind === 'number' && bare.unit.text === '')
      return `Write the unit straight after ${bare.literal}.`;
  }
  for (const [greater, lesser] of [
    [left, right],
    [right, left],
  ] as const) {
    const factor = kindOfDimension(divideDimensions(greater.type.dimension, lesser.type.dimension));
    if (factor !== null) {
      return `Is ${quote(lesser.tree)} to be multiplied by ${withArticle(factor)}, or ${quote(greater.tree)} divided by one?`;
    }
  }
  return 'Is a bracket, a power or a factor missing?';
}
