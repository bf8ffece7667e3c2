/** Whether the server answered the last time it was asked. */
let reachable = true;
const listeners = new Set<() => void>();

/** Remembers whether the server answered, and tells everyone who listens when that changes. */
export function reportReachable(now: boolean): void {
  if (reachable === now) return;
  reachable = now;
  for (const listener of listeners) listener();
}

export const isReachable = (): boolean => reachable;

/** Calls `listener` whenever the connection is lost or back. Returns how to stop. */
export function onReachableChange(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
