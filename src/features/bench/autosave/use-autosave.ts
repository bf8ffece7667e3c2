import { useCallback, useEffect, useEffectEvent, useReducer, useRef } from 'react';

import {
  isUnsaved,
  openAutosave,
  reduceAutosave,
  type AutosaveState,
  type Draft,
  type SaveFailure,
} from './autosave-machine.ts';
import { forgetDraft, keepDraft, type DraftStorage } from './kept-draft.ts';

/** Stillness after the last edit before a save begins, and the pause between tries without a connection. */
export const SAVE_AFTER_MS = 900;
const RETRY_AFTER_MS = 15_000;

interface AutosaveOptions {
  key: { personId: number; itemId: number };
  version: number;
  /** True when the draft at hand is further on than the server's copy from the beginning. */
  unsaved: boolean;
  draft: Draft;
  /** False while the draft may not be saved: somebody else's item, or one in review. */
  enabled: boolean;
  save: (draft: Draft, version: number) => Promise<{ version: number; savedAt: string }>;
  /** Sorts an error into the ways a save can fail; what the server holds on a conflict goes to `onConflict`. */
  failureOf: (error: unknown) => SaveFailure;
  storage: DraftStorage;
  now: () => string;
}

export interface Autosave {
  state: AutosaveState;
  /** Saves at once what is not saved; gives the version then current, or null when it cannot be saved. */
  saveNow: () => Promise<number | null>;
  retry: () => void;
  /** Goes on from the server's version after a conflict was resolved into the draft. */
  resolved: (version: number) => void;
}

/**
 * Saves the draft a moment after each edit, one save at a time, and keeps it on this computer until the server
 * has it. Tries again when the connection or the session is back.
 */
export function useAutosave(options: AutosaveOptions): Autosave {
  const { draft, enabled, key, storage } = options;
  const [state, dispatch] = useReducer(reduceAutosave, undefined, () =>
    openAutosave(options.version, options.unsaved),
  );
  const seen = useRef(draft);
  const running = useRef<Promise<number | null> | null>(null);
  const latest = useRef({ draft, state });
  const { content, topicId } = draft;

  useEffect(() => {
    latest.current = { draft, state };
  });

  const edited = useEffectEvent(() => {
    keepDraft(storage, key, draft, state.version, options.now());
    dispatch({ kind: 'edited' });
  });
  useEffect(() => {
    if (seen.current.content === content && seen.current.topicId === topicId) return;
    seen.current = { content, topicId };
    if (enabled) edited();
  }, [content, topicId, enabled]);

  const runSave = async (): Promise<number | null> => {
    const { draft: saving, state: before } = latest.current;
    dispatch({ kind: 'saveBegan' });
    try {
      const reply = await options.save(saving, before.version);
      dispatch({ kind: 'saved', edit: before.edit, ...reply });
      const now = latest.current;
      now.state = { ...now.state, version: reply.version, savedEdit: before.edit };
      if (now.state.edit === before.edit) forgetDraft(storage, key);
      else keepDraft(storage, key, now.draft, reply.version, options.now());
      return reply.version;
    } catch (error) {
      dispatch({ kind: 'failed', failure: options.failureOf(error) });
      return null;
    } finally {
      running.current = null;
    }
  };
  const begin = useEffectEvent(() => {
    running.current ??= runSave();
  });
  useEffect(() => {
    if (state.phase !== 'waiting' || !enabled) return undefined;
    const timer = setTimeout(begin, SAVE_AFTER_MS);
    return () => clearTimeout(timer);
  }, [state.phase, state.edit, enabled]);

  const retry = useCallback(() => dispatch({ kind: 'retry' }), []);
  useEffect(() => {
    if (state.phase !== 'offline' && state.phase !== 'signedOut') return undefined;
    const timer = setInterval(retry, RETRY_AFTER_MS);
    window.addEventListener('online', retry);
    window.addEventListener('focus', retry);
    return () => {
      clearInterval(timer);
      window.removeEventListener('online', retry);
      window.removeEventListener('focus', retry);
    };
  }, [state.phase, retry]);

  const leave = useEffectEvent(() => {
    if (enabled && latest.current.state.phase === 'waiting') running.current ??= runSave();
  });
  useEffect(() => () => leave(), []);

  const saveNow = async (): Promise<number | null> => {
    if (running.current !== null) await running.current;
    const { state: now } = latest.current;
    if (now.phase === 'conflict') return null;
    if (!isUnsaved(now)) return now.version;
    running.current ??= runSave();
    return running.current;
  };
  const resolved = useCallback((version: number) => dispatch({ kind: 'resolved', version }), []);
  return { state, saveNow, retry, resolved };
}
