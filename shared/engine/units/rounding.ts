import { fromSI, powerOfTen, toSI } from './convert.ts';
import {
  exactPower,
  LARGEST_EXACT_POWER,
  nearestProduct,
  roundProductNearHalf,
  roundQuotientNearHalf,
  type ExactPower,
} from './exact-scaling.ts';
import type { Unit } from './unit.ts';

/** Up to so many figures a scaled value stays a whole number that doubles hold with bits to spare. */
const FAST_FIGURES = 14;
/** 2^-50: four times the error bound of the one or two scalings below, relative. */
const DOUBT = 2 ** -50;

/**
 * 1.5 × 2^52: adding it to a number below 2^51 and taking it away again leaves the nearest whole number, with no
 * branch that depends on the fraction.
 */
const WHOLE = 1.5 * 2 ** 52;

/** floor(log10(magnitude)) for a positive finite double, against the table of powers. */
function decimalExponent(magnitude: number): number {
  let exponent = Math.floor(Math.log10(magnitude));
  if (powerOfTen(exponent) > magnitude) exponent -= 1;
  else if (powerOfTen(exponent + 1) <= magnitude) exponent += 1;
  return exponent;
}

/** How numbers of one decade are brought to whole numbers of the last figure wanted, and back. */
interface DecadeScale {
  /**
   * `product`: times an exact power of ten; `quotient`: divided by one; `long`: times a power of ten that no double
   * holds, taken as the sum of two; `none`: by the exact decimal expansion alone.
   */
  way: 'product' | 'quotient' | 'long' | 'none';
  scale: ExactPower;
  inverse: ExactPower;
}

const NO_POWER: ExactPower = { high: 1, low: 0 };
const LARGEST_SINGLE_POWER = 22;

function decadeScale(exponent: number, figures: number): DecadeScale {
  const shift = figures - 1 - exponent;
  if (figures > FAST_FIGURES || !(shift >= -LARGEST_SINGLE_POWER && shift <= LARGEST_EXACT_POWER)) {
    return { way: 'none', scale: NO_POWER, inverse: NO_POWER };
  }
  if (shift < 0) return { way: 'quotient', scale: { high: powerOfTen(-shift), low: 0 }, inverse: NO_POWER };
  if (shift <= LARGEST_SINGLE_POWER) {
    return { way: 'product', scale: { high: powerOfTen(shift), low: 0 }, inverse: NO_POWER };
  }
  return { way: 'long', scale: exactPower(shift), inverse: exactPower(-shift) };
}

/**
 * Rounds `x` by the scale of its decade. One scaling tells which way to round unless it lands within a few ulps of
 * a half; then the exact product decides. Scaling back is correctly rounded: by one division or product with an
 * exact power of ten, or by a product in twice the precision.
 */
function roundInDecade(x: number, magnitude: number, figures: number, decade: DecadeScale): number {
  const { way, scale, inverse } = decade;
  let result = NaN;
  if (way !== 'none') {
    const scaled = way === 'quotient' ? magnitude / scale.high : magnitude * scale.high;
    let rounded = scaled + WHOLE - WHOLE;
    if (Math.abs(scaled - rounded) > 0.5 - scaled * DOUBT) {
      rounded =
        way === 'quotient'
          ? roundQuotientNearHalf(magnitude, scale.high, scaled)
          : roundProductNearHalf(magnitude, scale, scaled);
    }
    if (way === 'product') result = rounded / scale.high;
    else if (way === 'quotient') result = rounded * scale.high;
    else result = nearestProduct(rounded, inverse);
  }
  if (Number.isNaN(result)) return Number(x.toPrecision(figures));
  return x < 0 ? -result : result;
}

/**
 * `x` rounded to `figures` significant figures (1 to 100), half away from zero on the exact binary value: equal
 * to Number(x.toPrecision(figures)) for every x.
 */
export function roundToFigures(x: number, figures: number): number {
  const magnitude = Math.abs(x);
  if (magnitude === 0) return 0;
  if (!(magnitude < Infinity) || figures > FAST_FIGURES || magnitude < 1e-300)
    return Number(x.toPrecision(figures));
  return roundInDecade(x, magnitude, figures, decadeScale(decimalExponent(magnitude), figures));
}

/**
 * Rounds the first `count` values of a column to significant figures, in place or into another column, value
 * for value as roundToFigures does. Values of one quantity mostly share their decade, so its scale is kept.
 */
export function roundColumnToFigures(
  out: Float64Array,
  column: Float64Array,
  count: number,
  figures: number,
): void {
  const clear = 0.5 - powerOfTen(figures) * DOUBT;
  let exponent = 0;
  let low = Infinity;
  let high = Infinity;
  let decade = decadeScale(0, figures);
  let isProduct = false;
  let scale = 1;
  for (let index = 0; index < count; index += 1) {
    const x = column[index] as number;
    const magnitude = x < 0 ? -x : x;
    if (!(magnitude >= low && magnitude < high)) {
      exponent = neighbouringExponent(magnitude, exponent);
      if (Number.isNaN(exponent)) {
        low = high = Infinity;
        out[index] = roundToFigures(x, figures);
        continue;
      }
      low = powerOfTen(exponent);
      high = powerOfTen(exponent + 1);
      decade = decadeScale(exponent, figures);
      isProduct = decade.way === 'product';
      scale = decade.scale.high;
    }
    if (!isProduct) {
      out[index] = roundInDecade(x, magnitude, figures, decade);
      continue;
    }
    // Everyday sizes, in as few steps as can be.
    const scaled = magnitude * scale;
    let rounded = scaled + WHOLE - WHOLE;
    const rest = scaled - rounded;
    if (rest > clear || rest < -clear) rounded = roundProductNearHalf(magnitude, decade.scale, scaled);
    const result = rounded / scale;
    out[index] = x < 0 ? -result : result;
  }
}

/** The decimal exponent of a magnitude that is probably near `guess`; NaN for what is not an everyday number. */
function neighbouringExponent(magnitude: number, guess: number): number {
  if (!(magnitude >= 1e-300 && magnitude < Infinity)) return NaN;
  if (magnitude >= powerOfTen(guess) && magnitude < powerOfTen(guess + 1)) return guess;
  if (magnitude >= powerOfTen(guess + 1) && magnitude < powerOfTen(guess + 2)) return guess + 1;
  if (magnitude >= powerOfTen(guess - 1) && magnitude < powerOfTen(guess)) return guess - 1;
  return decimalExponent(magnitude);
}

/** `x` (coherent SI) rounded to significant figures in `unit`, back in SI. A decimal unit rounds as SI does. */
export function roundInUnit(x: number, figures: number, unit: Unit): number {
  return unit.coefficient === 1
    ? roundToFigures(x, figures)
    : toSI(roundToFigures(fromSI(x, unit), figures), unit);
}

/** `x` rounded to `decimals` decimals (negative ones count tens), half away from zero on the exact binary value. */
export function roundToDecimals(x: number, decimals: number): number {
  if (!Number.isFinite(x) || x === 0) return x;
  if (decimals >= 0) return decimals > 100 ? x : Number(x.toFixed(decimals));
  const figures = decimalExponent(Math.abs(x)) + 1 + decimals;
  if (figures >= 1) return roundToFigures(x, figures);
  return figures === 0 && Math.abs(x) >= 5 * powerOfTen(-decimals - 1)
    ? Math.sign(x) * powerOfTen(-decimals)
    : 0;
}
