import {
  AlignmentType,
  Footer,
  Header,
  HeadingLevel,
  NumberFormat,
  PageNumber,
  Paragraph,
  Tab,
  TabStopType,
  Table,
  TableCell,
  TableRow,
  TextRun,
  WidthType,
} from 'docx';

import type { DataSheetRow, PaperSheet } from '#shared/sheet/model.ts';

import { RULED_TABLE } from './block-paragraphs.ts';
import { equation, tabbed, textRuns } from './inline-runs.ts';
import { PAGE, TEXT_WIDTH } from './styles.ts';

interface Running {
  code: string;
  title: string;
  sealHash: string | null;
  /** As "mark scheme"; empty for the question paper. */
  kind: string;
}

/** Page set-up with running header and footer. A paper without a seal carries the word DRAFT on every page. */
export function pageSetUp({ code, title, sealHash, kind }: Running) {
  const draft = sealHash === null;
  return {
    properties: {
      page: {
        size: { width: PAGE.width, height: PAGE.height },
        margin: { top: PAGE.margin, bottom: PAGE.margin, left: PAGE.margin, right: PAGE.margin },
        pageNumbers: { start: 1, formatType: NumberFormat.DECIMAL },
      },
    },
    headers: {
      default: new Header({
        children: [
          new Paragraph({
            style: 'RunningLine',
            tabStops: [{ type: TabStopType.RIGHT, position: TEXT_WIDTH }],
            children: [
              new TextRun(kind === '' ? title : `${title}, ${kind}`),
              ...(draft ? [tabbed('\tDRAFT: not sealed', { bold: true })] : []),
            ],
          }),
        ],
      }),
    },
    footers: {
      default: new Footer({
        children: [
          new Paragraph({
            style: 'RunningLine',
            tabStops: [{ type: TabStopType.RIGHT, position: TEXT_WIDTH }],
            children: [
              new TextRun(draft ? `${code}, draft` : `${code}, seal ${sealHash}`),
              new TextRun({
                children: [new Tab(), 'page ', PageNumber.CURRENT, ' of ', PageNumber.TOTAL_PAGES],
              }),
            ],
          }),
        ],
      }),
    },
  };
}

const CANDIDATE_FIELDS = ['Candidate reference', 'Group', 'Date'] as const;

function candidateFields(): Table {
  return new Table({
    width: { size: 100, type: WidthType.PERCENTAGE },
    columnWidths: [Math.round(TEXT_WIDTH * 0.3), Math.round(TEXT_WIDTH * 0.7)],
    borders: RULED_TABLE,
    rows: CANDIDATE_FIELDS.map(
      (field) =>
        new TableRow({
          cantSplit: true,
          height: { value: 560, rule: 'atLeast' },
          children: [
            new TableCell({
              width: { size: 30, type: WidthType.PERCENTAGE },
              children: [new Paragraph({ style: 'TableText', text: field })],
            }),
            new TableCell({
              width: { size: 70, type: WidthType.PERCENTAGE },
              children: [new Paragraph({ style: 'TableText' })],
            }),
          ],
        }),
    ),
  });
}

function duration(minutes: number): string {
  const hours = Math.floor(minutes / 60);
  const rest = minutes % 60;
  const pieces = [
    ...(hours > 0 ? [`${hours} ${hours === 1 ? 'hour' : 'hours'}`] : []),
    ...(rest > 0 ? [`${rest} minutes`] : []),
  ];
  return pieces.join(' ');
}

/** The first page: who sets the paper, its name, time and marks, the candidate's fields, and the instructions. */
export function cover(paper: PaperSheet): (Paragraph | Table)[] {
  return [
    new Paragraph({ style: 'Organisation', spacing: { before: 600, after: 900 }, text: paper.organisation }),
    new Paragraph({ heading: HeadingLevel.TITLE, text: paper.title }),
    ...(paper.subtitle === '' ? [] : [new Paragraph({ style: 'Subtitle', text: paper.subtitle })]),
    new Paragraph({
      spacing: { before: 400, after: 500 },
      tabStops: [{ type: TabStopType.RIGHT, position: TEXT_WIDTH }],
      children: [
        new TextRun(`Time: ${duration(paper.durationMinutes)}`),
        tabbed(`\tTotal: ${paper.marks} ${paper.marks === 1 ? 'mark' : 'marks'}`),
      ],
    }),
    candidateFields(),
    ...(paper.instructions.length === 0
      ? []
      : [new Paragraph({ heading: HeadingLevel.HEADING_2, text: 'Before you begin' })]),
    ...paper.instructions.map(
      (instruction) =>
        new Paragraph({
          indent: { left: 360, hanging: 360 },
          tabStops: [{ type: TabStopType.LEFT, position: 360 }],
          children: [tabbed('–\t'), ...textRuns(instruction)],
        }),
    ),
  ];
}

/** The constants that the candidates get, as a table with a header row. */
export function dataSheet(rows: readonly DataSheetRow[]): (Paragraph | Table)[] {
  if (rows.length === 0) return [];
  const widths = [0.52, 0.14, 0.34].map((share) => Math.round(TEXT_WIDTH * share));
  const cell = (at: number, paragraph: Paragraph) =>
    new TableCell({ width: { size: widths[at] ?? 0, type: WidthType.DXA }, children: [paragraph] });
  const heading = (at: number, text: string) =>
    cell(at, new Paragraph({ style: 'TableText', children: [new TextRun({ text, bold: true })] }));
  return [
    new Paragraph({ heading: HeadingLevel.HEADING_1, pageBreakBefore: true, text: 'Data' }),
    new Table({
      width: { size: TEXT_WIDTH, type: WidthType.DXA },
      columnWidths: widths,
      borders: RULED_TABLE,
      rows: [
        new TableRow({
          tableHeader: true,
          cantSplit: true,
          children: [heading(0, 'Quantity'), heading(1, 'Symbol'), heading(2, 'Value')],
        }),
        ...rows.map(
          (row) =>
            new TableRow({
              cantSplit: true,
              children: [
                cell(0, new Paragraph({ style: 'TableText', text: row.name })),
                cell(1, new Paragraph({ style: 'TableText', children: [equation(row.symbolLatex)] })),
                cell(2, new Paragraph({ style: 'TableText', children: textRuns(row.valueText) })),
              ],
            }),
        ),
      ],
    }),
  ];
}

/** A line that ends a document, centred. */
export function closingLine(text: string): Paragraph {
  return new Paragraph({
    alignment: AlignmentType.CENTER,
    spacing: { before: 480 },
    style: 'RunningLine',
    text,
  });
}
