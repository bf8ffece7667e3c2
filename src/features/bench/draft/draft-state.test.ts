import { describe, expect, it } from 'vitest';

import { itemContentSchema } from '#shared/engine/index.ts';
import { blankPart, freeId, partAsKind } from './blank-parts.ts';
import { openDraft, MOST_STEPS, reduceDraft, type DraftState } from './draft-state.ts';
import { moved, schemeBalance, withoutPart, withPart, withQuantity } from './edit-content.ts';

const content = itemContentSchema.parse({
  title: 'Gun',
  stem: 'A gun.',
  parts: [blankPart('numeric', 'p1'), blankPart('written', 'p2'), blankPart('showThat', 'p3')],
  figures: [{ figureId: 4, place: 'p2' }],
});
const type = (state: DraftState, stem: string, field: string | null = 'stem'): DraftState =>
  reduceDraft(state, { kind: 'edit', label: 'the stem', field, change: (now) => ({ ...now, stem }) });

describe('a draft being edited', () => {
  it('undoes a whole stretch of typing in one field at once', () => {
    const typed = type(type(openDraft(content, 1), 'A g'), 'A gun fires.');
    const undone = reduceDraft(typed, { kind: 'undo' });
    expect(undone.content.stem).toBe('A gun.');
    expect(reduceDraft(undone, { kind: 'redo' }).content.stem).toBe('A gun fires.');
  });

  it('keeps edits of different fields apart', () => {
    const typed = type(type(openDraft(content, 1), 'one', 'stem'), 'two', 'elsewhere');
    expect(reduceDraft(typed, { kind: 'undo' }).content.stem).toBe('one');
  });

  it('begins a new step after an undo, and forgets what could be redone', () => {
    const undone = reduceDraft(type(openDraft(content, 1), 'one'), { kind: 'undo' });
    const typed = type(undone, 'two');
    expect(typed.future).toHaveLength(0);
    expect(reduceDraft(typed, { kind: 'undo' }).content.stem).toBe('A gun.');
  });

  it('brings a removed part back by undo, with the figure under it', () => {
    const removed = reduceDraft(openDraft(content, 1), {
      kind: 'edit',
      label: 'removing part (b)',
      field: null,
      change: (now) => withoutPart(now, 'p2'),
    });
    expect(removed.content.parts.map((part) => part.id)).toEqual(['p1', 'p3']);
    expect(removed.content.figures[0]?.place).toBe('stem');
    const back = reduceDraft(removed, { kind: 'undo' });
    expect(back.content).toEqual(content);
  });

  it('keeps both versions of a conflict among the steps', () => {
    const theirs = { ...content, stem: 'Theirs.' };
    const merged = { ...content, stem: 'Both.' };
    const state = reduceDraft(openDraft(content, 1), { kind: 'merged', theirs, merged, topicId: 1 });
    expect(state.content.stem).toBe('Both.');
    const first = reduceDraft(state, { kind: 'undo' });
    expect(first.content.stem).toBe('Theirs.');
    expect(reduceDraft(first, { kind: 'undo' }).content.stem).toBe('A gun.');
  });

  it('forgets the oldest steps only', () => {
    let state = openDraft(content, 1);
    for (let n = 0; n < MOST_STEPS + 5; n += 1) state = type(state, String(n), null);
    expect(state.past).toHaveLength(MOST_STEPS);
    expect(reduceDraft(state, { kind: 'undo' }).content.stem).toBe(String(MOST_STEPS + 3));
  });

  it('makes no step of a change that changes nothing', () => {
    const state = openDraft(content, 1);
    expect(reduceDraft(state, { kind: 'edit', label: '', field: null, change: (now) => now })).toBe(state);
    expect(reduceDraft(state, { kind: 'topic', topicId: 1 })).toBe(state);
  });
});

describe('edits of an item', () => {
  it('moves an entry and leaves the list when it cannot', () => {
    expect(moved(['a', 'b', 'c'], 0, 2)).toEqual(['b', 'c', 'a']);
    expect(moved(['a', 'b', 'c'], 2, 0)).toEqual(['c', 'a', 'b']);
    expect(moved(['a', 'b', 'c'], 0, -1)).toEqual(['a', 'b', 'c']);
  });

  it('gives new parts an id that no part has', () => {
    expect(freeId('p', ['p1', 'p3'])).toBe('p4');
    expect(freeId('p', ['x', 'p3'])).toBe('p4');
  });

  it('keeps the answer when a numeric part becomes “show that”, and drops it only for a written one', () => {
    const numeric = { ...blankPart('numeric', 'p'), text: 'Find v.' };
    const withAnswer =
      numeric.kind === 'numeric' ? { ...numeric, answer: { ...numeric.answer, quantity: 'v' } } : numeric;
    const shown = partAsKind(withAnswer, 'showThat');
    expect(shown.kind === 'showThat' && shown.answer.quantity).toBe('v');
    expect(partAsKind(shown, 'written')).not.toHaveProperty('answer');
  });

  it('says how the lines of a mark scheme compare with the marks of the part', () => {
    const part = {
      ...blankPart('numeric', 'p'),
      marks: 3,
      scheme: [
        { text: '', marks: 1 },
        { text: '', marks: 1 },
      ],
    };
    expect(schemeBalance(part).sentence).toBe('The lines add up to 2: 1 mark short of the part’s 3.');
    expect(schemeBalance({ ...part, marks: 2 }).balanced).toBe(true);
  });

  it('writes how a name is printed only for that name', () => {
    const once = withQuantity(content, 'Va', { unit: 'kV' });
    const twice = withQuantity(once, 'Va', { figures: 3 });
    expect(twice.quantities).toEqual([
      { name: 'Va', symbol: '', unit: 'kV', figures: 3, role: null, set: '' },
    ]);
    expect(
      withPart(content, 'p1', (part) => ({ ...part, marks: 9 })).parts.map((part) => part.marks),
    ).toEqual([9, 1, 1]);
  });
});
