// @vitest-environment jsdom
import { act, renderHook } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import { itemContentSchema } from '#shared/engine/index.ts';
import type { Draft, SaveFailure } from './autosave-machine.ts';
import { keptDraft, type DraftStorage } from './kept-draft.ts';
import { SAVE_AFTER_MS, useAutosave } from './use-autosave.ts';

const content = itemContentSchema.parse({ title: 'Gun', stem: 'First.' });
const key = { personId: 1, itemId: 2 };
const draftOf = (stem: string): Draft => ({ content: { ...content, stem }, topicId: 1 });
const savedAt = '2026-03-02T14:32:00.000Z';

class Refusal extends Error {
  constructor(readonly failure: SaveFailure) {
    super('refused');
  }
}

function mount(save: (draft: Draft, version: number) => Promise<{ version: number; savedAt: string }>) {
  const slots = new Map<string, string>();
  const storage: DraftStorage = {
    getItem: (name) => slots.get(name) ?? null,
    setItem: (name, value) => slots.set(name, value),
    removeItem: (name) => slots.delete(name),
  };
  const failureOf = (error: unknown): SaveFailure =>
    error instanceof Refusal ? error.failure : { kind: 'refused', message: 'unknown' };
  const first = draftOf('First.');
  const hook = renderHook(
    ({ draft }: { draft: Draft }) =>
      useAutosave({
        key,
        version: 5,
        unsaved: false,
        draft,
        enabled: true,
        save,
        failureOf,
        storage,
        now: () => savedAt,
      }),
    { initialProps: { draft: first } },
  );
  return { hook, storage, type: (stem: string) => hook.rerender({ draft: draftOf(stem) }) };
}
const pass = (ms: number): Promise<void> =>
  act(async () => {
    await vi.advanceTimersByTimeAsync(ms);
  });

beforeEach(() => vi.useFakeTimers());
afterEach(() => vi.useRealTimers());

describe('saving by itself', () => {
  it('waits for stillness, saves once with the latest text, and then forgets the kept copy', async () => {
    const save = vi.fn(() => Promise.resolve({ version: 6, savedAt }));
    const { hook, type, storage } = mount(save);
    type('F');
    await pass(SAVE_AFTER_MS - 100);
    type('Fi');
    await pass(SAVE_AFTER_MS - 100);
    expect(save).not.toHaveBeenCalled();
    expect(keptDraft(storage, key)?.content.stem).toBe('Fi');
    await pass(200);
    expect(save).toHaveBeenCalledTimes(1);
    expect(save).toHaveBeenCalledWith(draftOf('Fi'), 5);
    expect(hook.result.current.state.phase).toBe('saved');
    expect(keptDraft(storage, key)).toBeNull();
  });

  it('saves what was typed during a save afterwards, on the new version', async () => {
    let finish: (reply: { version: number; savedAt: string }) => void = () => undefined;
    const save = vi.fn(
      () => new Promise<{ version: number; savedAt: string }>((resolve) => void (finish = resolve)),
    );
    const { hook, type, storage } = mount(save);
    type('One');
    await pass(SAVE_AFTER_MS);
    type('Two');
    await act(async () => finish({ version: 6, savedAt }));
    expect(hook.result.current.state.phase).toBe('waiting');
    expect(keptDraft(storage, key)).toMatchObject({ version: 6, content: { stem: 'Two' } });
    await pass(SAVE_AFTER_MS);
    expect(save).toHaveBeenLastCalledWith(draftOf('Two'), 6);
    await act(async () => finish({ version: 7, savedAt }));
    expect(hook.result.current.state).toMatchObject({ phase: 'saved', version: 7 });
  });

  it('keeps the draft here while offline and saves it when the connection is back', async () => {
    let online = false;
    const save = vi.fn(() =>
      online ? Promise.resolve({ version: 6, savedAt }) : Promise.reject(new Refusal({ kind: 'offline' })),
    );
    const { hook, type, storage } = mount(save);
    type('Typed offline');
    await pass(SAVE_AFTER_MS);
    expect(hook.result.current.state.phase).toBe('offline');
    expect(keptDraft(storage, key)?.content.stem).toBe('Typed offline');
    online = true;
    act(() => void window.dispatchEvent(new Event('online')));
    await pass(SAVE_AFTER_MS);
    expect(hook.result.current.state.phase).toBe('saved');
  });

  it('does not overwrite after a conflict until it is resolved', async () => {
    const save = vi
      .fn<(draft: Draft, version: number) => Promise<{ version: number; savedAt: string }>>()
      .mockRejectedValueOnce(new Refusal({ kind: 'conflict' }))
      .mockResolvedValue({ version: 10, savedAt });
    const { hook, type } = mount(save);
    type('Mine');
    await pass(SAVE_AFTER_MS);
    type('Mine, further');
    await pass(10 * SAVE_AFTER_MS);
    expect(save).toHaveBeenCalledTimes(1);
    expect(await hook.result.current.saveNow()).toBeNull();
    act(() => hook.result.current.resolved(9));
    await pass(SAVE_AFTER_MS);
    expect(save).toHaveBeenLastCalledWith(draftOf('Mine, further'), 9);
  });

  it('saves at once when asked, and gives the version that can be sent on', async () => {
    const save = vi.fn(() => Promise.resolve({ version: 6, savedAt }));
    const { hook, type } = mount(save);
    expect(await hook.result.current.saveNow()).toBe(5);
    type('Ready');
    let version: number | null = null;
    await act(async () => void (version = await hook.result.current.saveNow()));
    expect(version).toBe(6);
  });

  it('saves what is left when the screen is left', async () => {
    const save = vi.fn(() => Promise.resolve({ version: 6, savedAt }));
    const { hook, type } = mount(save);
    type('Last words');
    hook.unmount();
    await pass(0);
    expect(save).toHaveBeenCalledWith(draftOf('Last words'), 5);
  });
});
