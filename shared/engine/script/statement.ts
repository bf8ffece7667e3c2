import type { Span } from '../diagnostics/diagnostic.ts';
import type { Unit } from '../units/unit.ts';
import type { ExpressionTree } from './expression-tree.ts';

/** `count` levels from `first` in steps of `step`, each a whole number times 10^power of `unit`. */
export interface StepLevels {
  kind: 'steps';
  count: number;
  first: number;
  step: number;
  power: number;
  unit: Unit;
}

/** The values that `oneOf` chooses from; they use literals and constants alone. */
export interface ChoiceLevels {
  kind: 'choices';
  choices: readonly ExpressionTree[];
}

/** One checked statement of a script. */
export type Statement =
  | { kind: 'drawn'; name: string; nameSpan: Span; span: Span; levels: StepLevels | ChoiceLevels }
  /** Seeded Gaussian reading error of standard deviation `deviation`. */
  | {
      kind: 'scatter';
      name: string;
      nameSpan: Span;
      span: Span;
      deviation: ExpressionTree;
      /** Number of values of a series; 0 for a single value. */
      length: number;
    }
  | {
      kind: 'given';
      name: string;
      nameSpan: Span;
      span: Span;
      tree: ExpressionTree;
      figures: number;
      unit: Unit;
    }
  | { kind: 'computed'; name: string; nameSpan: Span; span: Span; tree: ExpressionTree }
  | { kind: 'require'; span: Span; tree: ExpressionTree };
