import {
  DIMENSIONLESS,
  multiplyDimensions,
  powerOfDimension,
  rational,
  type Dimension,
  type Rational,
} from './dimension.ts';
import { MICRO_SPELLINGS, PREFIXES, SPELLINGS, UNITS, type UnitDefinition } from './unit-table.ts';

/** One factor of a unit as it is written: `cm^2` is prefix `c`, symbol `m`, exponent 2. */
export interface UnitTerm {
  prefix: string;
  symbol: string;
  exponent: Rational;
}

/** A unit read from text; plain data. One of it is `coefficient × 10^power` coherent SI units. */
export interface Unit {
  /** Canonical text in the script's own notation, as `m s^-2`; empty for a plain number. */
  text: string;
  terms: readonly UnitTerm[];
  dimension: Dimension;
  /** Exact power of ten that is kept apart so that decimal prefixes lose nothing. */
  power: number;
  /** What is left of the factor: 1 for every unit made of SI units and decimal prefixes. */
  coefficient: number;
}

/** The unit of a plain number. */
export const NO_UNIT: Unit = { text: '', terms: [], dimension: DIMENSIONLESS, power: 0, coefficient: 1 };

/** A symbol with its prefix taken apart, as `mT` into milli and tesla. */
export interface UnitSymbol {
  prefix: string;
  definition: UnitDefinition;
}

/** Takes a written symbol apart; null when it is no unit. A whole symbol goes before a prefixed one: `cd`, `min`, `Pa`. */
export function findUnitSymbol(written: string): UnitSymbol | null {
  const whole = UNITS.get(SPELLINGS.get(written) ?? written);
  if (whole !== undefined) return { prefix: '', definition: whole };
  for (const length of [2, 1]) {
    const head = written.slice(0, length);
    const prefix = MICRO_SPELLINGS.has(head) ? 'µ' : head;
    const tail = written.slice(length);
    const definition = UNITS.get(SPELLINGS.get(tail) ?? tail);
    if (PREFIXES.has(prefix) && definition?.prefixed) return { prefix, definition };
  }
  return null;
}

/** The term in the script's notation, as `m^-2`. */
export function termText(term: UnitTerm): string {
  const [numerator, denominator] = term.exponent;
  const base = term.prefix + term.symbol;
  if (denominator !== 1) return `${base}^(${numerator}/${denominator})`;
  return numerator === 1 ? base : `${base}^${numerator}`;
}

/** Joins the exponents of equal symbols, so that m s^-1 s^-1 becomes m s^-2; what cancels is left out. */
function joinTerms(terms: readonly UnitTerm[]): UnitTerm[] {
  const joined = new Map<string, UnitTerm>();
  for (const term of terms) {
    const key = `${term.prefix} ${term.symbol}`;
    const [a, b] = joined.get(key)?.exponent ?? [0, 1];
    const [c, d] = term.exponent;
    joined.set(key, { ...term, exponent: rational(a * d + c * b, b * d) });
  }
  return [...joined.values()].filter((term) => term.exponent[0] !== 0);
}

/** A unit from its terms, in their order. Throws RangeError for a symbol that is not in the table. */
export function unitFromTerms(written: readonly UnitTerm[]): Unit {
  const terms = joinTerms(written);
  let dimension = DIMENSIONLESS;
  let power = 0;
  let coefficient = 1;
  for (const { prefix, symbol, exponent } of terms) {
    const definition = UNITS.get(symbol);
    if (definition === undefined) throw new RangeError(`No unit has the symbol ${symbol}.`);
    const exact = ((PREFIXES.get(prefix) ?? 0) + definition.power) * exponent[0];
    const value = exponent[0] / exponent[1];
    dimension = multiplyDimensions(dimension, powerOfDimension(definition.dimension, exponent));
    if (exact % exponent[1] === 0) power += exact / exponent[1];
    else coefficient *= 10 ** (exact / exponent[1]);
    if (definition.coefficient !== 1) coefficient *= definition.coefficient ** value;
  }
  return { text: terms.map(termText).join(' '), terms, dimension, power, coefficient };
}

const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** A whole number in superscript characters, with a superscript minus. */
export function superscript(value: number): string {
  const digits = Array.from(String(Math.abs(value)), (digit) => SUPERSCRIPTS[Number(digit)] ?? '').join('');
  return value < 0 ? `⁻${digits}` : digits;
}

/** Narrow no-break space: the thin space that never lets a number and its unit part at a line's end. */
export const THIN_SPACE = '\u202F';

/** The unit for screens, upright with thin spaces and superscripts: `C kg⁻¹`. */
export function unitText(unit: Unit): string {
  return unit.terms
    .map(({ prefix, symbol, exponent: [numerator, denominator] }) => {
      if (denominator !== 1) return `${prefix}${symbol}^(${numerator}/${denominator})`;
      return prefix + symbol + (numerator === 1 ? '' : superscript(numerator));
    })
    .join(THIN_SPACE);
}

const LATEX_SYMBOLS: ReadonlyMap<string, string> = new Map([
  ['Ω', '\\Omega'],
  ['Å', '\\text{Å}'],
  ['°', '^{\\circ}'],
  ['%', '\\%'],
]);

/** The unit for maths, upright with thin spaces: `\mathrm{C\,kg^{-1}}`; empty for a plain number. */
export function unitLatex(unit: Unit): string {
  if (unit.terms.length === 0) return '';
  const terms = unit.terms.map(({ prefix, symbol, exponent: [numerator, denominator] }) => {
    const letters = prefix === 'µ' ? '\\mu ' : prefix;
    const base = `${letters}${LATEX_SYMBOLS.get(symbol) ?? symbol}`;
    if (denominator !== 1) return `${base}^{${numerator}/${denominator}}`;
    return numerator === 1 ? base : `${base}^{${numerator}}`;
  });
  return `\\mathrm{${terms.join('\\,')}}`;
}
