/** One thing to tell in passing; the same words are read out by screen readers. */
export interface Notice {
  id: number;
  text: string;
  /** A way to take back what was done. */
  undo?: { label: string; run: () => void };
}

let notices: readonly Notice[] = [];
let nextId = 1;
const listeners = new Set<() => void>();

function replace(next: readonly Notice[]): void {
  notices = next;
  for (const listener of listeners) listener();
}

/** Tells what was done, in a line at the foot of the page; a newer one takes its place. */
export function tell(text: string, undo?: Notice['undo']): void {
  replace([{ id: nextId, text, ...(undo === undefined ? {} : { undo }) }]);
  nextId += 1;
}

export function dismissNotice(id: number): void {
  replace(notices.filter((notice) => notice.id !== id));
}

export const currentNotices = (): readonly Notice[] => notices;

/** Calls `listener` whenever the notices change. Returns how to stop. */
export function onNotices(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
