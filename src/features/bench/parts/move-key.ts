import type { KeyboardEvent } from 'react';

/** −1 or 1 when the keys pressed ask for a move up or down (Alt with an arrow); else null. */
export function moveOfKeys(event: Pick<KeyboardEvent, 'altKey' | 'key'>): -1 | 1 | null {
  if (!event.altKey) return null;
  if (event.key === 'ArrowUp') return -1;
  return event.key === 'ArrowDown' ? 1 : null;
}
