import type { Span } from '../diagnostics/diagnostic.ts';
import type { Unit } from '../units/unit.ts';
import type { FunctionName } from './functions.ts';

export type BinaryOperator = '+' | '-' | '*' | '/' | '^';
export type ComparisonOperator = '<' | '<=' | '>' | '>=' | '==' | '!=';

export type { FunctionName };

/**
 * An expression as a tree of plain data. Transform it freely (each node keeps the span it came from, which
 * only serves to point at the text) and give it to `buildExpression` to have it checked and evaluated.
 */
export type ExpressionTree =
  | NumberTree
  | { kind: 'name'; name: string; span: Span }
  | { kind: 'constant'; name: string; span: Span }
  | { kind: 'negate'; operand: ExpressionTree; span: Span }
  | { kind: 'binary'; operator: BinaryOperator; left: ExpressionTree; right: ExpressionTree; span: Span }
  | { kind: 'call'; function: FunctionName; arguments: readonly ExpressionTree[]; span: Span }
  /** Chained comparison: one more operand than operators. */
  | {
      kind: 'compare';
      operators: readonly ComparisonOperator[];
      operands: readonly ExpressionTree[];
      span: Span;
    }
  | { kind: 'logic'; operator: 'and' | 'or'; left: ExpressionTree; right: ExpressionTree; span: Span }
  | { kind: 'not'; operand: ExpressionTree; span: Span }
  | {
      kind: 'choose';
      condition: ExpressionTree;
      whenTrue: ExpressionTree;
      whenFalse: ExpressionTree;
      span: Span;
    }
  | { kind: 'list'; elements: readonly ExpressionTree[]; span: Span }
  /** `count` values in equal steps, first and last included. */
  | { kind: 'spread'; from: ExpressionTree; to: ExpressionTree; count: number; span: Span }
  /** `index` counts from 1. */
  | { kind: 'element'; series: ExpressionTree; index: number; span: Span }
  /** Rounding to significant figures in `unit`; made by the engine when it inlines a given. */
  | { kind: 'rounded'; operand: ExpressionTree; figures: number; unit: Unit; span: Span };

/** A number literal with the unit beside it; `value` is in coherent SI units. */
export interface NumberTree {
  kind: 'number';
  value: number;
  /** The unit that stands beside it; NO_UNIT for a plain number. */
  unit: Unit;
  /** The digits as written, as `0.70` or `1.76e11`. */
  literal: string;
  span: Span;
}
