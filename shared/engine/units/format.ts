import type { Unit } from './unit.ts';

/** How many figures a number is printed with: significant figures, or decimals of its unit. */
export type PrintPrecision = { figures: number } | { decimals: number };

/** A number as printed. */
export interface PrintedNumber {
  /** For screens and plain text, with a real minus, thin spaces and superscripts: `1.76 × 10¹¹`. */
  text: string;
  /** For maths: `1.76 \times 10^{11}`. */
  latex: string;
  negative: boolean;
  /** Digits before the power of ten, without sign: `1.76`. */
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

/**
 * Prints a number (in the unit it will stand beside) plainly while it keeps between 0.1 and 1000 and its
 * zeros say no more than they should, else in standard form. NaN and infinities print as `—`.
 */
export function formatNumber(value: number, precision: PrintPrecision): PrintedNumber {
  throw new Error(`not printable yet: ${value} ${JSON.stringify(precision)}`);
}

/** Prints `valueSI` (coherent SI) in `unit`. */
export function formatQuantity(valueSI: number, unit: Unit, precision: PrintPrecision): PrintedQuantity {
  throw new Error(`not printable yet: ${valueSI} ${unit.text} ${JSON.stringify(precision)}`);
}
