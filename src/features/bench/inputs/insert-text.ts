/** Text with `piece` put in place of the selection, and where the cursor stands then. */
export function inserted(
  text: string,
  from: number,
  to: number,
  piece: string,
): { text: string; cursor: number } {
  const start = Math.min(from, text.length);
  return {
    text: text.slice(0, start) + piece + text.slice(Math.max(start, to)),
    cursor: start + piece.length,
  };
}

/** The selection wrapped as maths, or empty dollars with the cursor between them. */
export function asMaths(text: string, from: number, to: number): { text: string; cursor: number } {
  const selected = text.slice(from, to);
  const result = inserted(text, from, to, `$${selected}$`);
  return selected === '' ? { ...result, cursor: result.cursor - 1 } : result;
}
