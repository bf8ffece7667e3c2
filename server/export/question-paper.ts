import {
  BorderStyle,
  Document,
  HeadingLevel,
  LeaderType,
  Packer,
  Paragraph,
  TabStopType,
  type Table,
  TextRun,
} from 'docx';

import type { ItemSheet, PaperSheet, SheetPart } from '#shared/sheet/model.ts';

import type { Bitmaps } from './bitmaps.ts';
import { blockParagraphs, type ExportState } from './block-paragraphs.ts';
import { closingLine, cover, dataSheet, pageSetUp } from './front-matter.ts';
import { textRuns } from './inline-runs.ts';
import { normalisePackage } from './normalise-package.ts';
import { documentStyles, TEXT_WIDTH } from './styles.ts';

type Content = (Paragraph | Table)[];

const RIGHT = [{ type: TabStopType.RIGHT, position: TEXT_WIDTH }];

/** Lines for writing; all but the last stay with the next, so that a part is not torn apart. */
function writingLines(count: number, keepLast: boolean): Paragraph[] {
  return Array.from(
    { length: count },
    (_, index) =>
      new Paragraph({
        style: 'WritingLine',
        keepNext: index < count - 1 || keepLast,
        border: { bottom: { style: BorderStyle.DOTTED, size: 4, color: '9AA3AC', space: 1 } },
      }),
  );
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
    children: [new TextRun('\tAnswer\u00A0\t'), ...unitRuns],
  });
}

function part(sheet: SheetPart, state: ExportState): Content {
  const hasAnswerLine = sheet.answerUnit !== null;
  return [
    ...blockParagraphs(sheet.blocks, { style: 'PartText', keepNext: true }, state, [
      new TextRun({ text: `(${sheet.letter})\t` }),
    ]),
    new Paragraph({
      tabStops: RIGHT,
      spacing: { before: 0, after: 40 },
      keepNext: sheet.lines > 0 || hasAnswerLine,
      children: [new TextRun({ text: `\t[${sheet.marks}]`, bold: true })],
    }),
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
        new TextRun({
          text: `\t${sheet.marks} ${sheet.marks === 1 ? 'mark' : 'marks'}`,
          bold: false,
          size: 20,
        }),
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
