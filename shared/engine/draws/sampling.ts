import type { CompiledScript, DrawSelection } from '../compile/compiled-script.ts';
import { evaluateBlock } from '../compile/evaluate.ts';
import { drawOfDigits, gridPlaces } from '../compile/grid.ts';
import { lowDiscrepancy } from './low-discrepancy.ts';

/** Up to so many grid points are all assayed. */
export const EXHAUSTIVE_LIMIT = 1_000_000;

/** Which draws are assayed. */
export interface DrawPlan {
  draws: DrawSelection;
  count: number;
  exhaustive: boolean;
  gridSize: number;
  open: boolean;
}

/** The corners of the grid, each drawn value at its first or last level; every so many where there are more than `most`. */
function cornerDraws(script: CompiledScript, most: number): number[] {
  const places = gridPlaces(script);
  const moving = places.flatMap((place, index) => (place.count > 1 ? [index] : []));
  const corners = 2 ** Math.min(moving.length, 50);
  const taken = Math.min(corners, most);
  return Array.from({ length: taken }, (_, at) => {
    let bits = Math.floor((at / taken) * corners);
    const digits = places.map(() => 0);
    for (const index of moving) {
      if (bits % 2 === 1) digits[index] = (places[index]?.count ?? 1) - 1;
      bits = Math.floor(bits / 2);
    }
    return drawOfDigits(script, digits);
  });
}

/**
 * All draws when there are at most `limit` (default EXHAUSTIVE_LIMIT); else every corner of the grid (at
 * most half the sample) and then a low-discrepancy sample, `sampleSize` in all (default 20,000), ascending.
 * A script with scatter is never exhausted: each point of its grid is taken in turn, with new scatter.
 */
export function planDraws(
  script: CompiledScript,
  limit: number = EXHAUSTIVE_LIMIT,
  sampleSize = 20_000,
): DrawPlan {
  const { size, open } = script.grid;
  const base = { gridSize: size, open };
  if (!open && size <= limit)
    return { ...base, draws: { from: 1, count: size }, count: size, exhaustive: true };
  if (open && size <= sampleSize) {
    return { ...base, draws: { from: 1, count: sampleSize }, count: sampleSize, exhaustive: false };
  }
  const chosen = new Set(cornerDraws(script, Math.floor(sampleSize / 2)));
  const places = gridPlaces(script);
  const point = lowDiscrepancy(places.length);
  for (let n = 1; chosen.size < sampleSize && n <= 8 * sampleSize; n += 1) {
    const fractions = point(n);
    chosen.add(
      drawOfDigits(
        script,
        places.map((place, index) =>
          Math.min(place.count - 1, Math.floor((fractions[index] ?? 0) * place.count)),
        ),
      ),
    );
  }
  const draws = Float64Array.from(chosen).sort();
  return { ...base, draws, count: draws.length, exhaustive: false };
}

/** Draws that a script with scatter is asked for by chance. */
const OPEN_DRAWS = 1_000_000_000;

/** A draw number from a random source that gives numbers in [0, 1). */
export function randomDraw(script: CompiledScript, random: () => number): number {
  const size = script.grid.open ? OPEN_DRAWS : script.grid.size;
  return 1 + Math.min(size - 1, Math.floor(random() * size));
}

/** Draws that are looked at together while a kept one is sought. */
const SEARCH_BLOCK = 4096;

/** The first kept draw at or after `from` (default 1) within `within` draws, cyclically; null when none is kept. */
export function firstKeptDraw(script: CompiledScript, from = 1, within = EXHAUSTIVE_LIMIT): number | null {
  const size = script.grid.open ? Number.MAX_SAFE_INTEGER : script.grid.size;
  const most = Math.min(within, size);
  let draw = from >= 1 && from <= size ? Math.floor(from) : 1;
  for (let seen = 0; seen < most;) {
    const count = Math.min(SEARCH_BLOCK, most - seen, size - draw + 1);
    const { kept } = evaluateBlock(script, { from: draw, count }, { wanted: [] });
    const found = kept.indexOf(1);
    if (found >= 0) return draw + found;
    seen += count;
    draw = draw + count > size ? 1 : draw + count;
  }
  return null;
}
