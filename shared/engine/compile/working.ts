import type { ExpressionTree } from '../script/expression-tree.ts';
import type { Statement } from '../script/statement.ts';
import { mapChildren } from '../script/walk-tree.ts';
import type { CompiledScript } from './compiled-script.ts';

function statementOf(script: CompiledScript, name: string): Exclude<Statement, { kind: 'require' }> | null {
  for (const statement of script.statements) {
    if (statement.kind !== 'require' && statement.name === name) return statement;
  }
  return null;
}

/** Inlined trees may grow exponentially with chains of doubled names; beyond this many nodes names are left standing. */
const MOST_NODES = 5_000;

/**
 * The right-hand side of a given or computed name; null for drawn names, scatter and unknown ones. With
 * `inline`, computed names in it are replaced by their own workings, down to drawn and given values; a set
 * inlines those names alone. For a given, the tree is what stands inside `given(...)`, before rounding.
 */
export function workingOf(
  script: CompiledScript,
  name: string,
  inline: boolean | ReadonlySet<string> = false,
): ExpressionTree | null {
  const statement = statementOf(script, name);
  if (statement === null || (statement.kind !== 'given' && statement.kind !== 'computed')) return null;
  if (inline === false) return statement.tree;
  let nodes = 0;
  const replace = (tree: ExpressionTree): ExpressionTree => {
    nodes += 1;
    if (tree.kind === 'name' && (inline === true || inline.has(tree.name)) && nodes < MOST_NODES) {
      const inner = statementOf(script, tree.name);
      if (inner?.kind === 'computed') return replace(inner.tree);
    }
    return mapChildren(tree, replace);
  };
  return replace(statement.tree);
}
