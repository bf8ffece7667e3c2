import {
  answerBand,
  compileExpression,
  evaluateExpression,
  formatQuantity,
  isNumericPart,
  partLetter,
  readUnit,
  type CompiledScript,
  type DrawValues,
  type ItemContent,
  type NumericPart,
  type Part,
} from '../engine/index.ts';
import { cautionsFor } from './cautions.ts';
import { fillLine, fillSvg, fillText, type FillContext } from './fill-text.ts';
import type { Block, ItemScheme, ItemSheet, SchemePart, SheetFigure, SheetPart } from './model.ts';

/** A stored picture, as the sheet needs it. */
export interface StoredFigure {
  figureId: number;
  mediaType: SheetFigure['mediaType'];
  /** The SVG text; null for a bitmap. */
  svg: string | null;
  width: number;
  height: number;
}

/** One item at one draw. `script` and `values` are null while the script does not compile. */
export interface ItemAtDraw {
  content: ItemContent;
  script: CompiledScript | null;
  values: DrawValues | null;
  figures: readonly StoredFigure[];
}

function contextOf(item: ItemAtDraw): FillContext {
  return {
    holes: item.script === null ? null : { script: item.script, quantities: item.content.quantities },
    values: item.values,
  };
}

function figureBlocks(item: ItemAtDraw, place: string, context: FillContext): Block[] {
  return item.content.figures
    .filter((figure) => figure.place === place)
    .flatMap((figure): Block[] => {
      const stored = item.figures.find((candidate) => candidate.figureId === figure.figureId);
      if (stored === undefined) return [];
      return [
        {
          kind: 'figure',
          figure: {
            figureId: stored.figureId,
            mediaType: stored.mediaType,
            svg: stored.svg === null ? null : fillSvg(stored.svg, context),
            width: stored.width,
            height: stored.height,
            alternativeText: figure.alternativeText,
            caption: figure.caption,
            widthPercent: figure.widthPercent,
          },
        },
      ];
    });
}

/** Ruled lines left for the working of a numeric part: two a mark, and two for a part that shows a value. */
function workingLines(part: Part): number {
  return part.kind === 'written' ? part.answerLines : Math.max(2, part.marks * 2);
}

/** The item as the candidate sees it. Nothing of answers, bands or script goes into the result. */
export function buildItemSheet(item: ItemAtDraw): ItemSheet {
  const context = contextOf(item);
  return {
    title: item.content.title,
    blocks: [...fillText(item.content.stem, context), ...figureBlocks(item, 'stem', context)],
    parts: item.content.parts.map((part, index): SheetPart => ({
      id: part.id,
      letter: partLetter(index),
      kind: part.kind,
      blocks: [...fillText(part.text, context), ...figureBlocks(item, part.id, context)],
      marks: part.marks,
      answerUnit: part.kind === 'numeric' ? printedUnit(part) : null,
      lines: workingLines(part),
    })),
    marks: item.content.parts.reduce((sum, part) => sum + part.marks, 0),
    cautions: item.content.practical ? cautionsFor(item.content, item.script, item.values) : [],
  };
}

function printedUnit(part: NumericPart): string {
  const reading = readUnit(part.answer.unit);
  return reading.ok ? formatQuantity(0, reading.unit, { figures: 1 }).unitText : part.answer.unit;
}

/** One draw as a block of a single draw. */
function columnsOf(values: DrawValues) {
  const columns = new Map<string, Float64Array>();
  const series = new Map<string, Float64Array[]>();
  for (const [name, value] of Object.entries(values.values)) {
    if (typeof value === 'number') columns.set(name, Float64Array.of(value));
    else
      series.set(
        name,
        value.map((element) => Float64Array.of(element)),
      );
  }
  return { draws: Float64Array.of(values.draw), columns, series };
}

function slipValue(item: ItemAtDraw, part: NumericPart, expression: string): string {
  if (item.script === null || item.values === null) return '';
  const compiled = compileExpression(item.script, expression);
  if (compiled.expression === null) return '';
  const value = evaluateExpression(compiled.expression, columnsOf(item.values))[0] ?? NaN;
  const reading = readUnit(part.answer.unit);
  if (!reading.ok || !Number.isFinite(value)) return '';
  return formatQuantity(value, reading.unit, { figures: part.answer.figures }).text;
}

function schemePart(item: ItemAtDraw, part: Part, index: number, context: FillContext): SchemePart {
  const base = {
    id: part.id,
    letter: partLetter(index),
    kind: part.kind,
    marks: part.marks,
    lines: part.scheme.map((line) => ({ children: fillLine(line.text, context), marks: line.marks })),
  };
  if (!isNumericPart(part)) return { ...base, answer: null, accepted: null, figures: null, guidance: [] };
  const band =
    item.script === null || item.values === null ? null : answerBand(item.script, part, item.values);
  const { figures, enforceFigures } = part.answer;
  const count = `${figures} significant figure${figures === 1 ? '' : 's'}`;
  return {
    ...base,
    answer: band === null ? null : { text: band.answer.text, latex: band.answer.latex },
    accepted: band?.text ?? null,
    figures: enforceFigures ? `${count} required` : count,
    guidance: part.answer.slips.map((slip) => ({
      name: slip.name,
      value: slipValue(item, part, slip.expression),
      children: fillLine(slip.guidance, context),
      marks: slip.marks,
    })),
  };
}

/** The mark scheme of an item at one draw. */
export function buildItemScheme(item: ItemAtDraw): ItemScheme {
  const context = contextOf(item);
  return {
    title: item.content.title,
    marks: item.content.parts.reduce((sum, part) => sum + part.marks, 0),
    parts: item.content.parts.map((part, index) => schemePart(item, part, index, context)),
  };
}
