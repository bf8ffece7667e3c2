import { fromSI } from './convert.ts';
import { roundToDecimals } from './rounding.ts';
import { superscript, THIN_SPACE, unitLatex, unitText, type Unit } from './unit.ts';

/** How many figures a number is printed with: significant figures, or decimals of its unit. */
export type PrintPrecision = { figures: number } | { decimals: number };

/** A number as printed. */
export interface PrintedNumber {
  /** For screens and plain text, with a real minus, thin spaces and superscripts: `1.76 × 10¹¹`. */
  text: string;
  /** For maths: `1.76 \times 10^{11}`. */
  latex: string;
  negative: boolean;
  /** Digits before the power of ten, without sign or spaces: `1.76`. */
  digits: string;
  /** Power of ten of standard form, or null when printed plainly. */
  exponent: number | null;
  /** What a reader reads back: exactly the printed decimal, in the printed unit. */
  value: number;
}

/** A number with its unit, as printed: `1.76 × 10¹¹ C kg⁻¹`. */
export interface PrintedQuantity extends PrintedNumber {
  unit: Unit;
  /** `C kg⁻¹`. */
  unitText: string;
  /** `\mathrm{C\,kg^{-1}}`. */
  unitLatex: string;
}

/** Numbers from 10^-3 up to 10^5 print plainly when their zeros allow it. */
const LEAST_PLAIN_EXPONENT = -3;
const GREATEST_PLAIN_EXPONENT = 4;

/** Groups the digits before the point by three where there are five or more. */
function groupDigits(digits: string, space: string): string {
  const [whole = '', decimals] = digits.split('.');
  const grouped = whole.length >= 5 ? whole.replace(/\B(?=(\d{3})+$)/g, space) : whole;
  return decimals === undefined ? grouped : `${grouped}.${decimals}`;
}

function printed(negative: boolean, digits: string, exponent: number | null): PrintedNumber {
  const power = exponent === null ? '' : `${THIN_SPACE}×${THIN_SPACE}10${superscript(exponent)}`;
  const latexPower = exponent === null ? '' : ` \\times 10^{${exponent}}`;
  return {
    text: `${negative ? '−' : ''}${groupDigits(digits, THIN_SPACE)}${power}`,
    latex: `${negative ? '-' : ''}${groupDigits(digits, '\\,')}${latexPower}`,
    negative,
    digits,
    exponent,
    value: Number(`${negative ? '-' : ''}${digits}e${exponent ?? 0}`),
  };
}

function printFigures(value: number, figures: number): PrintedNumber {
  const magnitude = Math.abs(value);
  const [mantissa = '0', power = '0'] = magnitude.toExponential(figures - 1).split('e');
  const exponent = Number(power);
  const plain =
    exponent >= LEAST_PLAIN_EXPONENT &&
    exponent <= GREATEST_PLAIN_EXPONENT &&
    figures > exponent &&
    figures - 1 - exponent <= 100;
  if (!plain) return printed(value < 0, mantissa, exponent);
  return printed(value < 0, Number(`${mantissa}e${exponent}`).toFixed(figures - 1 - exponent), null);
}

/**
 * Prints a number (in the unit it will stand beside). It prints plainly from 0.001 up to 100,000 where no
 * trailing zero before the point would look significant without being so; else in standard form. NaN and
 * infinities print as `—`.
 */
export function formatNumber(value: number, precision: PrintPrecision): PrintedNumber {
  if (!Number.isFinite(value)) {
    return { text: '—', latex: '\\text{—}', negative: false, digits: '—', exponent: null, value };
  }
  if ('figures' in precision) {
    const figures = Math.min(100, Math.max(1, Math.round(precision.figures)));
    return value === 0
      ? printed(false, (0).toFixed(Math.min(100, figures - 1)), null)
      : printFigures(value, figures);
  }
  const decimals = Math.min(100, Math.round(precision.decimals));
  const rounded = roundToDecimals(value, decimals);
  if (rounded === 0) return printed(false, (0).toFixed(Math.min(6, Math.max(0, decimals))), null);
  const exponent = Number(rounded.toExponential().split('e')[1]);
  if (decimals < 0 || exponent < LEAST_PLAIN_EXPONENT || exponent > GREATEST_PLAIN_EXPONENT) {
    return printFigures(rounded, Math.max(1, exponent + 1 + decimals));
  }
  return printed(rounded < 0, Math.abs(rounded).toFixed(decimals), null);
}

/** Prints `valueSI` (coherent SI) in `unit`. Between number and unit stands a thin space, none before °. */
export function formatQuantity(valueSI: number, unit: Unit, precision: PrintPrecision): PrintedQuantity {
  const number = formatNumber(fromSI(valueSI, unit), precision);
  const words = unitText(unit);
  const maths = unitLatex(unit);
  const close = words.startsWith('°');
  return {
    ...number,
    text: words === '' ? number.text : `${number.text}${close ? '' : THIN_SPACE}${words}`,
    latex: maths === '' ? number.latex : `${number.latex}${close ? '' : '\\,'}${maths}`,
    unit,
    unitText: words,
    unitLatex: maths,
  };
}
