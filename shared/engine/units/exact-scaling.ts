import { powerOfTen } from './convert.ts';

/**
 * Exact products of doubles, after T. J. Dekker (Numerische Mathematik 18, 224, 1971): a product of two doubles
 * is the sum of two doubles, the rounded product and its error.
 */
const SPLITTER = 2 ** 27 + 1;

/** The error of the rounded product `product` of `a` and `b`, exact while nothing overflows or goes subnormal. */
export function productError(a: number, b: number, product: number): number {
  const aScaled = SPLITTER * a;
  const aHigh = aScaled - (aScaled - a);
  const aLow = a - aHigh;
  const bScaled = SPLITTER * b;
  const bHigh = bScaled - (bScaled - b);
  const bLow = b - bHigh;
  return aLow * bLow - (product - aHigh * bHigh - aLow * bHigh - aHigh * bLow);
}

/** A power of ten as the sum of two doubles: the nearest one, and what is left. */
export interface ExactPower {
  high: number;
  low: number;
}

/** What is left of 10^exponent after its nearest double is taken away, from whole numbers of any length. */
function remainder(exponent: number): number {
  const nearest = powerOfTen(exponent);
  if (exponent >= 0) return Number(10n ** BigInt(exponent) - BigInt(nearest));
  let binary = 0;
  while (!Number.isInteger(nearest * 2 ** binary)) binary += 1;
  const ten = 10n ** BigInt(-exponent);
  const left = 2n ** BigInt(binary) - BigInt(nearest * 2 ** binary) * ten;
  return Number(left) / Number(ten) / 2 ** binary;
}

/** Powers of ten beyond those that doubles hold exactly (10^22), as far as this goes in both directions. */
export const LARGEST_EXACT_POWER = 60;

const powers = new Map<number, ExactPower>();

/** 10^exponent to twice the precision of a double, for |exponent| up to LARGEST_EXACT_POWER. */
export function exactPower(exponent: number): ExactPower {
  let power = powers.get(exponent);
  if (power === undefined) {
    power = { high: powerOfTen(exponent), low: remainder(exponent) };
    powers.set(exponent, power);
  }
  return power;
}

/** The whole number to round to when `scaled`, the rounded product of `magnitude` and `scale`, is near a half. */
export function roundProductNearHalf(magnitude: number, scale: ExactPower, scaled: number): number {
  const whole = Math.floor(scaled);
  const error = productError(magnitude, scale.high, scaled) + magnitude * scale.low;
  return scaled - (whole + 0.5) + error >= 0 ? whole + 1 : whole;
}

/** The same where `scaled` is the rounded quotient of `magnitude` by an exact power of ten. */
export function roundQuotientNearHalf(magnitude: number, divisor: number, scaled: number): number {
  const whole = Math.floor(scaled);
  const half = whole + 0.5;
  const product = half * divisor;
  return magnitude - product - productError(half, divisor, product) >= 0 ? whole + 1 : whole;
}

/** Relative size of what the two-double products may be wrong by, with room to spare. */
const LAST_DOUBT = 2 ** -40;

/** The double nearest to `whole × power`; NaN in the rare case that twice the precision does not tell. */
export function nearestProduct(whole: number, power: ExactPower): number {
  const product = whole * power.high;
  const error = productError(whole, power.high, product) + whole * power.low;
  const result = product + error;
  const rest = product - result + error;
  return result + rest * (1 + LAST_DOUBT) === result && result + rest * (1 - LAST_DOUBT) === result
    ? result
    : NaN;
}
