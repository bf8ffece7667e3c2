import type { ItemContent, ItemFigure, Part, Quantity } from '#shared/engine/index.ts';

/** The list with the entry at `from` taken to `to`; the same list when either is out of range. */
export function moved<Entry>(list: readonly Entry[], from: number, to: number): Entry[] {
  const entry = list[from];
  if (entry === undefined || to < 0 || to >= list.length || from === to) return [...list];
  const rest = list.filter((_, index) => index !== from);
  return [...rest.slice(0, to), entry, ...rest.slice(to)];
}

/** The content with the part of that id changed by `change`. */
export function withPart(content: ItemContent, partId: string, change: (part: Part) => Part): ItemContent {
  return { ...content, parts: content.parts.map((part) => (part.id === partId ? change(part) : part)) };
}

/** Without the part; figures that stood under it move to the stem, so that none is lost. */
export function withoutPart(content: ItemContent, partId: string): ItemContent {
  return {
    ...content,
    parts: content.parts.filter((part) => part.id !== partId),
    figures: content.figures.map((figure) =>
      figure.place === partId ? { ...figure, place: 'stem' } : figure,
    ),
  };
}

const BLANK_QUANTITY = { symbol: '', unit: '', figures: null, role: null, set: '' } as const;

/** How a name of the script is printed: what the item says, or the blank that means “as the script has it”. */
export function quantityOf(content: ItemContent, name: string): Quantity {
  return content.quantities.find((quantity) => quantity.name === name) ?? { name, ...BLANK_QUANTITY };
}

/** The content with something changed about how one name is printed; a new entry where there was none. */
export function withQuantity(content: ItemContent, name: string, change: Partial<Quantity>): ItemContent {
  const changed = { ...quantityOf(content, name), ...change, name };
  const known = content.quantities.some((quantity) => quantity.name === name);
  return {
    ...content,
    quantities: known
      ? content.quantities.map((quantity) => (quantity.name === name ? changed : quantity))
      : [...content.quantities, changed],
  };
}

/** The content with the figure at `index` changed; null takes it off the item (the stored file stays). */
export function withFigure(
  content: ItemContent,
  index: number,
  change: Partial<ItemFigure> | null,
): ItemContent {
  return {
    ...content,
    figures:
      change === null
        ? content.figures.filter((_, at) => at !== index)
        : content.figures.map((figure, at) => (at === index ? { ...figure, ...change } : figure)),
  };
}

/** Marks of the item: the sum over its parts. */
export function totalMarks(content: ItemContent): number {
  return content.parts.reduce((sum, part) => sum + part.marks, 0);
}

/** What the mark scheme's lines add up to, and how that compares with the part's marks, as a sentence. */
export function schemeBalance(part: Part): { lines: number; balanced: boolean; sentence: string } {
  const lines = part.scheme.reduce((sum, line) => sum + line.marks, 0);
  const balanced = lines === part.marks;
  const difference = Math.abs(lines - part.marks);
  const marks = difference === 1 ? '1 mark' : `${difference} marks`;
  return {
    lines,
    balanced,
    sentence: balanced
      ? `The lines add up to ${part.marks === 1 ? '1 mark' : `${part.marks} marks`}.`
      : `The lines add up to ${lines}: ${marks} ${lines < part.marks ? 'short of' : 'more than'} the part’s ${part.marks}.`,
  };
}
