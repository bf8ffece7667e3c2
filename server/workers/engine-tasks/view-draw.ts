import type { DrawView, QuantityRow } from '#shared/contracts/checking.ts';
import { describeDimension, printingOf, printSeries, type QuantityInfo } from '#shared/engine/index.ts';
import { buildItemScheme, buildItemSheet, type ItemAtDraw } from '#shared/sheet/build-item.ts';

import type { DrawToView } from '../task-types.ts';
import { itemAtDraw } from './item-at-draw.ts';
import { textDiagnostics } from './text-diagnostics.ts';

function conditionText(item: ItemAtDraw, name: string): string {
  const value = item.values?.values[name];
  if (typeof value !== 'number' || Number.isNaN(value)) return '';
  return value === 0 ? 'false' : 'true';
}

/** One row of the quantities table: in the item's own unit where the script compiles, else what is known. */
function quantityRow(item: ItemAtDraw, info: QuantityInfo): QuantityRow {
  const base = {
    name: info.name,
    kind: info.kind,
    dimension: describeDimension(info.dimension).replace(/^an? /, ''),
    line: info.span.line,
  };
  if (info.shape.kind === 'condition') {
    const value = conditionText(item, info.name);
    return { ...base, dimension: 'condition', unit: '', value, valueLatex: value && `\\text{${value}}` };
  }
  const empty = { ...base, unit: info.scriptUnit, value: '', valueLatex: '' };
  if (item.script === null || item.values === null) return empty;
  const printing = printingOf({ script: item.script, quantities: item.content.quantities }, info.name);
  if ('problem' in printing) return empty;
  // A scalar prints as a series of one.
  const printed = printSeries(printing, item.values);
  const defined = printed.every((value) => Number.isFinite(value.value));
  return {
    ...base,
    unit: printing.unit.text,
    value: defined ? printed.map((value) => value.text).join(', ') : '',
    valueLatex: defined ? printed.map((value) => value.latex).join(',\\ ') : '',
  };
}

/** Sheet, mark scheme, values and mistakes of an item at one draw. */
export function viewDraw({ content, draw: asked, figures }: DrawToView): DrawView {
  const { item, compilation, draw } = itemAtDraw(content, asked, figures);
  return {
    draw,
    kept: item.values?.kept ?? false,
    gridSize: compilation.grid.size,
    open: compilation.grid.open,
    diagnostics: [
      ...compilation.diagnostics.map((diagnostic) => ({ ...diagnostic, field: '' })),
      ...textDiagnostics(content, item.script),
    ],
    quantities: compilation.quantities.map((info) => quantityRow(item, info)),
    sheet: buildItemSheet(item),
    scheme: buildItemScheme(item),
  };
}
