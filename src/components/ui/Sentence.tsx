/** A sentence in which names of the script stand between backticks; they are set in the script's face. */
export function Sentence({ text }: { text: string }) {
  return text.split('`').map((piece, index) => (index % 2 === 1 ? <code key={index}>{piece}</code> : piece));
}
