import { buildExpression, evaluateExpression } from '../compile/expressions.ts';
import type { BlockValues } from '../compile/compiled-script.ts';
import { evaluateBlock } from '../compile/evaluate.ts';
import { workingOf } from '../compile/working.ts';
import { expressionText } from '../script/expression-text.ts';
import type { ExpressionTree } from '../script/expression-tree.ts';
import { childrenOf } from '../script/walk-tree.ts';
import { formatNumber } from '../units/format.ts';
import type { AssayContext } from './context.ts';

/** Value of a part of a working on the only draw of `values`; null where it is no scalar. */
function valueOf(context: AssayContext, tree: ExpressionTree, values: BlockValues): number | null {
  const { expression } = buildExpression(context.script, tree);
  if (expression?.shape.kind !== 'scalar') return null;
  return evaluateExpression(expression, values)[0] ?? null;
}

/** The innermost part that has no finite value although all that stands in it has. */
function firstUndefined(context: AssayContext, tree: ExpressionTree, values: BlockValues): ExpressionTree {
  for (const child of childrenOf(tree)) {
    const value = valueOf(context, child, values);
    if (value !== null && !Number.isFinite(value)) return firstUndefined(context, child, values);
  }
  return tree;
}

const number = (value: number) => formatNumber(value, { figures: 3 }).text;

function reason(context: AssayContext, tree: ExpressionTree, values: BlockValues): string {
  const text = expressionText(tree);
  if (tree.kind === 'binary' && tree.operator === '/') {
    if (valueOf(context, tree.right, values) === 0) {
      return `it divides by “${expressionText(tree.right)}”, which is zero`;
    }
  }
  if (tree.kind === 'call') {
    const [inside] = tree.arguments;
    const value = inside === undefined ? null : valueOf(context, inside, values);
    if (inside !== undefined && value !== null && Number.isFinite(value)) {
      const what = `“${expressionText(inside)}”`;
      if (tree.function === 'sqrt' && value < 0) return `it takes the root of ${what}, which is negative`;
      if ((tree.function === 'ln' || tree.function === 'log10') && value <= 0) {
        return `it takes the logarithm of ${what}, which is ${value === 0 ? 'zero' : 'negative'}`;
      }
      if ((tree.function === 'asin' || tree.function === 'acos') && Math.abs(value) > 1) {
        const name = tree.function === 'asin' ? 'sine' : 'cosine';
        return `it asks for the angle whose ${name} is ${what}, which is ${number(value)}: no ${name} lies beyond one`;
      }
    }
  }
  const value = valueOf(context, tree, values);
  if (value === Infinity || value === -Infinity) return `“${text}” grows beyond all bounds`;
  return `“${text}” is not a number`;
}

/** Why a name has no finite value on a draw, in words that end a sentence. */
export function whyUndefined(context: AssayContext, name: string, draw: number): string {
  const values = evaluateBlock(context.script, Float64Array.of(draw), { conditions: false });
  const tree = workingOf(context.script, name);
  if (tree === null) return 'it is not a number';
  return reason(context, firstUndefined(context, tree, values), values);
}
