import type { Unit } from './unit.ts';

/** A unit, or one sentence that says what cannot be read and how to write it; `start` and `end` are offsets in the text. */
export type UnitReading =
  { ok: true; unit: Unit } | { ok: false; message: string; start: number; end: number };

/**
 * Reads a unit as people write it: `m s^-2`, `m/s²`, `C/kg`, `C kg⁻¹`, `keV`, `µm`, `Ω`, `Å`, `°`.
 * Empty text is the unit of a plain number. After a slash everything is divided, as `J/kg K` is J kg^-1 K^-1.
 */
export function readUnit(text: string): UnitReading {
  throw new Error(`not readable yet: ${text}`);
}
