import type { Dimension } from './dimension.ts';

/** One factor of a unit as it is written: `cm^2` is prefix `c`, symbol `m`, exponent 2. */
export interface UnitTerm {
  prefix: string;
  symbol: string;
  exponent: readonly [number, number];
}

/** A unit read from text; plain data. One of it is `coefficient × 10^power` coherent SI units. */
export interface Unit {
  /** Canonical text in this script's own notation, as `m s^-2`; empty for a plain number. */
  text: string;
  terms: readonly UnitTerm[];
  dimension: Dimension;
  /** Exact power of ten that is kept apart so that decimal prefixes lose nothing. */
  power: number;
  /** What is left of the factor: 1 for every unit made of SI units and decimal prefixes. */
  coefficient: number;
}

/** The unit of a plain number. */
export const NO_UNIT: Unit = {
  text: '',
  terms: [],
  dimension: [
    [0, 1],
    [0, 1],
    [0, 1],
    [0, 1],
    [0, 1],
    [0, 1],
    [0, 1],
  ],
  power: 0,
  coefficient: 1,
};
