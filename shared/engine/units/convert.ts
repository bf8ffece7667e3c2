import { sameDimension } from './dimension.ts';
import type { Unit } from './unit.ts';

/** Powers of ten from 10^-340 to 10^340, each the nearest double; the exact ones are 10^0 to 10^22. */
const POWERS = Float64Array.from({ length: 681 }, (_, index) => Number(`1e${index - 340}`));

/** The double nearest to 10^exponent. */
export function powerOfTen(exponent: number): number {
  return POWERS[exponent + 340] ?? 10 ** exponent;
}

/** `value × 10^power`, correctly rounded while |power| ≤ 22, since those powers of ten are exact. */
export function scaleByTen(value: number, power: number): number {
  if (power === 0) return value;
  return power < 0 && power >= -22 ? value / powerOfTen(-power) : value * powerOfTen(power);
}

/** A number in `unit` as a number in coherent SI units. */
export function toSI(value: number, unit: Unit): number {
  return scaleByTen(value * unit.coefficient, unit.power);
}

/** A number in coherent SI units as a number in `unit`. */
export function fromSI(valueSI: number, unit: Unit): number {
  return scaleByTen(valueSI, -unit.power) / unit.coefficient;
}

/** A number in `from` as a number in `to`; throws RangeError when their dimensions differ. */
export function convert(value: number, from: Unit, to: Unit): number {
  if (!sameDimension(from.dimension, to.dimension)) {
    throw new RangeError(
      `A value in ${from.text || 'no unit'} cannot be written in ${to.text || 'no unit'}.`,
    );
  }
  return scaleByTen((value * from.coefficient) / to.coefficient, from.power - to.power);
}

/** A decimal literal such as `0.70` or `1.76e11` in `unit`, as the nearest double in coherent SI units. */
export function literalToSI(literal: string, unit: Unit): number {
  const [mantissa = '0', exponent = '0'] = literal.toLowerCase().split('e');
  return Number(`${mantissa}e${Number(exponent) + unit.power}`) * unit.coefficient;
}
