import type { Span } from '../diagnostics/diagnostic.ts';
import type { ExpressionTree } from './expression-tree.ts';
import type { Shape, ValueType } from './scope.ts';

/** What the inference of one kind of expression asks of the whole; each gives null after telling a mistake. */
export interface InferenceTools {
  fail(span: Span, code: string, message: string): null;
  /** A number or series of numbers. */
  value(tree: ExpressionTree): ValueType | null;
  /** A plain number or series of them; `what` says what needs it and `cure` how to get it. */
  plain(tree: ExpressionTree, what: string, cure: string): ValueType | null;
  /** The types of values that must share one dimension. */
  alike(trees: readonly ExpressionTree[], what: string): ValueType[] | null;
  /** The shape of elementwise work on two values. */
  joinShapes(a: Shape, b: Shape, span: Span): Shape | null;
}
