import {
  BorderStyle,
  Document,
  HeadingLevel,
  LeaderType,
  Packer,
  Paragraph,
  Tab,
  TabStopType,
  type Table,
  TextRun,
} from 'docx';

import type { ItemSheet, PaperSheet, SheetPart } from '#shared/sheet/model.ts';

import type { Bitmaps } from './bitmaps.ts';
import { blockParagraphs, type ExportState } from './block-paragraphs.ts';
import { closingLine, cover, dataSheet, pageSetUp } from './front-matter.ts';
import { tabbed, textRuns } from './inline-runs.ts';
import { normalisePackage } from './normalise-package.ts';
import { documentStyles, TEXT_WIDTH } from './styles.ts';

type Content = (Paragraph | Table)[];

const RIGHT = [{ type: TabStopType.RIGHT, position: TEXT_WIDTH }];

/** Lines for writing, as one paragraph that no page break can tear. */
function writingLines(count: number, keepNext: boolean): Paragraph[] {
  if (count === 0) return [];
  return [
    new Paragraph({
      style: 'WritingLine',
      keepNext,
      keepLines: true,
      tabStops: [{ type: TabStopType.RIGHT, position: TEXT_WIDTH, leader: LeaderType.DOT }],
      children: Array.from(
        { length: count },
        (_, index) => new TextRun({ ...(index === 0 ? {} : { break: 1 }), children: [new Tab()] }),
      ),
    }),
  ];
}

function answerLine(unit: string): Paragraph {
  const unitRuns = unit === '' ? [] : [new TextRun(' '), ...textRuns(unit)];
  const end = unit === '' ? TEXT_WIDTH : TEXT_WIDTH - 1_500;
  return new Paragraph({
    style: 'AnswerLine',
    tabStops: [
      { type: TabStopType.LEFT, position: Math.round(TEXT_WIDTH * 0.42) },
      { type: TabStopType.LEFT, position: end, leader: LeaderType.UNDERSCORE },
    ],
    children: [tabbed('\tAnswer\u00A0\t'), ...unitRuns],
  });
}

function part(sheet: SheetPart, state: ExportState): Content {
  const hasAnswerLine = sheet.answerUnit !== null;
  const keepNext = sheet.lines > 0 || hasAnswerLine;
  const marks = tabbed(`\t[${sheet.marks}]`, { bold: true });
  // Marks stand at the end of the text; where the text ends with a formula or table they have a line of their own.
  const endsInText = sheet.blocks.at(-1)?.kind === 'paragraph';
  return [
    ...blockParagraphs(
      sheet.blocks,
      { style: 'PartText', keepNext: true },
      state,
      [tabbed(`(${sheet.letter})\t`)],
      endsInText ? [marks] : [],
    ),
    ...(endsInText
      ? []
      : [new Paragraph({ tabStops: RIGHT, spacing: { before: 0, after: 40 }, keepNext, children: [marks] })]),
    ...writingLines(sheet.lines, hasAnswerLine),
    ...(sheet.answerUnit === null ? [] : [answerLine(sheet.answerUnit)]),
  ];
}

function cautions(lines: readonly string[]): Paragraph[] {
  return lines.map(
    (line, index) =>
      new Paragraph({
        style: 'Caution',
        keepNext: true,
        border: { left: { style: BorderStyle.SINGLE, size: 18, color: '8A6A1F', space: 8 } },
        children: [
          ...(index === 0 ? [new TextRun({ text: 'Caution. ', bold: true })] : []),
          ...textRuns(line),
        ],
      }),
  );
}

function item(number: number, sheet: ItemSheet, state: ExportState, first: boolean): Content {
  return [
    new Paragraph({
      heading: HeadingLevel.HEADING_1,
      pageBreakBefore: first,
      tabStops: RIGHT,
      children: [
        new TextRun(`Question ${number}`),
        tabbed(`\t${sheet.marks} ${sheet.marks === 1 ? 'mark' : 'marks'}`, { bold: false, size: 20 }),
      ],
    }),
    ...cautions(sheet.cautions),
    ...blockParagraphs(sheet.blocks, { style: 'StemText', keepNext: true }, state),
    ...sheet.parts.flatMap((each) => part(each, state)),
  ];
}

/**
 * The question paper as the bytes of a Word document: the same sheet and pictures always give the same bytes.
 */
export async function exportQuestionPaper(paper: PaperSheet, bitmaps: Bitmaps): Promise<Uint8Array> {
  const state: ExportState = { bitmaps, figures: 0 };
  const document = new Document({
    title: paper.title,
    subject: paper.subtitle,
    creator: paper.organisation,
    description: `Question paper ${paper.code}`,
    styles: documentStyles,
    sections: [
      {
        ...pageSetUp({ code: paper.code, title: paper.title, sealHash: paper.sealHash, kind: '' }),
        children: [
          ...cover(paper),
          ...dataSheet(paper.dataSheet),
          ...paper.items.flatMap(({ number, sheet }, index) => item(number, sheet, state, index === 0)),
          closingLine('End of the questions'),
        ],
      },
    ],
  });
  return normalisePackage(new Uint8Array(await Packer.toBuffer(document)));
}
