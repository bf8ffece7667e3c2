/** A formula that cannot be set, and where it stands in the text. */
interface MathsMistake {
  message: string;
  start: number;
  end: number;
}

/** Counts of two commands that must come in pairs. */
function unpaired(maths: string, open: RegExp, close: RegExp): boolean {
  return (maths.match(open)?.length ?? 0) !== (maths.match(close)?.length ?? 0);
}

/** What is wrong with one formula, or null. */
function mistakeIn(maths: string): string | null {
  let depth = 0;
  for (let index = 0; index < maths.length; index += 1) {
    if (maths[index] === '\\') index += 1;
    else if (maths[index] === '{') depth += 1;
    else if (maths[index] === '}') depth -= 1;
    if (depth < 0) return 'A brace closes that was never opened.';
  }
  if (depth > 0) return 'A brace is never closed.';
  if (unpaired(maths, /\\left(?![a-zA-Z])/g, /\\right(?![a-zA-Z])/g)) {
    return 'Every \\left needs its \\right.';
  }
  if (unpaired(maths, /\\begin\{/g, /\\end\{/g)) return 'Every \\begin needs its \\end.';
  if (/\\(?:frac|dfrac|tfrac|sqrt)\s*$/.test(maths.trim())) return 'A fraction or root has nothing in it.';
  if (/[_^]\s*$/.test(maths.trim())) return 'A subscript or superscript has nothing in it.';
  if (maths.trim() === '') return 'The formula is empty.';
  return null;
}

/** The text with its code spans and escaped dollars blanked, offsets kept. */
function withoutCode(text: string): string {
  return text.replace(/`[^`\n]*`|\\\$/g, (piece) => ' '.repeat(piece.length));
}

/** Formulas between dollars that are not well formed; holes inside them count as braces that close. */
export function mathsMistakes(markdown: string): MathsMistake[] {
  const text = withoutCode(markdown);
  const mistakes: MathsMistake[] = [];
  const display = /\$\$([\s\S]*?)\$\$/g;
  const inline = /\$([^$\n]+(?:\n[^$\n]+)*)\$/g;
  const rest = text.replace(display, (whole, maths: string, start: number) => {
    const message = mistakeIn(maths);
    if (message !== null) mistakes.push({ message, start, end: start + whole.length });
    return ' '.repeat(whole.length);
  });
  const open = rest.replace(inline, (whole, maths: string, start: number) => {
    const message = mistakeIn(maths);
    if (message !== null) mistakes.push({ message, start, end: start + whole.length });
    return ' '.repeat(whole.length);
  });
  const alone = open.indexOf('$');
  if (alone >= 0) {
    mistakes.push({ message: 'A formula begins with $ and never ends.', start: alone, end: alone + 1 });
  }
  return mistakes;
}
