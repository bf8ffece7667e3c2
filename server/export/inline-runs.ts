import { type IRunOptions, Math as WordMath, type ParagraphChild, Tab, TextRun } from 'docx';
import { latexToMath } from 'docx/math';

import type { Inline } from '#shared/sheet/model.ts';

interface RunStyle {
  bold?: boolean;
  italics?: boolean;
}

const SUPERSCRIPTS = new Map(Array.from('⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻', (sign, at) => [sign, '0123456789+−'[at] ?? '']));
const RAISED = /[⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻]+/g;

/** Text in which superscript characters become raised digits, which every font sets alike. */
export function textRuns(text: string, style: RunStyle = {}): TextRun[] {
  const runs: TextRun[] = [];
  let from = 0;
  for (const match of text.matchAll(RAISED)) {
    if (match.index > from) runs.push(new TextRun({ ...style, text: text.slice(from, match.index) }));
    const raised = Array.from(match[0], (sign) => SUPERSCRIPTS.get(sign) ?? sign).join('');
    runs.push(new TextRun({ ...style, text: raised, superScript: true }));
    from = match.index + match[0].length;
  }
  if (from < text.length) runs.push(new TextRun({ ...style, text: text.slice(from) }));
  return runs;
}

/** A run of plain text in which tab characters become Word's own tabs. */
export function tabbed(text: string, style: Omit<IRunOptions, 'children' | 'text'> = {}): TextRun {
  const children = text
    .split('\t')
    .flatMap((piece, index) => [...(index === 0 ? [] : [new Tab()]), ...(piece === '' ? [] : [piece])]);
  return new TextRun({ ...style, children });
}

/** A formula as a native Word equation. LaTeX that Word cannot set stands as it was written. */
export function equation(latex: string): ParagraphChild {
  try {
    return new WordMath({ children: latexToMath(latex) });
  } catch {
    return new TextRun({ text: latex, italics: true });
  }
}

/** A line of the sheet as Word runs and equations. */
export function inlineRuns(inlines: readonly Inline[], style: RunStyle = {}): ParagraphChild[] {
  return inlines.flatMap((inline): ParagraphChild[] => {
    switch (inline.kind) {
      case 'text':
        return textRuns(inline.text, style);
      case 'value':
        return textRuns(inline.text, style);
      case 'maths':
        return [equation(inline.latex)];
      case 'strong':
        return inlineRuns(inline.children, { ...style, bold: true });
      case 'emphasis':
        return inlineRuns(inline.children, { ...style, italics: true });
      case 'break':
        return [new TextRun({ break: 1 })];
    }
  });
}
