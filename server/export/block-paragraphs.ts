import {
  AlignmentType,
  BorderStyle,
  Paragraph,
  type ParagraphChild,
  Table,
  TableCell,
  TableRow,
  TabStopType,
  WidthType,
} from 'docx';

import type { Block, Inline } from '#shared/sheet/model.ts';

import type { Bitmaps } from './bitmaps.ts';
import { figureParagraphs } from './figure-image.ts';
import { equation, inlineRuns, tabbed } from './inline-runs.ts';
import { TEXT_WIDTH } from './styles.ts';

/** What a document's parts share: pictures, and running numbers that stay the same from export to export. */
export interface ExportState {
  bitmaps: Bitmaps;
  figures: number;
}

interface BlockStyle {
  /** Named paragraph style. */
  style: string;
  /** Keeps each paragraph on the page of the next. */
  keepNext: boolean;
}

const LINE = { style: BorderStyle.SINGLE, size: 4, color: '5A6672' } as const;
const NONE = { style: BorderStyle.NONE, size: 0, color: 'auto' } as const;
export const RULED_TABLE = {
  top: LINE,
  bottom: LINE,
  left: NONE,
  right: NONE,
  insideHorizontal: { ...LINE, size: 2 },
  insideVertical: NONE,
} as const;

function cell(children: readonly Inline[], header: boolean): TableCell {
  return new TableCell({
    margins: { left: 100, right: 100 },
    children: [
      new Paragraph({
        style: 'TableText',
        alignment: AlignmentType.CENTER,
        keepNext: true,
        children: inlineRuns(children, header ? { bold: true } : {}),
      }),
    ],
  });
}

function table(block: Extract<Block, { kind: 'table' }>): Table {
  return new Table({
    alignment: AlignmentType.CENTER,
    width: { size: 70, type: WidthType.PERCENTAGE },
    borders: RULED_TABLE,
    rows: [
      new TableRow({
        tableHeader: true,
        cantSplit: true,
        children: block.header.map((inlines) => cell(inlines, true)),
      }),
      ...block.rows.map(
        (row) => new TableRow({ cantSplit: true, children: row.map((inlines) => cell(inlines, false)) }),
      ),
    ],
  });
}

function listItem(blocks: readonly Block[], mark: string, style: BlockStyle): Paragraph[] {
  return blocks.flatMap((block, index): Paragraph[] =>
    block.kind === 'paragraph'
      ? [
          new Paragraph({
            style: style.style,
            keepNext: style.keepNext,
            indent: { left: 1100, hanging: 380 },
            children: [tabbed(index === 0 ? `${mark}\t` : '\t'), ...inlineRuns(block.children)],
          }),
        ]
      : [],
  );
}

/** The blocks of a text as Word paragraphs and tables; `lead` goes before the first paragraph's own text. */
export function blockParagraphs(
  blocks: readonly Block[],
  style: BlockStyle,
  state: ExportState,
  lead: readonly ParagraphChild[] = [],
  tail: readonly ParagraphChild[] = [],
): (Paragraph | Table)[] {
  const lastText = blocks.map((block) => block.kind).lastIndexOf('paragraph');
  const firstText = blocks.findIndex((block) => block.kind === 'paragraph');
  const paragraphs = blocks.flatMap((block, index): (Paragraph | Table)[] => {
    switch (block.kind) {
      case 'paragraph':
        return [
          new Paragraph({
            style: index === firstText || lead.length === 0 ? style.style : 'PartContinued',
            keepNext: style.keepNext,
            ...(index === lastText && tail.length > 0
              ? { tabStops: [{ type: TabStopType.RIGHT, position: TEXT_WIDTH }] }
              : {}),
            children: [
              ...(index === firstText ? lead : []),
              ...inlineRuns(block.children),
              ...(index === lastText ? tail : []),
            ],
          }),
        ];
      case 'maths':
        return [
          new Paragraph({
            alignment: AlignmentType.CENTER,
            keepNext: style.keepNext,
            children: [equation(block.latex)],
          }),
        ];
      case 'list':
        return block.items.flatMap((item, at) => listItem(item, block.ordered ? `${at + 1}.` : '–', style));
      case 'table':
        return [table(block), new Paragraph({ spacing: { before: 0, after: 60 }, keepNext: style.keepNext })];
      case 'figure':
        state.figures += 1;
        return figureParagraphs(block.figure, state.bitmaps, state.figures);
    }
  });
  if (firstText >= 0 || (lead.length === 0 && tail.length === 0)) return paragraphs;
  return [
    new Paragraph({ style: style.style, keepNext: style.keepNext, children: [...lead, ...tail] }),
    ...paragraphs,
  ];
}
