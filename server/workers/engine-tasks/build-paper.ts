import { compileScript, firstKeptDraw, randomDraw } from '#shared/engine/index.ts';
import { buildPaperScheme, buildPaperSheet } from '#shared/sheet/build-paper.ts';

import type { BuiltPaper, ChosenDraw, DrawToChoose, PaperToBuild } from '../task-types.ts';
import { itemAtDraw } from './item-at-draw.ts';
import { itemFacts } from './paper-facts.ts';

/** Question paper and mark scheme of a whole paper, each item at its draw. */
export function buildPaper({ front, items }: PaperToBuild): BuiltPaper {
  const compiled = items.map((item) => ({
    code: item.code,
    asked: item.draw,
    ...itemAtDraw(item.content, item.draw, item.figures),
  }));
  const placed = compiled.map(({ code, item }) => ({ code, ...item }));
  return {
    sheet: buildPaperSheet(front, placed),
    scheme: buildPaperScheme(front, placed),
    draws: compiled.map(({ compilation, item, asked, draw }) => ({
      gridSize: compilation.grid.size,
      open: compilation.grid.open,
      exists: asked === draw,
      kept: item.values?.kept ?? false,
      compiles: item.script !== null,
    })),
    facts: compiled.map(({ item }) => itemFacts(item)),
  };
}

/** A draw chosen by chance that every `require` keeps. */
export function chooseDraw({ content, chance }: DrawToChoose): ChosenDraw {
  const { script, grid } = compileScript(content.script);
  const draw =
    script === null
      ? null
      : firstKeptDraw(
          script,
          randomDraw(script, () => chance),
        );
  return { draw, gridSize: grid.size, open: grid.open };
}
