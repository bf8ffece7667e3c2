import { CONSTANTS } from '../physics/constants.ts';
import { isDimensionless } from '../units/dimension.ts';
import { kindOfDimension } from '../units/quantity-kinds.ts';
import { UNITS } from '../units/unit-table.ts';
import { DRAWING_TABLE, FUNCTION_TABLE } from './functions.ts';

/** One name that the editor can complete or explain. */
export interface NameDescription {
  name: string;
  kind: 'constant' | 'function' | 'unit' | 'drawing';
  /** For a constant or unit what it measures, as `mass (kg)`; for a function its signature. */
  detail: string;
  /** One line that says what it is. */
  description: string;
}

/** Prefixed units that papers on electrons and quanta are full of; every other prefix works as well. */
const COMMON_PREFIXED: readonly (readonly [symbol: string, prefixes: string])[] = [
  ['m', 'k c m µ n p'],
  ['g', 'k m µ'],
  ['s', 'm µ n p'],
  ['A', 'm µ n p'],
  ['V', 'k m µ M'],
  ['T', 'm µ'],
  ['C', 'm µ n p'],
  ['J', 'k M m'],
  ['W', 'k m µ'],
  ['eV', 'k M G'],
  ['Hz', 'k M G T'],
  ['F', 'µ n p'],
  ['Ω', 'k M'],
  ['N', 'k m'],
  ['Pa', 'k M'],
];

function numberText(value: number): string {
  return String(value)
    .replace(/e\+?(-?\d+)$/, ' × 10^$1')
    .replace(/-/g, '−');
}

function constants(): NameDescription[] {
  return Array.from(CONSTANTS.values(), (constant) => {
    const kind = kindOfDimension(constant.dimension);
    const unit = constant.unit === '' ? '' : ` ${constant.unit}`;
    return {
      name: constant.name,
      kind: 'constant' as const,
      detail: kind === null ? constant.unit || 'plain number' : `${kind} (${constant.unit})`,
      description: `${constant.description}: ${numberText(constant.value)}${unit}; on data sheets ${numberText(constant.dataSheet.value)}${unit}.`,
    };
  });
}

function units(): NameDescription[] {
  const described: NameDescription[] = [];
  for (const unit of UNITS.values()) {
    const measures = isDimensionless(unit.dimension)
      ? 'plain number'
      : (kindOfDimension(unit.dimension) ?? '');
    const prefixes = COMMON_PREFIXED.find(([symbol]) => symbol === unit.symbol)?.[1].split(' ') ?? [];
    for (const prefix of ['', ...prefixes]) {
      described.push({
        name: prefix + unit.symbol,
        kind: 'unit',
        detail: measures,
        description:
          prefix === '' ? `Unit: ${unit.name}.` : `Unit: ${prefix}${unit.symbol}, of the ${unit.name}.`,
      });
    }
  }
  return described;
}

/** Every constant, function, drawing statement and common unit that a script may use. */
export function describeNames(): NameDescription[] {
  const functions = Array.from(FUNCTION_TABLE, ([name, row]) => ({
    name,
    kind: 'function' as const,
    detail: row.signature,
    description: row.description,
  }));
  const drawing = Array.from(DRAWING_TABLE, ([name, row]) => ({
    name,
    kind: 'drawing' as const,
    detail: row.signature,
    description: row.description,
  }));
  return [...drawing, ...functions, ...constants(), ...units()];
}
