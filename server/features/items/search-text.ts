import { findHoles, type ItemContent } from '#shared/engine/index.ts';

/** A text without its holes: their names come from the script, which a search must not tell. */
function withoutHoles(text: string): string {
  return findHoles(text).holes.reduceRight(
    (left, hole) => `${left.slice(0, hole.start)} ${left.slice(hole.end)}`,
    text,
  );
}

/**
 * What a search looks through: code, title and printed text. Script and mark scheme stay out, so that nobody who
 * works an item independently can probe for them.
 */
export function searchText(code: string, content: ItemContent): string {
  return [
    code,
    content.title,
    withoutHoles(content.stem),
    ...content.parts.map((part) => withoutHoles(part.text)),
    ...content.figures.map((figure) => `${figure.caption} ${figure.alternativeText}`),
  ].join('\n');
}
