import type { CompiledScript, DrawValues, QuantityInfo } from '../compile/compiled-script.ts';
import type { Quantity } from '../item/content.ts';
import { mostSimilar } from '../script/similar.ts';
import { convert } from '../units/convert.ts';
import { describeDimension } from '../units/quantity-kinds.ts';
import { sameDimension } from '../units/dimension.ts';
import { formatQuantity, type PrintedQuantity, type PrintPrecision } from '../units/format.ts';
import { readUnit } from '../units/read-unit.ts';
import type { Unit } from '../units/unit.ts';
import type { Hole } from './find-holes.ts';

/** What a hole needs to know of its item. */
export interface HoleContext {
  script: CompiledScript;
  quantities: readonly Quantity[];
}

/** How a hole prints: the quantity, the unit and the figures, settled once for every draw. */
export interface HolePrinting {
  info: QuantityInfo;
  /** Element of a series, from 0; null for a scalar or a whole series. */
  element: number | null;
  unit: Unit;
  precision: PrintPrecision;
}

const DEFAULT_FIGURES = 3;

/** The decimals that keep a drawn value exact when it is printed in another unit of the same kind. */
function precisionIn(info: QuantityInfo, unit: Unit): PrintPrecision {
  if (info.figures !== null) return { figures: info.figures };
  if (info.decimals === null) return { figures: DEFAULT_FIGURES };
  const scriptUnit = readUnit(info.scriptUnit);
  if (!scriptUnit.ok) return { figures: DEFAULT_FIGURES };
  const shift = Math.log10(convert(1, scriptUnit.unit, unit));
  if (Math.abs(shift - Math.round(shift)) > 1e-9) return { figures: DEFAULT_FIGURES };
  return { decimals: info.decimals - Math.round(shift) };
}

/** How a name of the script prints: its unit and figures as the item says, else as the script implies. */
export function printingOf(
  context: HoleContext,
  written: string,
  asked: { unit?: string | null; figures?: number | null } = {},
): HolePrinting | { problem: string } {
  const [, name = written, index] = /^(\w+)(?:\[(\d+)\])?$/.exec(written) ?? [];
  const info = context.script.quantities.find((candidate) => candidate.name === name);
  if (info === undefined) {
    const similar = mostSimilar(
      name,
      context.script.quantities.map((candidate) => candidate.name),
    );
    return {
      problem:
        similar === null
          ? `The script has no quantity “${name}”: define it there, or take the hole out.`
          : `The script has no quantity “${name}”: did you mean “${similar}”?`,
    };
  }
  if (info.shape.kind === 'condition')
    return { problem: `“${name}” is a condition and has no value to print.` };
  let element: number | null = null;
  if (index !== undefined) {
    const length = info.shape.kind === 'series' ? info.shape.length : 0;
    if (Number(index) < 1 || Number(index) > length) {
      return {
        problem: `“${name}” has no element ${index}: it has ${length === 0 ? 'a single value' : length}.`,
      };
    }
    element = Number(index) - 1;
  }
  const settings = context.quantities.find((candidate) => candidate.name === name);
  const unitName = asked.unit ?? (settings?.unit || info.scriptUnit);
  const reading = readUnit(unitName);
  if (!reading.ok) return { problem: `“${unitName}” is no unit: write one such as kV or m s^-1.` };
  if (!sameDimension(reading.unit.dimension, info.dimension)) {
    return {
      problem: `“${name}” is ${describeDimension(info.dimension)}: it cannot be printed in ${unitName || 'no unit'}.`,
    };
  }
  const figures = asked.figures ?? settings?.figures ?? null;
  const precision = figures === null ? precisionIn(info, reading.unit) : { figures };
  return { info, element, unit: reading.unit, precision };
}

/** One value as it prints; NaN where the draw leaves it undefined. */
export function printValue(printing: HolePrinting, values: DrawValues): PrintedQuantity {
  const stored = values.values[printing.info.name];
  const value = typeof stored === 'number' ? stored : (stored?.[printing.element ?? 0] ?? NaN);
  return formatQuantity(value, printing.unit, printing.precision);
}

/** Every element of a series as it prints. */
export function printSeries(printing: HolePrinting, values: DrawValues): PrintedQuantity[] {
  const stored = values.values[printing.info.name];
  const list = typeof stored === 'number' ? [stored] : (stored ?? []);
  return list.map((value) => formatQuantity(value, printing.unit, printing.precision));
}

/** What is wrong with a hole, as a sentence with its cure; null when it prints. */
export function holeProblem(context: HoleContext, hole: Hole): string | null {
  for (const name of hole.names) {
    const printing = printingOf(context, name, hole);
    if ('problem' in printing) return printing.problem;
    const isSeries = printing.info.shape.kind === 'series' && printing.element === null;
    if (hole.kind === 'value' && isSeries) {
      return `“${name}” is a series: print it with {{table(${name})}} or one element as {{${name}[1]}}.`;
    }
    if (hole.kind === 'table' && !isSeries) return `“${name}” is a single value: a table needs series.`;
  }
  return null;
}
