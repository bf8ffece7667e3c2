import { describe, expect, it } from 'vitest';

import { itemContentSchema } from '#shared/engine/index.ts';
import {
  autosaveText,
  isUnsaved,
  openAutosave,
  reduceAutosave,
  type AutosaveEvent,
  type AutosaveState,
} from './autosave-machine.ts';
import { forgetDraft, keepDraft, keptDraft, type DraftStorage } from './kept-draft.ts';

const run = (events: AutosaveEvent[], from: AutosaveState = openAutosave(7)): AutosaveState =>
  events.reduce(reduceAutosave, from);
const savedAt = '2026-03-02T14:32:00.000Z';

describe('the state of saving', () => {
  it('goes from an edit over a save to saved, with the new version', () => {
    const state = run([
      { kind: 'edited' },
      { kind: 'saveBegan' },
      { kind: 'saved', edit: 1, version: 8, savedAt },
    ]);
    expect(state).toMatchObject({ phase: 'saved', version: 8, savedAt });
    expect(isUnsaved(state)).toBe(false);
  });

  it('does not take for saved what was typed while a save was under way', () => {
    const state = run([
      { kind: 'edited' },
      { kind: 'saveBegan' },
      { kind: 'edited' },
      { kind: 'saved', edit: 1, version: 8, savedAt },
    ]);
    expect(state.phase).toBe('waiting');
    expect(isUnsaved(state)).toBe(true);
  });

  it('begins no second save while one is under way', () => {
    const saving = run([{ kind: 'edited' }, { kind: 'saveBegan' }]);
    expect(reduceAutosave(saving, { kind: 'saveBegan' })).toBe(saving);
    expect(reduceAutosave(saving, { kind: 'edited' }).phase).toBe('saving');
  });

  it('keeps what is typed offline and saves it when the connection is back', () => {
    const offline = run([
      { kind: 'edited' },
      { kind: 'saveBegan' },
      { kind: 'failed', failure: { kind: 'offline' } },
      { kind: 'edited' },
    ]);
    expect(offline.phase).toBe('offline');
    expect(autosaveText(offline)).toBe('Not saved: offline, kept on this computer');
    expect(reduceAutosave(offline, { kind: 'retry' }).phase).toBe('waiting');
  });

  it('does not save over a conflict until it is resolved, and then on the new version', () => {
    const conflict = run([
      { kind: 'edited' },
      { kind: 'saveBegan' },
      { kind: 'failed', failure: { kind: 'conflict' } },
      { kind: 'edited' },
      { kind: 'retry' },
      { kind: 'saveBegan' },
    ]);
    expect(conflict.phase).toBe('conflict');
    expect(reduceAutosave(conflict, { kind: 'resolved', version: 12 })).toMatchObject({
      phase: 'waiting',
      version: 12,
    });
  });

  it('tries again after the next edit when the server refused the content', () => {
    const refused = run([
      { kind: 'edited' },
      { kind: 'saveBegan' },
      { kind: 'failed', failure: { kind: 'refused', message: 'The title is too long.' } },
    ]);
    expect(refused.message).toBe('The title is too long.');
    expect(reduceAutosave(refused, { kind: 'edited' })).toMatchObject({ phase: 'waiting', message: '' });
  });

  it('starts by saving when a draft kept on this computer is restored', () => {
    expect(openAutosave(3, true).phase).toBe('waiting');
  });
});

function memoryStorage(full = false): DraftStorage & { slots: Map<string, string> } {
  const slots = new Map<string, string>();
  return {
    slots,
    getItem: (key) => slots.get(key) ?? null,
    setItem: (key, value) => {
      if (full) throw new Error('quota');
      slots.set(key, value);
    },
    removeItem: (key) => slots.delete(key),
  };
}

describe('a draft kept on this computer', () => {
  const content = itemContentSchema.parse({ title: 'Gun' });
  const key = { personId: 2, itemId: 5 };

  it('comes back with the version it was based on, for the same person and item alone', () => {
    const storage = memoryStorage();
    expect(keepDraft(storage, key, { content, topicId: 3 }, 7, savedAt)).toBe(true);
    expect(keptDraft(storage, key)).toEqual({ version: 7, keptAt: savedAt, topicId: 3, content });
    expect(keptDraft(storage, { personId: 9, itemId: 5 })).toBeNull();
    expect(keptDraft(storage, { personId: 2, itemId: 6 })).toBeNull();
    forgetDraft(storage, key);
    expect(keptDraft(storage, key)).toBeNull();
  });

  it('says so when the browser will not store it', () => {
    expect(keepDraft(memoryStorage(true), key, { content, topicId: 3 }, 7, savedAt)).toBe(false);
  });

  it('ignores what it cannot read', () => {
    const storage = memoryStorage();
    keepDraft(storage, key, { content, topicId: 3 }, 7, savedAt);
    for (const slot of storage.slots.keys()) storage.slots.set(slot, '{"version":');
    expect(keptDraft(storage, key)).toBeNull();
    for (const slot of storage.slots.keys()) storage.slots.set(slot, '{"version":1}');
    expect(keptDraft(storage, key)).toBeNull();
  });
});
