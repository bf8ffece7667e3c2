import { buildExpression, type CompiledExpression } from '../compile/expressions.ts';
import { workingOf } from '../compile/working.ts';
import type { ExpressionTree } from '../script/expression-tree.ts';
import { expressionText } from '../script/expression-text.ts';
import { childrenOf, mapChildren } from '../script/walk-tree.ts';
import { sameDimension } from '../units/dimension.ts';
import { NO_UNIT } from '../units/unit.ts';
import type { AssayContext, AssayPart } from './context.ts';

/** A wrong working made from the right one. */
export interface NearMiss {
  label: string;
  expression: CompiledExpression;
  /** Fixed factor on the value, where the mistake is one of units and not of the expression. */
  factor: number;
}

interface Variant {
  label: string;
  tree: ExpressionTree;
}

/** More than this would bury the strip. */
const MOST_NEAR_MISSES = 24;

const OTHER_MASSES: readonly [string, string, string][] = [
  ['m_e', 'm_p', 'the mass of a proton taken'],
  ['m_p', 'm_e', 'the mass of an electron taken'],
  ['m_n', 'm_e', 'the mass of an electron taken'],
  ['m_alpha', 'm_p', 'the mass of a proton taken'],
];

function name(tree: ExpressionTree): string {
  const text = expressionText(tree);
  return text.length > 24 ? 'the bracket' : `“${text}”`;
}

/** Every tree that differs from `tree` in one place, where `change` gives what may stand there instead. */
function everywhere(tree: ExpressionTree, change: (node: ExpressionTree) => Variant[]): Variant[] {
  const here = change(tree);
  const children = childrenOf(tree);
  const inner = children.flatMap((child, at) =>
    everywhere(child, change).map(({ label, tree: replacement }) => {
      let index = -1;
      return {
        label,
        tree: mapChildren(tree, (original) => {
          index += 1;
          return index === at ? replacement : original;
        }),
      };
    }),
  );
  return [...here, ...inner];
}

function isPlainNumber(tree: ExpressionTree): boolean {
  return tree.kind === 'number' && tree.unit.text === '';
}

/** The wrong workings that one node invites. */
function mistakesAt(node: ExpressionTree): Variant[] {
  if (node.kind === 'binary') {
    const { operator, left, right } = node;
    if (operator === '*' && isPlainNumber(left)) {
      return [{ label: `the factor ${expressionText(left)} left out`, tree: right }];
    }
    if (operator === '/' && isPlainNumber(right)) {
      return [{ label: `the division by ${expressionText(right)} left out`, tree: left }];
    }
    if (operator === '^' && isPlainNumber(right)) {
      return [{ label: `the power of ${name(left)} left out`, tree: left }];
    }
    if (operator === '+' || operator === '-') {
      return [
        { label: `${name(right)} left out`, tree: left },
        {
          label: `${name(right)} taken with the wrong sign`,
          tree: { ...node, operator: operator === '+' ? '-' : '+' },
        },
      ];
    }
    if (operator === '/') {
      return [{ label: `${name(node)} upside down`, tree: { ...node, left: right, right: left } }];
    }
  }
  if (node.kind === 'call' && (node.function === 'sqrt' || node.function === 'cbrt')) {
    const [inside] = node.arguments;
    return inside === undefined ? [] : [{ label: 'the root left out', tree: inside }];
  }
  if (node.kind === 'constant') {
    const swap = OTHER_MASSES.find(([constant]) => constant === node.name);
    if (swap !== undefined) return [{ label: swap[2], tree: { ...node, name: swap[1] } }];
  }
  return [];
}

/** Names of the same dimension, one taken for another. */
function exchanged(context: AssayContext, tree: ExpressionTree): Variant[] {
  const printed = context.script.quantities.filter(
    (quantity) => quantity.kind !== 'computed' && quantity.shape.kind === 'scalar',
  );
  return everywhere(tree, (node) => {
    if (node.kind !== 'name') return [];
    const own = context.script.quantities.find((quantity) => quantity.name === node.name);
    if (own === undefined) return [];
    return printed
      .filter((other) => other.name !== node.name && sameDimension(other.dimension, own.dimension))
      .map((other) => ({
        label: `“${other.name}” taken for “${node.name}”`,
        tree: { ...node, name: other.name },
      }));
  });
}

/** Radii and diameters, half and whole, in lengths that are printed. */
function halved(context: AssayContext, tree: ExpressionTree): Variant[] {
  const radii = new Map(context.content.quantities.map((quantity) => [quantity.name, quantity.role ?? '']));
  return everywhere(tree, (node) => {
    if (node.kind !== 'name') return [];
    const role = radii.get(node.name) ?? '';
    const two = (operator: '*' | '/'): ExpressionTree => ({
      kind: 'binary',
      operator,
      left: node,
      right: { kind: 'number', literal: '2', value: 2, unit: NO_UNIT, span: node.span },
      span: node.span,
    });
    if (/radius/i.test(role)) return [{ label: `the diameter taken for “${node.name}”`, tree: two('*') }];
    if (/diameter/i.test(role)) return [{ label: `the radius taken for “${node.name}”`, tree: two('/') }];
    return [];
  });
}

/**
 * Wrong workings that an answer's own working invites. Those that give the same expression are one; a tree
 * that makes no sense is left out. Dimensions need not fit: candidates do not check them.
 */
export function nearMissesOf(context: AssayContext, part: AssayPart): NearMiss[] {
  const tree = workingOf(context.script, part.info.name);
  if (tree === null) return [];
  const variants = [...everywhere(tree, mistakesAt), ...exchanged(context, tree), ...halved(context, tree)];
  const misses: NearMiss[] = [];
  const seen = new Set([expressionText(tree)]);
  for (const { label, tree: wrong } of variants) {
    const text = expressionText(wrong);
    if (seen.has(text) || misses.length >= MOST_NEAR_MISSES) continue;
    seen.add(text);
    const { expression } = buildExpression(context.script, wrong);
    if (expression !== null && expression.shape.kind === 'scalar')
      misses.push({ label, expression, factor: 1 });
  }
  const own = buildExpression(context.script, tree).expression;
  if (own !== null) {
    if (/radius/i.test(roleOf(context, part.info.name))) {
      misses.push({ label: 'the diameter given for the radius', expression: own, factor: 2 });
    }
    if (/diameter/i.test(roleOf(context, part.info.name))) {
      misses.push({ label: 'the radius given for the diameter', expression: own, factor: 0.5 });
    }
  }
  return misses;
}

function roleOf(context: AssayContext, of: string): string {
  return context.content.quantities.find((quantity) => quantity.name === of)?.role ?? '';
}
