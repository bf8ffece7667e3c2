import type { Diagnostic } from '../diagnostics/diagnostic.ts';
import type { ExpressionTree } from '../script/expression-tree.ts';
import type { Dimension } from '../units/dimension.ts';
import type { BlockValues, CompiledScript, ConstantPrecision, Shape } from './compiled-script.ts';

/** A checked expression over a script's names; plain, cloneable data. */
export interface CompiledExpression {
  readonly tree: ExpressionTree;
  readonly dimension: Dimension;
  readonly shape: Shape;
  readonly uses: readonly string[];
  readonly constants: readonly string[];
}

export interface ExpressionCompilation {
  expression: CompiledExpression | null;
  diagnostics: Diagnostic[];
}

/**
 * Reads and checks one expression over the names of `script`, as a slip is written. Spans count from the
 * start of `text`. With `expected`, another dimension is an error.
 */
export function compileExpression(
  script: CompiledScript,
  text: string,
  expected?: Dimension,
): ExpressionCompilation {
  throw new Error(`no compiler yet: ${script.source.length} ${text} ${String(expected)}`);
}

/** Checks a tree that was made by transforming another; null expression when dimensions or shapes clash. */
export function buildExpression(script: CompiledScript, tree: ExpressionTree): ExpressionCompilation {
  throw new Error(`no compiler yet: ${script.source.length} ${tree.kind}`);
}

/** A scalar expression's column over the draws of `values` (which must hold every name it uses), SI. */
export function evaluateExpression(
  expression: CompiledExpression,
  values: Pick<BlockValues, 'draws' | 'columns' | 'series'>,
  options: { constants?: ConstantPrecision } = {},
): Float64Array {
  throw new Error(
    `no evaluator yet: ${expression.tree.kind} ${values.draws.length} ${Object.keys(options).length}`,
  );
}

/**
 * The right-hand side of a given or computed name; null for drawn names and unknown ones. With `inline`,
 * computed names in it are replaced by their own workings, down to drawn and given values; a set inlines
 * those names alone. For a given, the tree is what stands inside `given(...)`, before rounding.
 */
export function workingOf(
  script: CompiledScript,
  name: string,
  inline: boolean | ReadonlySet<string> = false,
): ExpressionTree | null {
  throw new Error(`no working yet: ${script.source.length} ${name} ${String(inline)}`);
}

/** The expression written out in the script's own notation, with as few brackets as it needs. */
export function expressionText(tree: ExpressionTree): string {
  throw new Error(`not printable yet: ${tree.kind}`);
}
