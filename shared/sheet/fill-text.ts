import {
  findHoles,
  holeProblem,
  printingOf,
  printSeries,
  printValue,
  type DrawValues,
  type Hole,
  type HoleContext,
} from '../engine/index.ts';
import type { Block, Inline } from './model.ts';
import { holeCharacter, readMarkdown } from './read-markdown.ts';

/** The draw whose values a text takes; null while the script does not compile. */
export interface FillContext {
  holes: HoleContext | null;
  values: DrawValues | null;
}

/** What stands where a value cannot be printed: visible, so that nothing is silently missing. */
const UNPRINTABLE = '[?]';

function valueInline(hole: Hole, written: string, context: FillContext): Inline {
  const { holes, values } = context;
  const name = hole.names[0] ?? '';
  if (holes === null || values === null || holeProblem(holes, hole) !== null) {
    return { kind: 'value', name, text: `[${written}]`, latex: '\\text{[?]}' };
  }
  const printing = printingOf(holes, name, hole);
  if ('problem' in printing) return { kind: 'value', name, text: UNPRINTABLE, latex: '\\text{[?]}' };
  const printed = printValue(printing, values);
  return { kind: 'value', name, text: printed.text, latex: printed.latex };
}

/** A table of series: a column each, symbol and unit in the header. */
function seriesTable(hole: Hole, context: FillContext): Block | null {
  const { holes, values } = context;
  if (holes === null || values === null || holeProblem(holes, hole) !== null) return null;
  const columns = hole.names.flatMap((name) => {
    const printing = printingOf(holes, name);
    if ('problem' in printing) return [];
    const symbol = holes.quantities.find((quantity) => quantity.name === name)?.symbol || name;
    const cells = printSeries(printing, values);
    return [{ symbol, unitLatex: cells[0]?.unitLatex ?? '', cells }];
  });
  const length = Math.max(0, ...columns.map((column) => column.cells.length));
  return {
    kind: 'table',
    header: columns.map(({ symbol, unitLatex }): Inline[] => [
      { kind: 'maths', latex: unitLatex === '' ? symbol : `${symbol} / ${unitLatex}` },
    ]),
    rows: Array.from({ length }, (_, row) =>
      columns.map(({ cells }): Inline[] => {
        const cell = cells[row];
        if (cell === undefined) return [];
        const latex = cell.exponent === null ? cell.digits : `${cell.digits} \\times 10^{${cell.exponent}}`;
        return [{ kind: 'maths', latex: cell.negative ? `-${latex}` : latex }];
      }),
    ),
  };
}

/** Splits a paragraph at the tables within it, so that a table is a block of its own. */
function liftTables(blocks: Block[], tables: ReadonlyMap<string, Block>): Block[] {
  return blocks.flatMap((block): Block[] => {
    if (block.kind === 'list') {
      return [{ ...block, items: block.items.map((item) => liftTables(item, tables)) }];
    }
    if (block.kind !== 'paragraph') return [block];
    const lifted: Block[] = [];
    let line: Inline[] = [];
    const endLine = () => {
      if (line.some((piece) => piece.kind !== 'text' || piece.text.trim() !== '')) {
        lifted.push({ kind: 'paragraph', children: line });
      }
      line = [];
    };
    for (const piece of block.children) {
      const table = piece.kind === 'value' ? tables.get(piece.name) : undefined;
      if (table === undefined) line.push(piece);
      else {
        endLine();
        lifted.push(table);
      }
    }
    endLine();
    return lifted;
  });
}

/** A text of an item at one draw, as blocks. Holes that cannot print stay visible in brackets. */
export function fillText(text: string, context: FillContext): Block[] {
  const { holes } = findHoles(text);
  const tables = new Map<string, Block>();
  let marked = '';
  let from = 0;
  holes.forEach((hole, index) => {
    marked += text.slice(from, hole.start) + holeCharacter(index);
    from = hole.end;
  });
  marked += text.slice(from);
  const blocks = readMarkdown(marked, {
    inline: (index) => {
      const hole = holes[index];
      if (hole === undefined) return { kind: 'text', text: UNPRINTABLE };
      const written = text.slice(hole.start + 2, hole.end - 2).trim();
      if (hole.kind === 'value') return valueInline(hole, written, context);
      const table = seriesTable(hole, context);
      const key = `table ${index}`;
      if (table !== null) tables.set(key, table);
      return { kind: 'value', name: key, text: `[${written}]`, latex: '\\text{[?]}' };
    },
    latex: (index) => {
      const hole = holes[index];
      if (hole === undefined) return '\\text{[?]}';
      const inline = valueInline(hole, '', context);
      return inline.kind === 'value' ? inline.latex : '';
    },
  });
  return liftTables(blocks, tables);
}

/** A line of text at one draw, as inlines; paragraphs are joined by a space. */
export function fillLine(text: string, context: FillContext): Inline[] {
  return fillText(text, context).flatMap((block, index): Inline[] => {
    const gap: Inline[] = index === 0 ? [] : [{ kind: 'text', text: ' ' }];
    if (block.kind === 'paragraph') return [...gap, ...block.children];
    if (block.kind === 'maths') return [...gap, { kind: 'maths', latex: block.latex }];
    return [];
  });
}

/** SVG with its holes filled as plain text; what cannot print stays visible in brackets. */
export function fillSvg(svg: string, context: FillContext): string {
  const { holes } = findHoles(svg);
  let filled = '';
  let from = 0;
  for (const hole of holes) {
    const written = svg.slice(hole.start + 2, hole.end - 2).trim();
    const inline = valueInline(hole, written, context);
    const text = inline.kind === 'value' ? inline.text : UNPRINTABLE;
    filled += svg.slice(from, hole.start) + text.replace(/&/g, '&amp;').replace(/</g, '&lt;');
    from = hole.end;
  }
  return filled + svg.slice(from);
}
