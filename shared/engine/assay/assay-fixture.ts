import type { z } from 'zod';
import { itemContentSchema, type Band, type ItemContent } from '../item/content.ts';
import { assayItem, type AssayOptions } from './assay-item.ts';
import type { AssayReport, Finding } from './report.ts';

type ItemInput = z.input<typeof itemContentSchema>;

/** What a test says of one numeric part; the rest is filled in soundly. */
interface PartInput {
  quantity: string;
  unit?: string;
  figures?: number;
  band?: Band;
  slips?: { id: string; name: string; expression: string }[];
  text?: string;
  /** Figures that the text states, for a part that shows a value. */
  shows?: number;
  enforceFigures?: boolean;
}

/** An item whose texts and marks are in order, so that a test sees only the fault that it plants. */
export function itemWith(
  script: string,
  parts: readonly PartInput[],
  rest: Partial<ItemInput> & { roles?: Readonly<Record<string, string>> } = {},
): ItemContent {
  const { roles = {}, ...others } = rest;
  return itemContentSchema.parse({
    title: 'An item',
    stem: 'Read the values.',
    script,
    quantities: Object.entries(roles).map(([name, role]) => ({ name, role })),
    parts: parts.map(({ quantity, shows, text, unit, ...answer }, index) => ({
      id: `p${index + 1}`,
      kind: shows === undefined ? 'numeric' : 'showThat',
      text:
        text ??
        (shows === undefined ? 'Calculate it.' : `Show that it is about {{${quantity}, ${shows} sf}}.`),
      marks: 1,
      scheme: [{ text: 'Working', marks: 1 }],
      ...(shows === undefined ? {} : { statedFigures: shows }),
      answer: { quantity, unit: unit ?? '', ...answer },
    })),
    ...others,
  });
}

/** The report of an item whose script must compile; throws with its mistakes where it does not. */
export function reportOf(content: ItemContent, options: AssayOptions = {}): AssayReport {
  const { report, diagnostics } = assayItem(content, options);
  const mistakes = diagnostics.filter(({ severity }) => severity === 'error');
  if (mistakes.length > 0) throw new Error(mistakes.map(({ message }) => message).join('\n'));
  return report;
}

/** The findings of one code. */
export function findingsOf(content: ItemContent, code: string, options: AssayOptions = {}): Finding[] {
  return reportOf(content, options).findings.filter((finding) => finding.code === code);
}

/** A sentence with its thin spaces made plain, so that a test can be read. */
export function plain(sentence: string | undefined): string {
  return (sentence ?? '').replaceAll('\u202F', ' ');
}
