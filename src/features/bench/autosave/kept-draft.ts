import { z } from 'zod';

import { itemContentSchema } from '#shared/engine/index.ts';
import type { Draft } from './autosave-machine.ts';

/** A draft kept on this computer until the server has it. */
const keptDraftSchema = z.object({
  version: z.number().int(),
  keptAt: z.string(),
  topicId: z.number().int(),
  content: itemContentSchema,
});
export type KeptDraft = z.infer<typeof keptDraftSchema>;

/** As much of the browser's storage as is used here. */
export type DraftStorage = Pick<Storage, 'getItem' | 'setItem' | 'removeItem'>;

/** One slot for each person and item, so that nobody at a shared computer meets another's draft. */
const slot = (personId: number, itemId: number): string => `graticule.draft.${personId}.${itemId}`;

/**
 * Keeps the draft with the version it is based on. Returns false when the browser will not store it
 * (storage full or switched off).
 */
export function keepDraft(
  storage: DraftStorage,
  key: { personId: number; itemId: number },
  draft: Draft,
  version: number,
  keptAt: string,
): boolean {
  const kept: KeptDraft = { version, keptAt, topicId: draft.topicId, content: draft.content };
  try {
    storage.setItem(slot(key.personId, key.itemId), JSON.stringify(kept));
    return true;
  } catch {
    return false;
  }
}

/** The draft kept for this person and item; null when there is none or it cannot be read. */
export function keptDraft(
  storage: DraftStorage,
  key: { personId: number; itemId: number },
): KeptDraft | null {
  let text: string | null;
  try {
    text = storage.getItem(slot(key.personId, key.itemId));
  } catch {
    return null;
  }
  if (text === null) return null;
  let parsed: unknown;
  try {
    parsed = JSON.parse(text);
  } catch {
    return null;
  }
  const kept = keptDraftSchema.safeParse(parsed);
  return kept.success ? kept.data : null;
}

/** Forgets the kept draft, once the server has it or the person lets it go. */
export function forgetDraft(storage: DraftStorage, key: { personId: number; itemId: number }): void {
  try {
    storage.removeItem(slot(key.personId, key.itemId));
  } catch {
    // A browser that refuses storage has nothing to forget.
  }
}
