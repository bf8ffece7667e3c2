import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  dimension,
  DIMENSIONLESS,
  divideDimensions,
  isDimensionless,
  multiplyDimensions,
  powerOfDimension,
  rational,
  sameDimension,
} from './dimension.ts';

const whole = fc.integer({ min: -6, max: 6 });
const anyDimension = fc
  .tuple(whole, whole, whole, whole, whole, whole, whole)
  .map((exponents) => dimension(...exponents));
const anyExponent = fc
  .tuple(
    fc.integer({ min: -5, max: 5 }).filter((n) => n !== 0),
    fc.integer({ min: 1, max: 6 }),
  )
  .map(([numerator, denominator]) => rational(numerator, denominator));

describe('dimension algebra', () => {
  it('keeps fractions in lowest terms with a positive denominator', () => {
    expect(rational(6, -4)).toEqual([-3, 2]);
    expect(rational(0, -7)).toEqual([0, 1]);
  });

  it('is a commutative group under multiplication', () => {
    fc.assert(
      fc.property(anyDimension, anyDimension, anyDimension, (a, b, c) => {
        expect(multiplyDimensions(a, b)).toEqual(multiplyDimensions(b, a));
        expect(multiplyDimensions(multiplyDimensions(a, b), c)).toEqual(
          multiplyDimensions(a, multiplyDimensions(b, c)),
        );
        expect(multiplyDimensions(a, DIMENSIONLESS)).toEqual(a);
        expect(isDimensionless(divideDimensions(a, a))).toBe(true);
      }),
    );
  });

  it('undoes a power by the reciprocal power exactly', () => {
    fc.assert(
      fc.property(anyDimension, anyExponent, (a, exponent) => {
        const back = powerOfDimension(powerOfDimension(a, exponent), rational(exponent[1], exponent[0]));
        expect(sameDimension(back, a)).toBe(true);
      }),
    );
  });

  it('distributes a power over a product', () => {
    fc.assert(
      fc.property(anyDimension, anyDimension, anyExponent, (a, b, exponent) => {
        expect(powerOfDimension(multiplyDimensions(a, b), exponent)).toEqual(
          multiplyDimensions(powerOfDimension(a, exponent), powerOfDimension(b, exponent)),
        );
      }),
    );
  });
});
