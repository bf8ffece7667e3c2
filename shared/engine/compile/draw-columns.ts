import type { StepLevels } from '../script/statement.ts';
import type { DrawSelection } from './compiled-script.ts';
import { digitAt, type GridPlace } from './grid.ts';
import { levelTable, levelValue } from './levels.ts';

/** The draws of one block, as grid indices from 0. */
export interface BlockDraws {
  /** First draw number when the draws follow one another, else null. */
  from: number | null;
  /** Draw numbers of the block; only the first `count` are valid. */
  numbers: Float64Array;
  count: number;
}

/** Value of the level at a digit. */
export type LevelReader = (digit: number) => number;

/** Reads levels by digit from a table where there is one. */
export function levelReader(levels: StepLevels): LevelReader {
  const table = levelTable(levels);
  return table === null ? (digit) => levelValue(levels, digit) : (digit) => table[digit] ?? NaN;
}

/**
 * Fills a column with a drawn value. Draws that follow one another run through the levels like the wheels of
 * a counter, so that a value is looked up once for each run of equal digits.
 */
export function fillDrawn(
  out: Float64Array,
  draws: BlockDraws,
  place: GridPlace,
  gridSize: number,
  level: LevelReader,
): void {
  if (draws.from === null) {
    for (let i = 0; i < draws.count; i += 1) {
      out[i] = level(digitAt(((draws.numbers[i] ?? 1) - 1) % gridSize, place));
    }
    return;
  }
  const start = (draws.from - 1) % gridSize;
  let digit = digitAt(start, place);
  let left = place.stride - (start % place.stride);
  let i = 0;
  while (i < draws.count) {
    const end = Math.min(draws.count, i + left);
    const value = level(digit);
    for (; i < end; i += 1) out[i] = value;
    digit = digit + 1 === place.count ? 0 : digit + 1;
    left = place.stride;
  }
}

/** Number of draws in a selection. */
export function selectionLength(draws: DrawSelection): number {
  return draws instanceof Float64Array ? draws.length : draws.count;
}
