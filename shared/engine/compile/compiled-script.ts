import type { Span } from '../diagnostics/diagnostic.ts';
import type { Dimension } from '../units/dimension.ts';

/** How a name of the script gets its value. */
export type QuantityKind = 'drawn' | 'given' | 'computed';

/** A scalar, a true-or-false condition, or a series of a fixed number of values. */
export type Shape = { kind: 'scalar' } | { kind: 'condition' } | { kind: 'series'; length: number };

/** What is known of one name before any draw is made; plain data. */
export interface QuantityInfo {
  name: string;
  kind: QuantityKind;
  shape: Shape;
  dimension: Dimension;
  /** Unit that the script's own literals suggest for printing, as `kV`; else the coherent SI unit. */
  scriptUnit: string;
  /** Significant figures of `given`, or null. */
  figures: number | null;
  /** Decimals in `scriptUnit` that the step of a draw implies, or null. */
  decimals: number | null;
  span: Span;
  /** Names of the script used directly on the right-hand side. */
  uses: string[];
  /** Names of constants used directly. */
  constants: string[];
}

/** The finite grid of a script, or why there is none. */
export interface GridInfo {
  /** Number of grid points; 1 for a script that draws nothing. */
  size: number;
  /** True when `scatter` makes every draw number new, so that there is no finite grid. */
  open: boolean;
}

/** Values of one draw, SI coherent units; NaN where undefined; a series is an array. */
export interface DrawValues {
  draw: number;
  values: Readonly<Record<string, number | readonly number[]>>;
  /** Whether every `require` holds. */
  kept: boolean;
  /** Spans of conditions that failed and of the first undefined value, if any. */
  discardedBy: Span | null;
}
