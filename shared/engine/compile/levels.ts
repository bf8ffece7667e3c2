import { scaleByTen } from '../units/convert.ts';
import type { StepLevels } from '../script/statement.ts';

/** Levels up to this count are kept as a table. */
const TABLE_LENGTH = 4096;
const tables = new WeakMap<StepLevels, Float64Array>();

/** Level `index` (from 0) in coherent SI units: the double nearest to the written decimal, times the unit's coefficient. */
export function levelValue(levels: StepLevels, index: number): number {
  const digits = levels.first + levels.step * index;
  const power = levels.power + levels.unit.power;
  const exact = power >= -22 && power <= 22 ? scaleByTen(digits, power) : Number(`${digits}e${power}`);
  return exact * levels.unit.coefficient;
}

/** All levels as a table, or null when there are too many to keep. */
export function levelTable(levels: StepLevels): Float64Array | null {
  if (levels.count > TABLE_LENGTH) return null;
  let table = tables.get(levels);
  if (table === undefined) {
    table = Float64Array.from({ length: levels.count }, (_, index) => levelValue(levels, index));
    tables.set(levels, table);
  }
  return table;
}
