import {
  type Compilation,
  compileScript,
  type DrawValues,
  evaluateDraw,
  firstKeptDraw,
  type ItemContent,
} from '#shared/engine/index.ts';
import type { ItemAtDraw, StoredFigure } from '#shared/sheet/build-item.ts';

/** Draws that are tried before a script is taken to keep none. */
const SEARCHED = 200_000;

export interface CompiledItem {
  item: ItemAtDraw;
  compilation: Compilation;
  draw: number;
}

function drawNumber(compilation: Compilation, asked: number | null): number {
  const { script } = compilation;
  if (script === null) return asked ?? 1;
  const { size, open } = script.grid;
  // A grid that has shrunk while its script was edited no longer has the draw that was looked at.
  const exists = asked !== null && asked >= 1 && (open || asked <= size);
  return exists ? asked : (firstKeptDraw(script, 1, SEARCHED) ?? 1);
}

/** Compiles an item and evaluates it at one draw; null, or a draw beyond the grid, gives the first kept one. */
export function itemAtDraw(
  content: ItemContent,
  asked: number | null,
  figures: readonly StoredFigure[],
): CompiledItem {
  const compilation = compileScript(content.script);
  const { script } = compilation;
  const draw = drawNumber(compilation, asked);
  const values: DrawValues | null = script === null ? null : evaluateDraw(script, draw);
  return { item: { content, script, values, figures }, compilation, draw };
}
