import { describe, expect, it } from 'vitest';
import { dimension, powerOfDimension } from './dimension.ts';
import { convert, literalToSI, toSI } from './convert.ts';
import { readUnit } from './read-unit.ts';
import { NO_UNIT, unitLatex, unitText } from './unit.ts';

function mustRead(text: string, lenient = false) {
  const reading = readUnit(text, { lenient });
  if (!reading.ok) throw new Error(reading.message);
  return reading.unit;
}

const HALF_VOLT = powerOfDimension(dimension(2, 1, -3, -1), [1, 2]);

/** Dimensions and factors from the SI Brochure, 9th edition (2019). */
const READ: readonly [
  written: string,
  canonical: string,
  oneInSI: number,
  dimension: ReturnType<typeof dimension>,
][] = [
  ['', '', 1, dimension()],
  ['mT', 'mT', 1e-3, dimension(0, 1, -2, -1)],
  ['m s^-2', 'm s^-2', 1, dimension(1, 0, -2)],
  ['m/s²', 'm s^-2', 1, dimension(1, 0, -2)],
  ['m s⁻²', 'm s^-2', 1, dimension(1, 0, -2)],
  ['m/s/s', 'm s^-2', 1, dimension(1, 0, -2)],
  ['C/kg', 'C kg^-1', 1, dimension(0, -1, 1, 1)],
  ['C·kg⁻¹', 'C kg^-1', 1, dimension(0, -1, 1, 1)],
  ['J/(kg K)', 'J kg^-1 K^-1', 1, dimension(2, 0, -2, 0, -1)],
  ['keV', 'keV', 1.602176634e-16, dimension(2, 1, -2)],
  ['\u00B5m', '\u00B5m', 1e-6, dimension(1)],
  ['\u03BCm', '\u00B5m', 1e-6, dimension(1)],
  ['um', '\u00B5m', 1e-6, dimension(1)],
  ['Ω', 'Ω', 1, dimension(2, 1, -3, -2)],
  ['\u2126', 'Ω', 1, dimension(2, 1, -3, -2)],
  ['kohm', 'kΩ', 1000, dimension(2, 1, -3, -2)],
  ['Å', 'Å', 1e-10, dimension(1)],
  ['\u212B', 'Å', 1e-10, dimension(1)],
  ['A\u030A', 'Å', 1e-10, dimension(1)],
  ['°', '°', Math.PI / 180, dimension()],
  ['cd', 'cd', 1, dimension(0, 0, 0, 0, 0, 0, 1)],
  ['min', 'min', 60, dimension(0, 0, 1)],
  ['Pa s', 'Pa s', 1, dimension(-1, 1, -1)],
  ['g/cm^3', 'g cm^-3', 1000, dimension(-3, 1)],
  ['u', 'u', 1.66053906892e-27, dimension(0, 1)],
  ['%', '%', 0.01, dimension()],
  ['mm^2', 'mm^2', 1e-6, dimension(2)],
  ['V^(1/2)', 'V^(1/2)', 1, HALF_VOLT],
];

describe('readUnit', () => {
  it.each(READ)('reads “%s” as “%s”', (written, canonical, oneInSI, expected) => {
    const unit = mustRead(written);
    expect(unit.text).toBe(canonical);
    expect(toSI(1, unit) / oneInSI).toBeCloseTo(1, 14);
    expect(unit.dimension).toEqual(expected);
  });

  it.each(READ)('reads its own canonical form of “%s” back as the same unit', (written) => {
    const unit = mustRead(written);
    expect(mustRead(unit.text)).toEqual(unit);
    expect(mustRead(unitText(unit))).toEqual(unit);
  });

  it.each([
    ['parsec', 'not a unit'],
    ['J/kg K', 'two ways'],
    ['m/', 'No unit stands after the slash'],
    ['m s^0', 'power 0'],
    ['m#', 'cannot stand in a unit'],
    ['J/(kg K', 'not closed'],
    ['(kg)', 'after a slash'],
    ['^2', 'where a unit is expected'],
    ['constructor', 'not a unit'],
    ['__proto__', 'cannot stand in a unit'],
  ])('refuses “%s” with a sentence', (written, words) => {
    const reading = readUnit(written);
    expect(reading.ok).toBe(false);
    if (!reading.ok) expect(reading.message).toContain(words);
  });

  it('takes jammed letters and two divided units apart only when lenient', () => {
    expect(readUnit('Js').ok).toBe(false);
    expect(mustRead('Js', true).text).toBe('J s');
    expect(mustRead('J/kg K', true).text).toBe('J kg^-1 K^-1');
    expect(mustRead('kg-1', true).text).toBe('kg^-1');
  });
});

describe('printing a unit', () => {
  it('writes plain text with thin spaces and superscripts', () => {
    expect(unitText(mustRead('C/kg'))).toBe('C\u202Fkg⁻¹');
    expect(unitText(mustRead('um'))).toBe('µm');
  });

  it('writes upright maths', () => {
    expect(unitLatex(mustRead('m s^-2'))).toBe('\\mathrm{m\\,s^{-2}}');
    expect(unitLatex(mustRead('µΩ'))).toBe('\\mathrm{\\mu \\Omega}');
    expect(unitLatex(NO_UNIT)).toBe('');
  });
});

describe('converting', () => {
  it('keeps decimal units exact', () => {
    expect(literalToSI('0.70', mustRead('mT'))).toBe(0.0007);
    expect(literalToSI('1.76e11', mustRead('C/kg'))).toBe(1.76e11);
    expect(literalToSI('12.5', mustRead('kV'))).toBe(12500);
    expect(convert(632.8, mustRead('nm'), mustRead('m'))).toBe(632.8e-9);
  });

  it('takes the electronvolt from the exact elementary charge', () => {
    // SI Brochure, 9th edition (2019): e = 1.602 176 634 × 10^-19 C exactly.
    expect(convert(1, mustRead('eV'), mustRead('J')) / 1.602176634e-19).toBeCloseTo(1, 15);
    expect(convert(1.602176634e-19, mustRead('J'), mustRead('eV'))).toBeCloseTo(1, 14);
  });

  it('refuses another dimension', () => {
    expect(() => convert(1, mustRead('m'), mustRead('s'))).toThrow(RangeError);
  });
});
