import {
  Document,
  HeadingLevel,
  Packer,
  Paragraph,
  type ParagraphChild,
  TabStopType,
  Table,
  TableCell,
  TableRow,
  TextRun,
  WidthType,
} from 'docx';

import type { ItemScheme, PaperScheme, SchemePart } from '#shared/sheet/model.ts';

import { RULED_TABLE } from './block-paragraphs.ts';
import { closingLine, pageSetUp } from './front-matter.ts';
import { inlineRuns, tabbed, textRuns } from './inline-runs.ts';
import { normalisePackage } from './normalise-package.ts';
import { documentStyles, TEXT_WIDTH } from './styles.ts';

const RIGHT = [{ type: TabStopType.RIGHT, position: TEXT_WIDTH }];
const WIDTHS = [0.1, 0.78, 0.12].map((share) => Math.round(TEXT_WIDTH * share));

const cell = (at: number, children: Paragraph[]) =>
  new TableCell({
    width: { size: WIDTHS[at] ?? 0, type: WidthType.DXA },
    margins: { top: 40, bottom: 40, left: 80, right: 80 },
    children,
  });

function labelled(label: string, children: readonly ParagraphChild[]): Paragraph {
  return new Paragraph({
    style: 'TableText',
    keepNext: true,
    children: [new TextRun({ text: `${label}: `, bold: true }), ...children],
  });
}

function guidance(part: SchemePart): Paragraph[] {
  return part.guidance.map((slip) => {
    const earns = `${slip.marks} ${slip.marks === 1 ? 'mark' : 'marks'}`;
    const value = slip.value === '' ? '' : ` (${slip.value})`;
    return new Paragraph({
      style: 'TableText',
      children: [
        new TextRun({ text: 'Guidance: ', bold: true }),
        ...textRuns(`${slip.name}${value}: ${earns}.${slip.children.length === 0 ? '' : ' '}`),
        ...inlineRuns(slip.children),
      ],
    });
  });
}

function part(scheme: SchemePart): TableRow {
  const answer = [
    ...(scheme.answer === null ? [] : [labelled('Answer', textRuns(scheme.answer.text))]),
    ...(scheme.accepted === null ? [] : [labelled('Accept', textRuns(scheme.accepted))]),
    ...(scheme.figures?.endsWith('required') === true ? [labelled('Figures', textRuns(scheme.figures))] : []),
  ];
  return new TableRow({
    cantSplit: true,
    children: [
      cell(0, [new Paragraph({ style: 'TableText', text: `(${scheme.letter})` })]),
      cell(1, [
        ...scheme.lines.map(
          (each) =>
            new Paragraph({
              style: 'TableText',
              tabStops: [{ type: TabStopType.RIGHT, position: (WIDTHS[1] ?? 0) - 160 }],
              children: [...inlineRuns(each.children), tabbed(`\t${each.marks}`)],
            }),
        ),
        ...answer,
        ...guidance(scheme),
      ]),
      cell(2, [
        new Paragraph({
          style: 'TableText',
          children: [new TextRun({ text: `[${scheme.marks}]`, bold: true })],
        }),
      ]),
    ],
  });
}

function item(number: number, code: string, scheme: ItemScheme): (Paragraph | Table)[] {
  const heading = (at: number, text: string) =>
    cell(at, [new Paragraph({ style: 'TableText', children: [new TextRun({ text, bold: true })] })]);
  return [
    new Paragraph({
      heading: HeadingLevel.HEADING_1,
      tabStops: RIGHT,
      children: [
        new TextRun(`Question ${number}`),
        new TextRun({ text: `  ${scheme.title}`, bold: false, size: 22 }),
        tabbed(`\t${code}, ${scheme.marks} marks`, { bold: false, size: 20 }),
      ],
    }),
    new Table({
      width: { size: TEXT_WIDTH, type: WidthType.DXA },
      columnWidths: WIDTHS,
      borders: RULED_TABLE,
      rows: [
        new TableRow({
          tableHeader: true,
          cantSplit: true,
          children: [heading(0, 'Part'), heading(1, 'What earns the marks'), heading(2, 'Marks')],
        }),
        ...scheme.parts.map(part),
      ],
    }),
  ];
}

/** The mark scheme as the bytes of a Word document: the same scheme always gives the same bytes. */
export async function exportMarkScheme(paper: PaperScheme): Promise<Uint8Array> {
  const document = new Document({
    title: `${paper.title}: mark scheme`,
    subject: paper.subtitle,
    creator: paper.organisation,
    description: `Mark scheme of ${paper.code}`,
    styles: documentStyles,
    sections: [
      {
        ...pageSetUp({ code: paper.code, title: paper.title, sealHash: paper.sealHash, kind: 'mark scheme' }),
        children: [
          new Paragraph({ style: 'Organisation', text: paper.organisation }),
          new Paragraph({ heading: HeadingLevel.TITLE, text: paper.title }),
          new Paragraph({ style: 'Subtitle', text: 'Mark scheme' }),
          new Paragraph({
            text: `Total: ${paper.marks} marks. An answer within the limits given, ends included, earns the mark for the answer. A candidate’s own earlier answer is carried forward where the working is right.`,
          }),
          ...paper.items.flatMap(({ number, code, scheme }) => item(number, code, scheme)),
          closingLine('End of the mark scheme'),
        ],
      },
    ],
  });
  return normalisePackage(new Uint8Array(await Packer.toBuffer(document)));
}
