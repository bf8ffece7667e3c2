/**
 * The seven exponents of the SI base dimensions in the order length, mass, time, current,
 * temperature, amount, luminous intensity; each an exact rational [numerator, denominator] in lowest terms.
 */
export type Dimension = readonly (readonly [number, number])[];

/** An exact fraction [numerator, denominator] in lowest terms, denominator positive. */
export type Rational = readonly [number, number];

/** A fraction in lowest terms with a positive denominator. */
export function rational(numerator: number, denominator = 1): Rational {
  let a = Math.abs(numerator);
  let b = Math.abs(denominator);
  while (b !== 0) [a, b] = [b, a % b];
  const divisor = (a || 1) * Math.sign(denominator);
  return [numerator / divisor + 0, denominator / divisor];
}

/** Dimension with the given whole exponents of length, mass, time, current, temperature, amount, luminous intensity. */
export function dimension(
  length = 0,
  mass = 0,
  time = 0,
  current = 0,
  temperature = 0,
  amount = 0,
  luminous = 0,
): Dimension {
  return [length, mass, time, current, temperature, amount, luminous].map((exponent) => rational(exponent));
}

/** The dimension of a plain number. */
export const DIMENSIONLESS: Dimension = dimension();

function combine(a: Dimension, b: Dimension, sign: 1 | -1): Dimension {
  return a.map(([numerator, denominator], index) => {
    const [otherNumerator, otherDenominator] = b[index] ?? [0, 1];
    return rational(
      numerator * otherDenominator + sign * otherNumerator * denominator,
      denominator * otherDenominator,
    );
  });
}

/** The dimension of a product. */
export function multiplyDimensions(a: Dimension, b: Dimension): Dimension {
  return combine(a, b, 1);
}

/** The dimension of a quotient. */
export function divideDimensions(a: Dimension, b: Dimension): Dimension {
  return combine(a, b, -1);
}

/** The dimension of a power with an exact exponent. */
export function powerOfDimension(a: Dimension, exponent: Rational): Dimension {
  return a.map(([numerator, denominator]) => rational(numerator * exponent[0], denominator * exponent[1]));
}

/** Whether two dimensions are the same, exponent by exponent. */
export function sameDimension(a: Dimension, b: Dimension): boolean {
  return a.every(([numerator, denominator], index) => {
    const other = b[index];
    return other !== undefined && other[0] === numerator && other[1] === denominator;
  });
}

/** Whether this is the dimension of a plain number. */
export function isDimensionless(a: Dimension): boolean {
  return a.every(([numerator]) => numerator === 0);
}
