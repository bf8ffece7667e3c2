import type { Dimension } from '../units/dimension.ts';

/** A physical constant that scripts can read and never redefine; values in coherent SI units. */
export interface PhysicalConstant {
  /** Name in scripts, as `m_e`. */
  name: string;
  /** LaTeX, as `m_\mathrm{e}`. */
  symbol: string;
  /** What it is, as `electron mass`. */
  description: string;
  value: number;
  /** Standard uncertainty in SI; 0 when exact by definition. */
  uncertainty: number;
  unit: string;
  dimension: Dimension;
  /** As a data sheet prints it. */
  dataSheet: { figures: number; value: number };
  source: string;
}

/** Every constant by name. */
export const CONSTANTS: ReadonlyMap<string, PhysicalConstant> = new Map();
