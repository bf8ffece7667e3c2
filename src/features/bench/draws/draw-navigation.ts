import {
  compileScript,
  evaluateBlock,
  firstKeptDraw,
  randomDraw,
  type CompiledScript,
} from '#shared/engine/index.ts';

export type DrawMove = 'first' | 'previous' | 'next' | 'random';

/** Draws looked at in one go, and how many at most, while a kept one is sought backwards. */
const BLOCK = 512;
const MOST_BLOCKS = 400;

/** Highest draw number that can be asked for. */
function lastDraw(script: CompiledScript): number {
  return script.grid.open ? Number.MAX_SAFE_INTEGER : script.grid.size;
}

/** The kept draw next below `draw`, going round to the last; null when none is found. */
function keptBefore(script: CompiledScript, draw: number): number | null {
  const last = lastDraw(script);
  let end = draw - 1 < 1 ? (script.grid.open ? 1 : last) : Math.min(draw - 1, last);
  for (let block = 0; block < MOST_BLOCKS; block += 1) {
    const from = Math.max(1, end - BLOCK + 1);
    const { kept } = evaluateBlock(script, { from, count: end - from + 1 }, { wanted: [] });
    const found = kept.lastIndexOf(1);
    if (found >= 0) return from + found;
    end = from > 1 ? from - 1 : last;
  }
  return null;
}

/**
 * The draw that a move leads to, passing over draws that `require` discards. Null when the script has an
 * error or keeps no draw. `random` gives numbers in [0, 1).
 */
export function drawAfter(
  source: string,
  draw: number | null,
  move: DrawMove,
  random: () => number,
): number | null {
  const { script } = compileScript(source);
  if (script === null) return null;
  switch (move) {
    case 'first':
      return firstKeptDraw(script);
    case 'next':
      return firstKeptDraw(script, draw === null || draw >= lastDraw(script) ? 1 : draw + 1);
    case 'previous':
      return keptBefore(script, draw ?? 1);
    case 'random':
      return firstKeptDraw(script, randomDraw(script, random));
  }
}

/** A draw number as typed: whole and from 1; else what is wrong with it, as a sentence. */
export function readDrawNumber(
  text: string,
  gridSize: number,
  open: boolean,
): { ok: true; draw: number } | { ok: false; reason: string } {
  const digits = text.replace(/[\s,\u2009\u202f]/g, '');
  if (!/^\d+$/.test(digits)) return { ok: false, reason: 'A draw number is a whole number, as 27.' };
  const draw = Number(digits);
  if (draw < 1) return { ok: false, reason: 'Draws are numbered from 1.' };
  if (!open && draw > gridSize) {
    return {
      ok: false,
      reason: `This script has ${gridSize.toLocaleString('en-GB')} draws; ${draw.toLocaleString('en-GB')} is beyond the last.`,
    };
  }
  return draw <= Number.MAX_SAFE_INTEGER
    ? { ok: true, draw }
    : { ok: false, reason: 'That number is too large.' };
}
