import {
  compileScript,
  type DrawValues,
  evaluateBlock,
  type ItemContent,
  planDraws,
} from '#shared/engine/index.ts';
import { CAUTION_DEFERENCE, cautionsFor } from '#shared/sheet/cautions.ts';

/** Draws that are looked at for the extremes of each value; corners of the grid come first. */
const SAMPLED = 512;

/** The usual cautions for an item's apparatus, by its words and by the extremes of its values over the draws. */
export function cautionsOf(content: ItemContent): string[] {
  const { script } = compileScript(content.script);
  if (script === null) return cautionsFor(content, null, null);
  const plan = planDraws(script, SAMPLED, SAMPLED);
  const { columns, kept } = evaluateBlock(script, plan.draws);
  const least: Record<string, number> = {};
  const greatest: Record<string, number> = {};
  for (const [name, column] of columns) {
    const values = column.filter((value, index) => kept[index] === 1 && Number.isFinite(value));
    if (values.length === 0) continue;
    least[name] = values.reduce((a, b) => Math.min(a, b));
    greatest[name] = values.reduce((a, b) => Math.max(a, b));
  }
  const at = (values: DrawValues['values']): string[] =>
    cautionsFor(content, script, { draw: 1, values, kept: true, discardedBy: null });
  const found = new Set([...at(greatest), ...at(least)]);
  found.delete(CAUTION_DEFERENCE);
  return found.size === 0 ? [] : [...found, CAUTION_DEFERENCE];
}
