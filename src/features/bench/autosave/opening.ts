import type { ItemContent } from '#shared/engine/index.ts';
import type { KeptDraft } from './kept-draft.ts';

/** How the bench begins: with the server's copy, with what this computer kept, or with both to choose from. */
export type Opening =
  | { kind: 'server' }
  | { kind: 'restored'; content: ItemContent; topicId: number; keptAt: string }
  | { kind: 'conflict'; content: ItemContent; topicId: number; keptAt: string };

/**
 * Compares what this computer kept with the server's copy. The same version means that the kept one is simply
 * further on; another version means that somebody saved meanwhile. A kept copy equal to the server's is done with.
 */
export function openingOf(
  server: { content: ItemContent; topicId: number; version: number },
  kept: KeptDraft | null,
): Opening {
  if (kept === null) return { kind: 'server' };
  const same =
    kept.topicId === server.topicId && JSON.stringify(kept.content) === JSON.stringify(server.content);
  if (same) return { kind: 'server' };
  const { content, topicId, keptAt } = kept;
  return { kind: kept.version === server.version ? 'restored' : 'conflict', content, topicId, keptAt };
}
