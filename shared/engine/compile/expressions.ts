import type { Diagnostic } from '../diagnostics/diagnostic.ts';
import { errorAt, hasError } from '../diagnostics/spans.ts';
import type { ExpressionTree } from '../script/expression-tree.ts';
import { TypeInference } from '../script/infer-type.ts';
import { SCRIPT_LIMITS } from '../script/limits.ts';
import { parseExpression } from '../script/parse-expression.ts';
import type { Scope, ScopeEntry, Shape } from '../script/scope.ts';
import { splitStatements } from '../script/split-statements.ts';
import { tokenise } from '../script/tokens.ts';
import { childrenOf, namesIn } from '../script/walk-tree.ts';
import { sameDimension, type Dimension } from '../units/dimension.ts';
import { describeDimension } from '../units/quantity-kinds.ts';
import { readUnit } from '../units/read-unit.ts';
import type { BlockValues, CompiledScript, ConstantPrecision } from './compiled-script.ts';
import { constantValue } from './constant-precision.ts';
import { BLOCK_LENGTH, isSeries, ProgramBuilder, type Register, type RegisterValue } from './program.ts';

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

const scopes = new WeakMap<CompiledScript, Scope>();

function scopeOf(script: CompiledScript): Scope {
  let scope = scopes.get(script);
  if (scope === undefined) {
    const defined = new Map<string, ScopeEntry>();
    for (const { name, dimension, shape, scriptUnit } of script.quantities) {
      const reading = readUnit(scriptUnit);
      defined.set(name, { type: { dimension, shape }, unit: reading.ok ? reading.unit : null });
    }
    scope = { defined, all: new Set(defined.keys()) };
    scopes.set(script, scope);
  }
  return scope;
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
  const start = { start: 0, end: text.length, line: 1, column: 1 };
  if (text.length > SCRIPT_LIMITS.characters) {
    return {
      expression: null,
      diagnostics: [errorAt(start, 'script-too-long', 'This expression is too long.')],
    };
  }
  const lexed = tokenise(text);
  const split = splitStatements(lexed.tokens);
  const diagnostics = [...lexed.diagnostics, ...split.diagnostics];
  const [tokens, second] = split.statements;
  if (second?.[0] !== undefined) {
    diagnostics.push(errorAt(second[0].span, 'one-expression', 'One expression stands here, on one line.'));
  }
  if (hasError(diagnostics)) return { expression: null, diagnostics };
  const parsed = parseExpression(tokens ?? [], scopeOf(script).all, start);
  if (parsed.tree === null) return { expression: null, diagnostics: parsed.diagnostics };
  const built = buildExpression(script, parsed.tree);
  if (built.expression === null || expected === undefined) return built;
  if (sameDimension(built.expression.dimension, expected)) return built;
  const message = `This is ${describeDimension(built.expression.dimension)}; ${describeDimension(expected)} is asked for.`;
  return { expression: null, diagnostics: [errorAt(parsed.tree.span, 'dimension-unexpected', message)] };
}

/** Trees may be built by transforming others, so their depth is bounded here once more. */
const DEEPEST_TREE = 1_500;

function depthOf(tree: ExpressionTree): number {
  let depth = 0;
  let level: ExpressionTree[] = [tree];
  while (level.length > 0 && depth <= DEEPEST_TREE) {
    depth += 1;
    level = level.flatMap((part) => childrenOf(part));
  }
  return depth;
}

/** Checks a tree that was made by transforming another; null expression when dimensions or shapes clash. */
export function buildExpression(script: CompiledScript, tree: ExpressionTree): ExpressionCompilation {
  if (depthOf(tree) > DEEPEST_TREE) {
    return {
      expression: null,
      diagnostics: [errorAt(tree.span, 'nesting-too-deep', 'This expression nests too deep.')],
    };
  }
  const inference = new TypeInference(scopeOf(script));
  const type = inference.infer(tree);
  if (type === null || hasError(inference.diagnostics)) {
    return { expression: null, diagnostics: inference.diagnostics };
  }
  const { names, constants } = namesIn(tree);
  return {
    expression: { tree, dimension: type.dimension, shape: type.shape, uses: names, constants },
    diagnostics: inference.diagnostics,
  };
}

/**
 * A scalar expression's column over the draws of `values` (which must hold every name it uses), SI. Throws
 * RangeError when a name is missing there or the expression is a series.
 */
export function evaluateExpression(
  expression: CompiledExpression,
  values: Pick<BlockValues, 'draws' | 'columns' | 'series'>,
  options: { constants?: ConstantPrecision } = {},
): Float64Array {
  const builder = new ProgramBuilder();
  const loaded = new Map<string, RegisterValue>();
  let offset = 0;
  const load = (source: Float64Array): Register => {
    const register = builder.named();
    builder.steps.push((count) => register.column.set(source.subarray(offset, offset + count)));
    return register;
  };
  for (const name of expression.uses) {
    const column = values.columns.get(name);
    const series = values.series.get(name);
    if (column !== undefined) loaded.set(name, load(column));
    else if (series !== undefined) loaded.set(name, series.map(load));
    else throw new RangeError(`No values of ${name} were given.`);
  }
  const result = builder.compile(expression.tree, {
    name: (name) => loaded.get(name) ?? NaN,
    constant: (name) => constantValue(name, options.constants),
  });
  if (isSeries(result)) throw new RangeError('A series has no single column.');
  const { length } = values.draws;
  const out = new Float64Array(length);
  if (typeof result === 'number') return out.fill(result);
  for (offset = 0; offset < length; offset += BLOCK_LENGTH) {
    const count = Math.min(BLOCK_LENGTH, length - offset);
    for (const step of builder.steps) step(count);
    out.set(result.column.subarray(0, count), offset);
  }
  return out;
}
