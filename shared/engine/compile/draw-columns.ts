import type { DrawSelection } from './compiled-script.ts';
import { digitAt, type GridPlace } from './grid.ts';

/** The draws of one block, as grid indices from 0. */
export interface BlockDraws {
  /** First draw number when the draws follow one another, else null. */
  from: number | null;
  /** Draw numbers of the block; only the first `count` are valid. */
  numbers: Float64Array;
  count: number;
}

/**
 * Fills a column with a drawn value, by its levels as a table or by the digit. Draws that follow one another
 * run through the levels like the wheels of a counter.
 */
export function fillDrawn(
  out: Float64Array,
  draws: BlockDraws,
  place: GridPlace,
  gridSize: number,
  levels: Float64Array | ((digit: number) => number),
): void {
  const level = typeof levels === 'function' ? levels : (digit: number) => levels[digit] ?? NaN;
  if (draws.from === null) {
    for (let i = 0; i < draws.count; i += 1) {
      out[i] = level(digitAt(((draws.numbers[i] ?? 1) - 1) % gridSize, place));
    }
    return;
  }
  const start = (draws.from - 1) % gridSize;
  const digit = digitAt(start, place);
  if (place.stride === 1 && typeof levels === 'object') fillCycle(out, draws.count, levels, digit);
  else fillRuns(out, draws.count, place, digit, place.stride - (start % place.stride), level);
}

/** The wheel that turns at every draw. */
function fillCycle(out: Float64Array, count: number, table: Float64Array, firstDigit: number): void {
  let digit = firstDigit;
  for (let i = 0; i < count; i += 1) {
    out[i] = table[digit] ?? NaN;
    digit += 1;
    if (digit === table.length) digit = 0;
  }
}

/** A wheel that stands still for `stride` draws; `firstRun` are left of the first digit. */
function fillRuns(
  out: Float64Array,
  count: number,
  place: GridPlace,
  firstDigit: number,
  firstRun: number,
  level: (digit: number) => number,
): void {
  let digit = firstDigit;
  let run = firstRun;
  for (let i = 0; i < count;) {
    const end = Math.min(count, i + run);
    const value = level(digit);
    for (; i < end; i += 1) out[i] = value;
    digit = digit + 1 === place.count ? 0 : digit + 1;
    run = place.stride;
  }
}

/** Number of draws in a selection. */
export function selectionLength(draws: DrawSelection): number {
  return draws instanceof Float64Array ? draws.length : draws.count;
}
