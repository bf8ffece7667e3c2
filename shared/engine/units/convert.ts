import type { Unit } from './unit.ts';

/** A number in `unit` as a number in coherent SI units. */
export function toSI(value: number, unit: Unit): number {
  return value * unit.coefficient * 10 ** unit.power;
}

/** A number in coherent SI units as a number in `unit`. */
export function fromSI(valueSI: number, unit: Unit): number {
  return valueSI / (unit.coefficient * 10 ** unit.power);
}

/** A number in `from` as a number in `to`; throws RangeError when their dimensions differ. */
export function convert(value: number, from: Unit, to: Unit): number {
  return fromSI(toSI(value, from), to);
}
