import type { ExpressionTree } from './expression-tree.ts';

/** How tightly each kind binds: a part that binds less than its place asks for brackets. */
const BINDING = {
  choose: 1,
  or: 2,
  and: 3,
  compare: 4,
  sum: 5,
  product: 6,
  sign: 7,
  power: 8,
  leaf: 9,
} as const;

const BINARY_BINDING = {
  '+': BINDING.sum,
  '-': BINDING.sum,
  '*': BINDING.product,
  '/': BINDING.product,
  '^': BINDING.power,
} as const;

function bindingOf(tree: ExpressionTree): number {
  switch (tree.kind) {
    case 'choose':
      return BINDING.choose;
    case 'logic':
      return tree.operator === 'or' ? BINDING.or : BINDING.and;
    case 'compare':
      return BINDING.compare;
    case 'binary':
      return BINARY_BINDING[tree.operator];
    case 'negate':
    case 'not':
      return BINDING.sign;
    case 'number':
      return tree.unit.text === '' && !(tree.value < 0) ? BINDING.leaf : BINDING.sign;
    default:
      return BINDING.leaf;
  }
}

function bracketed(tree: ExpressionTree, least: number): string {
  const text = expressionText(tree);
  return bindingOf(tree) < least ? `(${text})` : text;
}

function all(trees: readonly ExpressionTree[]): string {
  return trees.map(expressionText).join(', ');
}

/** The expression written out in the script's own notation, with as few brackets as it needs. */
export function expressionText(tree: ExpressionTree): string {
  switch (tree.kind) {
    case 'number':
      return tree.unit.text === '' ? tree.literal : `${tree.literal} ${tree.unit.text}`;
    case 'name':
    case 'constant':
      return tree.name;
    case 'negate':
      return `-${bracketed(tree.operand, BINDING.sign)}`;
    case 'not':
      return `not (${expressionText(tree.operand)})`;
    case 'binary': {
      const binding = BINARY_BINDING[tree.operator];
      if (tree.operator === '^') {
        return `${bracketed(tree.left, BINDING.leaf)}^${bracketed(tree.right, BINDING.leaf)}`;
      }
      const right = tree.operator === '-' || tree.operator === '/' ? binding + 1 : binding;
      return `${bracketed(tree.left, binding)} ${tree.operator} ${bracketed(tree.right, right)}`;
    }
    case 'call':
      return `${tree.function}(${all(tree.arguments)})`;
    case 'compare':
      return tree.operands
        .map((operand, index) => {
          const text = bracketed(operand, BINDING.sum);
          return index === 0 ? text : `${tree.operators[index - 1] ?? ''} ${text}`;
        })
        .join(' ');
    case 'logic': {
      const binding = bindingOf(tree);
      return `${bracketed(tree.left, binding)} ${tree.operator} ${bracketed(tree.right, binding + 1)}`;
    }
    case 'choose':
      return `${bracketed(tree.condition, BINDING.or)} ? ${bracketed(tree.whenTrue, BINDING.or)} : ${expressionText(tree.whenFalse)}`;
    case 'list':
      return `[${all(tree.elements)}]`;
    case 'spread':
      return `spread(${expressionText(tree.from)}, ${expressionText(tree.to)}, ${tree.count})`;
    case 'element':
      return `${bracketed(tree.series, BINDING.leaf)}[${tree.index}]`;
    case 'rounded':
      return `given(${expressionText(tree.operand)}, ${tree.figures})`;
  }
}
