import type { Diagnostic, Span } from '../diagnostics/diagnostic.ts';
import type { Shape } from '../script/scope.ts';
import type { Statement } from '../script/statement.ts';
import type { Dimension } from '../units/dimension.ts';

/** How a name of the script gets its value. */
export type QuantityKind = 'drawn' | 'given' | 'computed';

export type { Shape };

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
  /** Number of grid points; 1 for a script that draws nothing. Draws are numbered from 1 to `size`. */
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

/** A script that has no error; plain, cloneable data. Evaluators are built from it on first use. */
export interface CompiledScript {
  readonly source: string;
  readonly statements: readonly Statement[];
  readonly quantities: readonly QuantityInfo[];
  readonly grid: GridInfo;
}

/** What compiling gives: a script unless there is an error among the diagnostics; what is known is always told. */
export interface Compilation {
  script: CompiledScript | null;
  diagnostics: Diagnostic[];
  quantities: QuantityInfo[];
  grid: GridInfo;
}

/** Which precision each constant is taken at: all full, all as data sheets print them, or values by name (SI). */
export type ConstantPrecision = 'full' | 'dataSheet' | ReadonlyMap<string, number>;

/** Draws by number (from 1), as a list or as `count` following ones. */
export type DrawSelection = Float64Array | { from: number; count: number };

export interface EvaluationOptions {
  /** Only what these names need is evaluated; default: every name. */
  wanted?: readonly string[];
  /** Whether `kept` is worked out; default true. When false, `kept` is all ones. */
  conditions?: boolean;
  /** Computed quantities that are rounded to so many significant figures before they are used further. */
  roundIntermediates?: ReadonlyMap<string, number>;
  constants?: ConstantPrecision;
  /** Columns imposed on names in place of their own statements, SI, one value a draw. */
  pinned?: ReadonlyMap<string, Float64Array>;
  /** An earlier result of as many draws whose columns are written over, which saves making new ones. */
  into?: BlockValues;
}

/** Values of a block of draws; every column is as long as `draws`. */
export interface BlockValues {
  draws: Float64Array;
  /** Scalars by name, SI; a condition is 1 or 0. */
  columns: ReadonlyMap<string, Float64Array>;
  /** Series by name: one column an element. */
  series: ReadonlyMap<string, readonly Float64Array[]>;
  /** 1 where every `require` holds. */
  kept: Uint8Array;
}
