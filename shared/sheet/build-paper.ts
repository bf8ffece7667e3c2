import { CONSTANTS, formatQuantity, readUnit } from '../engine/index.ts';
import { buildItemScheme, buildItemSheet, type ItemAtDraw } from './build-item.ts';
import type { DataSheetRow, PaperScheme, PaperSheet } from './model.ts';

/** What stands on a paper besides its items. */
export interface PaperFront {
  organisation: string;
  code: string;
  title: string;
  subtitle: string;
  durationMinutes: number;
  /** One instruction a line. */
  instructions: string;
  sealHash: string | null;
}

/** An item on a paper, in running order. */
export interface PaperItem extends ItemAtDraw {
  code: string;
}

/** Constants printed for every paper beside those that its scripts use. */
const ALWAYS_PRINTED = ['e', 'm_e', 'm_p', 'c', 'h', 'g'];

/** The constants that the candidates get, each at its printed precision, in the order of the constants table. */
export function buildDataSheet(items: readonly PaperItem[]): DataSheetRow[] {
  const used = new Set(ALWAYS_PRINTED);
  for (const item of items) {
    for (const quantity of item.script?.quantities ?? []) {
      for (const name of quantity.constants) used.add(name);
    }
  }
  return [...CONSTANTS.values()]
    .filter((constant) => used.has(constant.name) && constant.name !== 'pi')
    .flatMap((constant): DataSheetRow[] => {
      const reading = readUnit(constant.unit);
      if (!reading.ok) return [];
      const printed = formatQuantity(constant.value, reading.unit, { figures: constant.dataSheet.figures });
      return [
        {
          name: constant.description,
          symbolLatex: constant.symbol,
          valueText: printed.text,
          valueLatex: printed.latex,
        },
      ];
    });
}

const totalMarks = (items: readonly PaperItem[]) =>
  items.reduce((sum, item) => sum + item.content.parts.reduce((marks, part) => marks + part.marks, 0), 0);

/** The question paper: everything that a candidate sees, and nothing of the answers. */
export function buildPaperSheet(front: PaperFront, items: readonly PaperItem[]): PaperSheet {
  return {
    organisation: front.organisation,
    code: front.code,
    title: front.title,
    subtitle: front.subtitle,
    durationMinutes: front.durationMinutes,
    marks: totalMarks(items),
    instructions: front.instructions
      .split('\n')
      .map((line) => line.trim())
      .filter((line) => line !== ''),
    dataSheet: buildDataSheet(items),
    items: items.map((item, index) => ({ number: index + 1, code: item.code, sheet: buildItemSheet(item) })),
    sealHash: front.sealHash,
  };
}

/** The mark scheme of the same paper at the same draws. */
export function buildPaperScheme(front: PaperFront, items: readonly PaperItem[]): PaperScheme {
  return {
    organisation: front.organisation,
    code: front.code,
    title: front.title,
    subtitle: front.subtitle,
    marks: totalMarks(items),
    items: items.map((item, index) => ({
      number: index + 1,
      code: item.code,
      scheme: buildItemScheme(item),
    })),
    sealHash: front.sealHash,
  };
}
