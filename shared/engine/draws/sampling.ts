import type { CompiledScript, DrawSelection } from '../compile/compiled-script.ts';

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

/**
 * All draws when there are at most `limit` (default EXHAUSTIVE_LIMIT); else every corner of the grid (at
 * most half the sample) and then a low-discrepancy sample, `sampleSize` in all (default 20,000), ascending.
 */
export function planDraws(
  script: CompiledScript,
  limit: number = EXHAUSTIVE_LIMIT,
  sampleSize = 20_000,
): DrawPlan {
  throw new Error(`no plan yet: ${script.source.length} ${limit} ${sampleSize}`);
}

/** A draw number from a random source that gives numbers in [0, 1). */
export function randomDraw(script: CompiledScript, random: () => number): number {
  throw new Error(`no draws yet: ${script.source.length} ${random()}`);
}

/** The first kept draw at or after `from` (default 1) within `within` draws, cyclically; null when none is kept. */
export function firstKeptDraw(script: CompiledScript, from = 1, within = EXHAUSTIVE_LIMIT): number | null {
  throw new Error(`no draws yet: ${script.source.length} ${from} ${within}`);
}

/**
 * What was covered, in words: "all 4,320 draws", or "20,000 of 3.1 × 10^9; fewer than 1 in 6,600 fails,
 * 95 % confidence" (rule of three: with no failure in n, the 95 % upper bound of the rate is 3/n).
 */
export function coverageStatement(plan: DrawPlan, failures = 0): string {
  throw new Error(`no statement yet: ${plan.count} ${failures}`);
}
