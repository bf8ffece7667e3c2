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
 * Rounds the first `count` values of a column to significant figures, in place or into another column. Values
 * of one quantity mostly share their decimal exponent, so the last one found is tried first.
 */
export function roundColumnToFigures(
  out: Float64Array,
  column: Float64Array,
  count: number,
  figures: number,
): void {
  let exponent = 0;
  let low = 1;
  let high = 10;
  for (let index = 0; index < count; index += 1) {
    const x = column[index] ?? NaN;
    const magnitude = x < 0 ? -x : x;
    if (!(magnitude >= low && magnitude < high)) {
      if (!(magnitude >= 1e-300 && magnitude < Infinity)) {
        out[index] = roundToFigures(x, figures);
        continue;
      }
      exponent = decimalExponent(magnitude);
      low = powerOfTen(exponent);
      high = powerOfTen(exponent + 1);
    }
    out[index] =
      figures > FAST_FIGURES ? Number(x.toPrecision(figures)) : roundKnown(x, magnitude, exponent, figures);
  }
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
