import type { Span } from '../diagnostics/diagnostic.ts';
import { expressionText } from '../script/expression-text.ts';
import type { ExpressionTree, NumberTree } from '../script/expression-tree.ts';
import { childrenOf, mapChildren } from '../script/walk-tree.ts';
import { NO_UNIT } from '../units/unit.ts';

/** A tree with a mistake in it, and what the mistake is. */
export interface Variant {
  label: string;
  tree: ExpressionTree;
}

/** Longer expressions are called the bracket. */
const LONGEST_NAMED = 40;

const OTHER_MASSES: readonly (readonly [constant: string, other: string, label: string])[] = [
  ['m_e', 'm_p', 'the mass of a proton taken'],
  ['m_p', 'm_e', 'the mass of an electron taken'],
  ['m_n', 'm_e', 'the mass of an electron taken'],
  ['m_alpha', 'm_p', 'the mass of a proton taken'],
];

const OTHER_FUNCTIONS = { sin: 'cos', cos: 'sin', tan: 'sin' } as const;

/** A number without a unit, as `1.602e-19`. */
export function plainNumber(literal: string, span: Span): NumberTree {
  return { kind: 'number', literal, value: Number(literal), unit: NO_UNIT, span };
}

function named(tree: ExpressionTree): string {
  const text = expressionText(tree);
  return text.length > LONGEST_NAMED ? 'the bracket' : `“${text}”`;
}

/** A number that stands alone, as 2 or 4/3. */
function isPlain(tree: ExpressionTree): boolean {
  if (tree.kind === 'number') return tree.unit.text === '';
  return tree.kind === 'binary' && isPlain(tree.left) && isPlain(tree.right);
}

/** Every tree that differs from `tree` in one place, where `change` gives what may stand there instead. */
export function everywhere(tree: ExpressionTree, change: (node: ExpressionTree) => Variant[]): Variant[] {
  const inner = childrenOf(tree).flatMap((child, at) =>
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
  return [...change(tree), ...inner];
}

function hasRoot(tree: ExpressionTree): boolean {
  return tree.kind === 'call' && tree.function === 'sqrt';
}

function mistakesOfBinary(node: Extract<ExpressionTree, { kind: 'binary' }>): Variant[] {
  const { operator, left, right } = node;
  switch (operator) {
    case '*':
      return [
        ...(isPlain(left) ? [{ label: `the factor ${expressionText(left)} left out`, tree: right }] : []),
        // Twos and halves are what candidates count double.
        ...(left.kind === 'number' && isPlain(left) && (left.value === 2 || left.value === 0.5)
          ? [{ label: `the factor ${left.literal} taken twice`, tree: { ...node, right: node } }]
          : []),
        ...(isPlain(right) ? [{ label: `the factor ${expressionText(right)} left out`, tree: left }] : []),
      ];
    case '/': {
      if (isPlain(node)) return [];
      if (isPlain(right)) {
        return [{ label: `the division by ${expressionText(right)} left out`, tree: left }];
      }
      return [{ label: `${named(node)} upside down`, tree: { ...node, left: right, right: left } }];
    }
    case '^':
      if (!isPlain(right)) return [];
      return [
        {
          label: `the ${right.kind === 'number' && right.value === 2 ? 'square' : 'power'} of ${named(left)} left out`,
          tree: left,
        },
      ];
    default: {
      const root = hasRoot(left) || hasRoot(right);
      return [
        { label: `${named(right)} left out`, tree: left },
        {
          label: `${named(left)} left out`,
          tree: operator === '+' ? right : { kind: 'negate', operand: right, span: right.span },
        },
        {
          label: root ? 'the other root of the equation taken' : `${named(right)} taken with the wrong sign`,
          tree: { ...node, operator: operator === '+' ? '-' : '+' },
        },
      ];
    }
  }
}

function mistakesOfCall(node: Extract<ExpressionTree, { kind: 'call' }>): Variant[] {
  const [inside] = node.arguments;
  if (inside === undefined) return [];
  switch (node.function) {
    case 'sqrt':
      return [{ label: 'the root left out', tree: inside }];
    case 'cbrt':
      return [{ label: 'the cube root left out', tree: inside }];
    case 'sin':
    case 'cos':
    case 'tan': {
      const { span } = node;
      const degrees: ExpressionTree = {
        kind: 'binary',
        operator: '*',
        left: inside,
        right: plainNumber(String(180 / Math.PI), span),
        span,
      };
      const other = OTHER_FUNCTIONS[node.function];
      return [
        { label: `${other} taken for ${node.function}`, tree: { ...node, function: other } },
        { label: 'degrees taken for radians', tree: { ...node, arguments: [degrees] } },
      ];
    }
    case 'asin': {
      const half = plainNumber(String(Math.PI), node.span);
      return [
        {
          label: 'the other angle with the same sine taken',
          tree: { kind: 'binary', operator: '-', left: half, right: node, span: node.span },
        },
      ];
    }
    default:
      return [];
  }
}

/** The wrong workings that one place of a working invites. */
export function mistakesAt(node: ExpressionTree): Variant[] {
  if (node.kind === 'binary') return mistakesOfBinary(node);
  if (node.kind === 'call') return mistakesOfCall(node);
  if (node.kind === 'constant') {
    const swap = OTHER_MASSES.find(([constant]) => constant === node.name);
    return swap === undefined ? [] : [{ label: swap[2], tree: { ...node, name: swap[1] } }];
  }
  return [];
}
