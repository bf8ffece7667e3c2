import type { KeyboardEvent } from 'react';

/** Where each key leads from the row at `at` of `count` rows. */
const STEPS: Readonly<Record<string, (at: number, count: number) => number>> = {
  ArrowDown: (at) => at + 1,
  ArrowUp: (at) => at - 1,
  Home: () => 0,
  End: (_at, count) => count - 1,
};

/**
 * Takes the keyboard from row to row of a list whose rows are links; to be put on whatever holds the rows. Up and
 * down go by one, Home and End to the first and the last.
 */
export function moveRow(event: KeyboardEvent<HTMLElement>): void {
  const step = STEPS[event.key];
  if (step === undefined || event.altKey || event.ctrlKey || event.metaKey) return;
  const links = Array.from(event.currentTarget.querySelectorAll('a'));
  const at = links.findIndex((link) => link === document.activeElement);
  const next = at < 0 ? undefined : links[step(at, links.length)];
  if (next === undefined) return;
  event.preventDefault();
  next.focus();
}
