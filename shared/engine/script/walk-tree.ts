import type { ExpressionTree } from './expression-tree.ts';

/** The trees directly inside a tree, in source order. */
export function childrenOf(tree: ExpressionTree): readonly ExpressionTree[] {
  switch (tree.kind) {
    case 'number':
    case 'name':
    case 'constant':
      return [];
    case 'negate':
    case 'not':
    case 'rounded':
      return [tree.operand];
    case 'binary':
    case 'logic':
      return [tree.left, tree.right];
    case 'call':
      return tree.arguments;
    case 'compare':
      return tree.operands;
    case 'choose':
      return [tree.condition, tree.whenTrue, tree.whenFalse];
    case 'list':
      return tree.elements;
    case 'spread':
      return [tree.from, tree.to];
    case 'element':
      return [tree.series];
  }
}

/** The tree with `change` applied to each tree directly inside it. */
export function mapChildren(
  tree: ExpressionTree,
  change: (child: ExpressionTree) => ExpressionTree,
): ExpressionTree {
  switch (tree.kind) {
    case 'number':
    case 'name':
    case 'constant':
      return tree;
    case 'negate':
    case 'not':
    case 'rounded':
      return { ...tree, operand: change(tree.operand) };
    case 'binary':
    case 'logic':
      return { ...tree, left: change(tree.left), right: change(tree.right) };
    case 'call':
      return { ...tree, arguments: tree.arguments.map(change) };
    case 'compare':
      return { ...tree, operands: tree.operands.map(change) };
    case 'choose':
      return {
        ...tree,
        condition: change(tree.condition),
        whenTrue: change(tree.whenTrue),
        whenFalse: change(tree.whenFalse),
      };
    case 'list':
      return { ...tree, elements: tree.elements.map(change) };
    case 'spread':
      return { ...tree, from: change(tree.from), to: change(tree.to) };
    case 'element':
      return { ...tree, series: change(tree.series) };
  }
}

/** Names of the script and of constants that a tree uses, each once, in source order. */
export function namesIn(tree: ExpressionTree): { names: string[]; constants: string[] } {
  const names = new Set<string>();
  const constants = new Set<string>();
  const visit = (part: ExpressionTree): void => {
    if (part.kind === 'name') names.add(part.name);
    else if (part.kind === 'constant') constants.add(part.name);
    for (const child of childrenOf(part)) visit(child);
  };
  visit(tree);
  return { names: [...names], constants: [...constants] };
}
