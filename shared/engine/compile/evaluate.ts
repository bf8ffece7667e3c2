import type {
  BlockValues,
  CompiledScript,
  DrawSelection,
  DrawValues,
  EvaluationOptions,
} from './compiled-script.ts';

/** One draw by the plain scalar reference evaluator. Draws are numbered from 1; throws RangeError outside the grid. */
export function evaluateDraw(
  script: CompiledScript,
  draw: number,
  options: Omit<EvaluationOptions, 'pinned'> & { pinned?: ReadonlyMap<string, number> } = {},
): DrawValues {
  throw new Error(`no evaluator yet: ${script.source.length} ${draw} ${Object.keys(options).length}`);
}

/** Many draws by the compiled evaluator. Draws are numbered from 1; throws RangeError outside the grid. */
export function evaluateBlock(
  script: CompiledScript,
  draws: DrawSelection,
  options: EvaluationOptions = {},
): BlockValues {
  throw new Error(
    `no evaluator yet: ${script.source.length} ${String(draws)} ${Object.keys(options).length}`,
  );
}
