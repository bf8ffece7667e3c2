import { useEffect, useEffectEvent } from 'react';

import type { DrawMove } from './draw-navigation.ts';

const KEYS: Readonly<Record<string, DrawMove>> = { '[': 'previous', ']': 'next' };

function isTyping(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement &&
    (target.isContentEditable || ['INPUT', 'TEXTAREA', 'SELECT'].includes(target.tagName))
  );
}

/** Square brackets go to the previous and the next draw, unless something is being typed. */
export function useDrawKeys(onMove: (move: DrawMove) => void): void {
  const press = useEffectEvent((event: KeyboardEvent) => {
    const move = KEYS[event.key];
    if (move === undefined || isTyping(event.target) || event.ctrlKey || event.metaKey) return;
    event.preventDefault();
    onMove(move);
  });
  useEffect(() => {
    const listener = (event: KeyboardEvent): void => press(event);
    window.addEventListener('keydown', listener);
    return () => window.removeEventListener('keydown', listener);
  }, []);
}
