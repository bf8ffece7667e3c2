import { fromSI, powerOfTen, toSI } from './convert.ts';
import type { Unit } from './unit.ts';

/** Up to so many figures a scaled value stays a whole number that doubles hold with bits to spare. */
const FAST_FIGURES = 14;
/** 2^-50: four times the error bound of the one or two scalings below, relative. */
const DOUBT = 2 ** -50;

/** floor(log10(magnitude)) for a positive finite double, against the table of powers. */
function decimalExponent(magnitude: number): number {
  let exponent = Math.floor(Math.log10(magnitude));
  if (powerOfTen(exponent) > magnitude) exponent -= 1;
  else if (powerOfTen(exponent + 1) <= magnitude) exponent += 1;
  return exponent;
}

/**
 * Rounds `x` of known decimal exponent. Scaling by an exact power of ten is one correctly rounded step, so the
 * scaled value tells which way to round unless it lies within a few ulps of a half; only then is the exact
 * decimal expansion (toPrecision) asked. Dividing the whole number back is again one correctly rounded step.
 */
function roundKnown(x: number, magnitude: number, exponent: number, figures: number): number {
  const shift = figures - 1 - exponent;
  if (shift > 22 || shift < -22) return Number(x.toPrecision(figures));
  const scaled = shift >= 0 ? magnitude * powerOfTen(shift) : magnitude / powerOfTen(-shift);
  const whole = Math.floor(scaled);
  const rest = scaled - whole - 0.5;
  if (rest < scaled * DOUBT && -rest < scaled * DOUBT) return Number(x.toPrecision(figures));
  const rounded = rest > 0 ? whole + 1 : whole;
  const result = shift >= 0 ? rounded / powerOfTen(shift) : rounded * powerOfTen(-shift);
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
  return roundKnown(x, magnitude, decimalExponent(magnitude), figures);
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
  const doubt = powerOfTen(figures) * DOUBT;
  let exponent = 0;
  let low = Infinity;
  let high = Infinity;
  let shift = 0;
  let scale = 1;
  for (let index = 0; index < count; index += 1) {
    const x = column[index] as number;
    const magnitude = x < 0 ? -x : x;
    if (!(magnitude >= low && magnitude < high)) {
      exponent = neighbouringExponent(magnitude, exponent);
      shift = figures - 1 - exponent;
      if (!(shift >= -22 && shift <= 22 && figures <= FAST_FIGURES)) {
        low = high = Infinity;
        out[index] = roundToFigures(x, figures);
        continue;
      }
      low = powerOfTen(exponent);
      high = powerOfTen(exponent + 1);
      scale = powerOfTen(Math.abs(shift));
    }
    const scaled = shift >= 0 ? magnitude * scale : magnitude / scale;
    const whole = Math.floor(scaled);
    const rest = scaled - whole - 0.5;
    if (rest < doubt && rest > -doubt) {
      out[index] = Number(x.toPrecision(figures));
      continue;
    }
    const rounded = rest > 0 ? whole + 1 : whole;
    const result = shift >= 0 ? rounded / scale : rounded * scale;
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
