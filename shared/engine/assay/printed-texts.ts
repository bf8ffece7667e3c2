import { partLetter } from '../item/content.ts';
import type { AssayContext } from './context.ts';

/** One text of the item that prints. */
interface PrintedText {
  field: string;
  text: string;
  /** What it is called in a sentence. */
  words: string;
  partId?: string;
  /** Whether the candidate sees it; the mark scheme is for markers. */
  forCandidates: boolean;
  /** Whether it is Markdown with formulas, and not a drawing. */
  markdown: boolean;
}

/** Every text of the item that prints, by field name. */
export function printedTexts({ content, figures }: AssayContext): PrintedText[] {
  return [
    { field: 'stem', text: content.stem, words: 'the stem', forCandidates: true, markdown: true },
    ...content.parts.flatMap((part, index): PrintedText[] => [
      {
        field: `parts.${index}.text`,
        text: part.text,
        words: `part (${partLetter(index)})`,
        partId: part.id,
        forCandidates: true,
        markdown: true,
      },
      ...part.scheme.map((line, at) => ({
        field: `parts.${index}.scheme.${at}.text`,
        text: line.text,
        words: `the mark scheme of part (${partLetter(index)})`,
        partId: part.id,
        forCandidates: false,
        markdown: true,
      })),
    ]),
    ...figures.flatMap((figure): PrintedText[] =>
      figure.svg === null
        ? []
        : [
            {
              field: `figure.${figure.figureId}`,
              text: figure.svg,
              words: 'a figure',
              forCandidates: true,
              markdown: false,
            },
          ],
    ),
  ];
}
