import { CONSTANTS } from '../physics/constants.ts';
import { isDimensionless, sameDimension, type Dimension } from '../units/dimension.ts';
import { readUnit } from '../units/read-unit.ts';
import { NO_UNIT, type Unit } from '../units/unit.ts';
import type { ExpressionTree } from './expression-tree.ts';
import type { Scope } from './scope.ts';

/**
 * The unit that an expression's own literals and names suggest for its value, or null when they say nothing:
 * `Va` drawn in kV makes `Va / 2` and `Va + 10 V` speak of kV, `Va * e` of no unit in particular.
 */
export function suggestUnit(tree: ExpressionTree, scope: Scope): Unit | null {
  switch (tree.kind) {
    case 'number':
      return tree.unit.text === '' ? null : tree.unit;
    case 'name':
      return scope.defined.get(tree.name)?.unit ?? null;
    case 'constant': {
      const reading = readUnit(CONSTANTS.get(tree.name)?.unit ?? '');
      return reading.ok && reading.unit.text !== '' ? reading.unit : null;
    }
    case 'negate':
    case 'rounded':
      return suggestUnit(tree.operand, scope);
    case 'binary':
      return suggestForBinary(tree, scope);
    case 'call':
      if (['abs', 'min', 'max', 'mean', 'least', 'greatest', 'sum', 'quantum'].includes(tree.function)) {
        return firstUnit(tree.arguments, scope);
      }
      return tree.function === 'intercept' ? firstUnit(tree.arguments.slice(1), scope) : null;
    case 'choose':
      return suggestUnit(tree.whenTrue, scope) ?? suggestUnit(tree.whenFalse, scope);
    case 'list':
      return firstUnit(tree.elements, scope);
    case 'spread':
      return suggestUnit(tree.from, scope) ?? suggestUnit(tree.to, scope);
    case 'element':
      return suggestUnit(tree.series, scope);
    case 'compare':
    case 'logic':
    case 'not':
      return null;
  }
}

function firstUnit(trees: readonly ExpressionTree[], scope: Scope): Unit | null {
  for (const tree of trees) {
    const unit = suggestUnit(tree, scope);
    if (unit !== null) return unit;
  }
  return null;
}

/** Whether a tree is certainly a plain number: a literal without unit, or a name or product made of such. */
function isPlain(tree: ExpressionTree, scope: Scope): boolean {
  if (tree.kind === 'number') return isDimensionless(tree.unit.dimension);
  if (tree.kind === 'constant')
    return isDimensionless(CONSTANTS.get(tree.name)?.dimension ?? NO_UNIT.dimension);
  if (tree.kind === 'name') {
    const type = scope.defined.get(tree.name)?.type;
    return type !== null && type !== undefined && isDimensionless(type.dimension);
  }
  if (tree.kind === 'negate') return isPlain(tree.operand, scope);
  return tree.kind === 'binary' && isPlain(tree.left, scope) && isPlain(tree.right, scope);
}

function suggestForBinary(tree: Extract<ExpressionTree, { kind: 'binary' }>, scope: Scope): Unit | null {
  const { operator, left, right } = tree;
  if (operator === '+' || operator === '-') return suggestUnit(left, scope) ?? suggestUnit(right, scope);
  if (operator === '*' && isPlain(left, scope)) return suggestUnit(right, scope);
  if ((operator === '*' || operator === '/') && isPlain(right, scope)) return suggestUnit(left, scope);
  return null;
}

/** The suggested unit where it has the dimension of the value, else null. */
export function suggestUnitFor(tree: ExpressionTree, scope: Scope, dimension: Dimension): Unit | null {
  const unit = suggestUnit(tree, scope);
  return unit !== null && sameDimension(unit.dimension, dimension) ? unit : null;
}
