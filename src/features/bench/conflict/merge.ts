import type { ItemContent, Part } from '#shared/engine/index.ts';

export type Side = 'mine' | 'theirs';
/** For a part, both can be kept: theirs follows mine. */
export type Choice = Side | 'both';

/** The fields of an item that are compared whole; parts are compared one by one. */
const FIELDS = [
  'title',
  'stem',
  'script',
  'quantities',
  'figures',
  'assumptions',
  'claims',
  'practical',
  'acceptedCautions',
] as const satisfies readonly (keyof ItemContent)[];
type Field = (typeof FIELDS)[number];

const FIELD_NAMES: Readonly<Record<Field, string>> = {
  title: 'Title',
  stem: 'Stem',
  script: 'Script',
  quantities: 'Quantities',
  figures: 'Figures',
  assumptions: 'Assumptions',
  claims: 'Claims',
  practical: 'Practical work',
  acceptedCautions: 'Accepted cautions',
};

/** One place where the two versions differ. */
export type Difference = {
  key: string;
  label: string;
  /** Which side a reader would expect. */ suggestion: Side;
} & (
  | { kind: 'field'; field: Field }
  | { kind: 'part'; partId: string; mine: Part | null; theirs: Part | null }
  | { kind: 'order' }
);

const same = (a: unknown, b: unknown): boolean => JSON.stringify(a) === JSON.stringify(b);

/** The side that moved away from the common ground; mine where both did or the ground is unknown. */
function moved(base: unknown, mine: unknown, theirs: unknown, known: boolean): Side {
  return known && same(base, mine) && !same(base, theirs) ? 'theirs' : 'mine';
}

const partOf = (content: ItemContent | null, id: string): Part | null =>
  content?.parts.find((part) => part.id === id) ?? null;

/**
 * Where two versions of a draft differ, in the order of the sheet. `base` is what both began from, when it is
 * known; it decides what is suggested, and nothing else.
 */
export function differences(mine: ItemContent, theirs: ItemContent, base: ItemContent | null): Difference[] {
  const known = base !== null;
  const found: Difference[] = [];
  for (const field of FIELDS) {
    if (same(mine[field], theirs[field])) continue;
    const suggestion = moved(base?.[field], mine[field], theirs[field], known);
    found.push({ kind: 'field', key: field, field, label: FIELD_NAMES[field], suggestion });
  }
  const ids = [...new Set([...mine.parts, ...theirs.parts].map((part) => part.id))];
  for (const partId of ids) {
    const [ours, others] = [partOf(mine, partId), partOf(theirs, partId)];
    if (same(ours, others)) continue;
    const place = ours === null ? theirs.parts : mine.parts;
    const letter = String.fromCharCode(97 + place.findIndex((part) => part.id === partId));
    found.push({
      kind: 'part',
      key: `part.${partId}`,
      label: `Part (${letter})`,
      partId,
      mine: ours,
      theirs: others,
      suggestion: moved(partOf(base, partId), ours, others, known),
    });
  }
  const shared = (content: ItemContent): string[] =>
    content.parts
      .map((part) => part.id)
      .filter((id) => partOf(mine, id) !== null && partOf(theirs, id) !== null);
  if (!same(shared(mine), shared(theirs))) {
    const suggestion = moved(
      base?.parts.map((part) => part.id),
      shared(mine),
      shared(theirs),
      known,
    );
    found.push({ kind: 'order', key: 'order', label: 'Order of the parts', suggestion });
  }
  return found;
}

/** Which choice stands for a difference while nobody has chosen. */
export function chosen(difference: Difference, choices: Readonly<Record<string, Choice>>): Choice {
  return choices[difference.key] ?? difference.suggestion;
}

/** An id for the second copy of a part that is kept in both versions. */
function copyId(id: string, taken: ReadonlySet<string>): string {
  for (let number = 2; ; number += 1) {
    const candidate = `${id.slice(0, 36)}-${number}`;
    if (!taken.has(candidate)) return candidate;
  }
}

function mergedParts(
  mine: ItemContent,
  theirs: ItemContent,
  found: readonly Difference[],
  choices: Readonly<Record<string, Choice>>,
): Part[] {
  const order = found.find((difference) => difference.kind === 'order');
  const lead = order !== undefined && chosen(order, choices) === 'theirs' ? theirs : mine;
  const rest = lead === mine ? theirs : mine;
  const ids = lead.parts.map((part) => part.id);
  rest.parts.forEach((part, index) => {
    if (ids.includes(part.id)) return;
    const before = rest.parts[index - 1]?.id;
    const at = before === undefined ? -1 : ids.indexOf(before);
    ids.splice(at + 1, 0, part.id);
  });
  const taken = new Set(ids);
  return ids.flatMap((id): Part[] => {
    const difference = found.find((entry) => entry.kind === 'part' && entry.partId === id);
    const [ours, others] = [partOf(mine, id), partOf(theirs, id)];
    const choice = difference === undefined ? 'mine' : chosen(difference, choices);
    if (choice === 'both' && ours !== null && others !== null) {
      return [ours, { ...others, id: copyId(id, taken) }];
    }
    const part = choice === 'theirs' ? others : choice === 'mine' ? ours : (ours ?? others);
    return part === null ? [] : [part];
  });
}

function takeField<Name extends Field>(into: ItemContent, from: ItemContent, field: Name): void {
  into[field] = from[field];
}

/** One version out of two: each difference as chosen (or as suggested), everything else as both have it. */
export function mergeVersions(
  mine: ItemContent,
  theirs: ItemContent,
  found: readonly Difference[],
  choices: Readonly<Record<string, Choice>>,
): ItemContent {
  const merged: ItemContent = { ...mine, parts: mergedParts(mine, theirs, found, choices) };
  for (const difference of found) {
    if (difference.kind === 'field' && chosen(difference, choices) === 'theirs') {
      takeField(merged, theirs, difference.field);
    }
  }
  const places = new Set(merged.parts.map((part) => part.id));
  return {
    ...merged,
    figures: merged.figures.map((figure) =>
      figure.place === 'stem' || places.has(figure.place) ? figure : { ...figure, place: 'stem' },
    ),
  };
}
