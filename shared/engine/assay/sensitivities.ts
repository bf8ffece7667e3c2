import { evaluateBlock } from '../compile/evaluate.ts';
import type { BlockValues } from '../compile/compiled-script.ts';
import type { AssayContext, AssayPart } from './context.ts';

/** How an answer moves with one printed value. */
export interface Sensitivity {
  name: string;
  /** Percent by which the answer changes when the value grows by one percent: the median over some draws. */
  percent: number;
  /** The largest change, in size, over these draws, percent. */
  most: number;
}

const SAMPLE = 64;
const STEP = 0.01;

function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? NaN;
}

/** Some kept draws of a block, evenly spaced. */
function sampleOf(block: BlockValues): Float64Array {
  const kept: number[] = [];
  block.draws.forEach((draw, index) => {
    if (block.kept[index] === 1) kept.push(draw);
  });
  const stride = Math.max(1, Math.floor(kept.length / SAMPLE));
  return Float64Array.from(kept.filter((_, index) => index % stride === 0).slice(0, SAMPLE));
}

/** The answer's change for one percent in each printed value, the other printed values held as they are. */
export function sensitivitiesOf(context: AssayContext, part: AssayPart, block: BlockValues): Sensitivity[] {
  const { info, dependencies } = part;
  const draws = sampleOf(block);
  if (draws.length === 0) return [];
  const values = evaluateBlock(context.script, draws, { conditions: false });
  const answers = values.columns.get(info.name);
  const pinned = new Map<string, Float64Array>();
  for (const name of dependencies.givens) {
    const column = values.columns.get(name);
    if (column !== undefined) pinned.set(name, column);
  }
  return [...pinned].flatMap(([name, column]): Sensitivity[] => {
    const moved = evaluateBlock(context.script, draws, {
      wanted: [info.name],
      conditions: false,
      pinned: new Map([...pinned, [name, column.map((value) => value * (1 + STEP))]]),
    }).columns.get(info.name);
    const changes: number[] = [];
    moved?.forEach((value, index) => {
      const change = (100 * (value - (answers?.[index] ?? NaN))) / Math.abs(answers?.[index] ?? NaN);
      if (Number.isFinite(change)) changes.push(change);
    });
    if (changes.length === 0) return [];
    return [{ name, percent: median(changes), most: Math.max(...changes.map(Math.abs)) }];
  });
}
