import { printingOf } from '../holes/fill-hole.ts';
import { fromSI } from '../units/convert.ts';
import type { RunningCheck } from './check.ts';
import type { AssayContext } from './context.ts';
import type { Distribution } from './report.ts';

const BINS = 24;
/** Values kept for the median and the bins; beyond this every second one is dropped, again and again. */
const MOST_VALUES = 4_096;

/** Collects how each scalar quantity spreads over the kept draws. */
export function createDistributions(context: AssayContext): RunningCheck & { tell: () => Distribution[] } {
  const holes = { script: context.script, quantities: context.content.quantities };
  const entries = context.script.quantities
    .filter((info) => info.shape.kind === 'scalar')
    .map((info) => ({
      info,
      values: [] as number[],
      least: Infinity,
      greatest: -Infinity,
      stride: 1,
      at: 0,
    }));
  return {
    visit: (block) => {
      for (const entry of entries) {
        const column = block.columns.get(entry.info.name);
        if (column === undefined) continue;
        for (let index = 0; index < column.length; index += 1) {
          const value = column[index] ?? NaN;
          if (block.kept[index] === 0 || !Number.isFinite(value)) continue;
          if (value < entry.least) entry.least = value;
          if (value > entry.greatest) entry.greatest = value;
          if (entry.at % entry.stride === 0) entry.values.push(value);
          entry.at += 1;
          if (entry.values.length >= MOST_VALUES) {
            entry.values = entry.values.filter((_value, position) => position % 2 === 0);
            entry.stride *= 2;
          }
        }
      }
    },
    finish: () => [],
    tell: () =>
      entries.flatMap(({ info, values, least, greatest }): Distribution[] => {
        const printing = printingOf(holes, info.name);
        if (values.length === 0 || 'problem' in printing) return [];
        const inUnit = (value: number) => fromSI(value, printing.unit);
        const bins = new Array<number>(BINS).fill(0);
        const width = greatest - least;
        for (const value of values) {
          const bin = width === 0 ? 0 : Math.min(BINS - 1, Math.floor(((value - least) / width) * BINS));
          bins[bin] = (bins[bin] ?? 0) + 1;
        }
        const sorted = [...values].sort((a, b) => a - b);
        return [
          {
            name: info.name,
            unit: printing.unit.text,
            least: inUnit(least),
            median: inUnit(sorted[Math.floor(sorted.length / 2)] ?? NaN),
            greatest: inUnit(greatest),
            bins,
          },
        ];
      }),
  };
}
