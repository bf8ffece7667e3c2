import { dimension, DIMENSIONLESS, type Dimension } from './dimension.ts';

/** A unit symbol: one of it is `coefficient × 10^power` coherent SI units. */
export interface UnitDefinition {
  symbol: string;
  name: string;
  dimension: Dimension;
  power: number;
  coefficient: number;
  /** Whether decimal prefixes may stand before it. */
  prefixed: boolean;
}

/** Elementary charge in coulombs, exact (SI Brochure, 9th edition, 2019). */
export const ELEMENTARY_CHARGE_DIGITS = 1.602176634;
/** Atomic mass constant in 10^-27 kg, CODATA 2022 (NIST). */
export const ATOMIC_MASS_DIGITS = 1.66053906892;

const ENERGY = dimension(2, 1, -2);

function unit(
  symbol: string,
  name: string,
  of: Dimension,
  power = 0,
  coefficient = 1,
  prefixed = true,
): UnitDefinition {
  return { symbol, name, dimension: of, power, coefficient, prefixed };
}

/** SI units with special names and the units accepted beside them (SI Brochure, 9th edition, tables 2, 4 and 8). */
const DEFINITIONS: readonly UnitDefinition[] = [
  unit('m', 'metre', dimension(1)),
  unit('g', 'gram', dimension(0, 1), -3),
  unit('s', 'second', dimension(0, 0, 1)),
  unit('A', 'ampere', dimension(0, 0, 0, 1)),
  unit('K', 'kelvin', dimension(0, 0, 0, 0, 1)),
  unit('mol', 'mole', dimension(0, 0, 0, 0, 0, 1)),
  unit('cd', 'candela', dimension(0, 0, 0, 0, 0, 0, 1)),
  unit('Hz', 'hertz', dimension(0, 0, -1)),
  unit('N', 'newton', dimension(1, 1, -2)),
  unit('Pa', 'pascal', dimension(-1, 1, -2)),
  unit('J', 'joule', ENERGY),
  unit('W', 'watt', dimension(2, 1, -3)),
  unit('C', 'coulomb', dimension(0, 0, 1, 1)),
  unit('V', 'volt', dimension(2, 1, -3, -1)),
  unit('F', 'farad', dimension(-2, -1, 4, 2)),
  unit('Ω', 'ohm', dimension(2, 1, -3, -2)),
  unit('S', 'siemens', dimension(-2, -1, 3, 2)),
  unit('Wb', 'weber', dimension(2, 1, -2, -1)),
  unit('T', 'tesla', dimension(0, 1, -2, -1)),
  unit('H', 'henry', dimension(2, 1, -2, -2)),
  unit('lm', 'lumen', dimension(0, 0, 0, 0, 0, 0, 1)),
  unit('lx', 'lux', dimension(-2, 0, 0, 0, 0, 0, 1)),
  unit('Bq', 'becquerel', dimension(0, 0, -1)),
  unit('Gy', 'gray', dimension(2, 0, -2)),
  unit('Sv', 'sievert', dimension(2, 0, -2)),
  unit('rad', 'radian', DIMENSIONLESS),
  unit('sr', 'steradian', DIMENSIONLESS),
  unit('eV', 'electronvolt', ENERGY, -19, ELEMENTARY_CHARGE_DIGITS),
  unit('u', 'atomic mass unit', dimension(0, 1), -27, ATOMIC_MASS_DIGITS, false),
  unit('Å', 'ångström', dimension(1), -10, 1, false),
  unit('°', 'degree', DIMENSIONLESS, 0, Math.PI / 180, false),
  unit('min', 'minute', dimension(0, 0, 1), 0, 60, false),
  unit('h', 'hour', dimension(0, 0, 1), 0, 3600, false),
  unit('L', 'litre', dimension(3), -3),
  unit('bar', 'bar', dimension(-1, 1, -2), 5),
  unit('%', 'per cent', DIMENSIONLESS, -2, 1, false),
];

/** Every unit symbol by its canonical spelling. */
export const UNITS: ReadonlyMap<string, UnitDefinition> = new Map(
  DEFINITIONS.map((definition) => [definition.symbol, definition]),
);

/** Other spellings of a symbol. Both code points of the ohm and ångström signs are met in real texts. */
export const SPELLINGS: ReadonlyMap<string, string> = new Map([
  ['\u2126', 'Ω'],
  ['ohm', 'Ω'],
  ['ohms', 'Ω'],
  ['\u212B', 'Å'],
  ['A\u030A', 'Å'],
  ['angstrom', 'Å'],
  ['deg', '°'],
  ['degree', '°'],
  ['degrees', '°'],
  ['º', '°'],
  ['l', 'L'],
  ['hr', 'h'],
  ['sec', 's'],
]);

/** Decimal prefixes by their canonical spelling, with the power of ten (SI Brochure, table 7, without the newest four). */
export const PREFIXES: ReadonlyMap<string, number> = new Map([
  ['Y', 24],
  ['Z', 21],
  ['E', 18],
  ['P', 15],
  ['T', 12],
  ['G', 9],
  ['M', 6],
  ['k', 3],
  ['h', 2],
  ['da', 1],
  ['d', -1],
  ['c', -2],
  ['m', -3],
  ['µ', -6],
  ['n', -9],
  ['p', -12],
  ['f', -15],
  ['a', -18],
  ['z', -21],
  ['y', -24],
]);

/** Other spellings of micro: the Greek letter, and the letter u where the micro sign cannot be typed. */
export const MICRO_SPELLINGS: ReadonlySet<string> = new Set(['\u03BC', 'u']);
