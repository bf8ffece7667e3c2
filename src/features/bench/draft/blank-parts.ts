import type { Answer, Part, SchemeLine, Slip } from '#shared/engine/index.ts';

/**
 * An id that none of `taken` has: the prefix and the next free number. Ids are made from what the item
 * holds, so the same edits always give the same item.
 */
export function freeId(prefix: string, taken: readonly string[]): string {
  let number = taken.length + 1;
  while (taken.includes(`${prefix}${number}`)) number += 1;
  return `${prefix}${number}`;
}

/** An answer that names no quantity yet: three figures, 2 % band. */
export function blankAnswer(): Answer {
  return {
    quantity: '',
    unit: '',
    figures: 3,
    enforceFigures: false,
    band: { kind: 'percent', percent: 2 },
    carryForward: true,
    slips: [],
  };
}

/** A part of the kind asked for, empty but for one mark and one line of mark scheme. */
export function blankPart(kind: Part['kind'], id: string): Part {
  const base = { id, text: '', marks: 1, scheme: [{ text: '', marks: 1 }] };
  if (kind === 'written') return { ...base, kind, answerLines: 3 };
  if (kind === 'showThat') return { ...base, kind, answer: blankAnswer(), statedFigures: 2 };
  return { ...base, kind, answer: blankAnswer() };
}

/** The part as another kind; the answer is kept where the new kind has one. */
export function partAsKind(part: Part, kind: Part['kind']): Part {
  if (part.kind === kind) return part;
  const base = { id: part.id, text: part.text, marks: part.marks, scheme: part.scheme };
  if (kind === 'written') return { ...base, kind, answerLines: 3 };
  const answer = part.kind === 'written' ? blankAnswer() : part.answer;
  return kind === 'showThat' ? { ...base, kind, answer, statedFigures: 2 } : { ...base, kind, answer };
}

export function blankSlip(id: string): Slip {
  return { id, name: '', expression: '', guidance: '', marks: 0 };
}

export function blankSchemeLine(): SchemeLine {
  return { text: '', marks: 1 };
}
