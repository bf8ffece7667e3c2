import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readUnit } from './read-unit.ts';
import { roundColumnToFigures, roundInUnit, roundToDecimals, roundToFigures } from './rounding.ts';

/** The oracle is the language's own exact conversion (ECMAScript, Number.prototype.toPrecision). */
function exact(x: number, figures: number): number {
  return Number(x.toPrecision(figures));
}

const anyDouble = fc.double({ noNaN: true, noDefaultInfinity: true });
const decimalTie = fc
  .tuple(fc.integer({ min: -99_999_999, max: 99_999_999 }), fc.integer({ min: -40, max: 40 }))
  .map(([digits, exponent]) => Number(`${digits}5e${exponent}`));
const everyday = fc
  .tuple(fc.double({ min: -1000, max: 1000, noNaN: true }), fc.integer({ min: -34, max: 20 }))
  .map(([mantissa, exponent]) => mantissa * 10 ** exponent);
const figures = fc.integer({ min: 1, max: 17 });

describe('roundToFigures', () => {
  it.each([
    ['any double', anyDouble],
    ['a decimal that ends in 5', decimalTie],
    ['an everyday size', everyday],
  ])('equals the exact decimal rounding for %s', (_, source) => {
    fc.assert(
      fc.property(source, figures, (x, digits) => {
        expect(roundToFigures(x, digits)).toBe(exact(x, digits) + 0);
      }),
      { numRuns: 4000 },
    );
  });

  it('rounds exact binary ties away from zero', () => {
    expect(roundToFigures(0.125, 2)).toBe(0.13);
    expect(roundToFigures(-2.5, 1)).toBe(-3);
    expect(roundToFigures(1.005, 3)).toBe(1); // 1.005 is stored just below the tie
  });

  it('carries into the next power of ten and keeps what is not finite', () => {
    expect(roundToFigures(999.7, 3)).toBe(1000);
    expect(roundToFigures(9.996e-31, 3)).toBe(1e-30);
    expect(roundToFigures(NaN, 3)).toBeNaN();
    expect(roundToFigures(-Infinity, 3)).toBe(-Infinity);
    expect(roundToFigures(5e-324, 2)).toBe(5e-324);
    expect(roundToFigures(1.7976931348623157e308, 17)).toBe(1.7976931348623157e308);
  });

  it('rounds a column as it rounds each value', () => {
    fc.assert(
      fc.property(
        fc.array(fc.oneof(anyDouble, decimalTie, everyday, fc.constantFrom(0, NaN, Infinity, 1e-310)), {
          maxLength: 40,
        }),
        figures,
        (values, digits) => {
          const column = Float64Array.from(values);
          const out = new Float64Array(column.length);
          roundColumnToFigures(out, column, column.length, digits);
          expect(Array.from(out)).toEqual(values.map((x) => exact(x, digits) + 0));
        },
      ),
      { numRuns: 1500 },
    );
  });
});

describe('roundToDecimals', () => {
  it('equals toFixed and counts tens for negative decimals', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.integer({ min: 0, max: 12 }),
        (x, decimals) => {
          expect(roundToDecimals(x, decimals)).toBeCloseTo(Number(x.toFixed(decimals)), 15);
        },
      ),
    );
    expect(roundToDecimals(1250, -2)).toBe(1300);
    expect(roundToDecimals(-49, -2)).toBe(0);
    expect(roundToDecimals(-50, -2)).toBe(-100);
  });
});

describe('roundInUnit', () => {
  it('rounds an energy in electronvolts, not in joules', () => {
    const reading = readUnit('eV');
    if (!reading.ok) throw new Error(reading.message);
    // 2.4046 eV prints as 2.40 eV; the same energy in joules would round to 3.85e-19 J, which is 2.403 eV.
    expect(roundInUnit(2.4046 * 1.602176634e-19, 3, reading.unit)).toBeCloseTo(2.4 * 1.602176634e-19, 30);
  });
});
