import { useEffect, useRef, useState, type KeyboardEvent } from 'react';

import type { Paper } from '#shared/contracts/papers.ts';
import { type Place, placesOf } from './api.ts';

/** The list with its entry at `from` taken out and put in at `to`. */
export function moved<T>(list: readonly T[], from: number, to: number): T[] {
  const next = [...list];
  const [taken] = next.splice(from, 1);
  if (taken !== undefined) next.splice(to, 0, taken);
  return next;
}

interface MovesInput {
  paper: Paper;
  /** Whether rows may be moved now. */
  movable: boolean;
  busy: boolean;
  onSave: (places: Place[]) => void;
}

/**
 * Moves rows of the running order by keys, buttons or drag. The keyboard stays with the row that moves, and what
 * happened is put into words.
 */
export function useMoves({ paper, movable, busy, onSave }: MovesInput) {
  const body = useRef<HTMLTableSectionElement>(null);
  /** The button that moved a row: the page loses the focus of a row that changes its place. */
  const moving = useRef<{ itemId: number; button: string } | null>(null);
  const [told, setTold] = useState('');
  useEffect(() => {
    if (busy || moving.current === null) return;
    const { itemId, button } = moving.current;
    moving.current = null;
    const buttons = body.current?.querySelectorAll<HTMLButtonElement>(
      `[data-item="${itemId}"] button[data-move]`,
    );
    const usable = Array.from(buttons ?? []).filter((each) => !each.disabled);
    (usable.find((each) => each.dataset['move'] === button) ?? usable[0])?.focus();
  }, [busy, paper]);

  const moveTo = (from: number, to: number) => {
    const place = paper.places[from];
    if (!movable || busy || place === undefined || to === from || to < 0 || to >= paper.places.length) return;
    moving.current = { itemId: place.itemId, button: to < from ? 'up' : 'down' };
    setTold(`${place.itemCode} moves to place ${to + 1} of ${paper.places.length}.`);
    onSave(moved(placesOf(paper), from, to));
  };
  const moveByKey = (event: KeyboardEvent, from: number) => {
    if (!event.altKey || (event.key !== 'ArrowUp' && event.key !== 'ArrowDown')) return;
    event.preventDefault();
    moveTo(from, event.key === 'ArrowUp' ? from - 1 : from + 1);
  };
  return { body, told, moveTo, moveByKey };
}
