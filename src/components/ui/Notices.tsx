import { useEffect, useSyncExternalStore } from 'react';

import { currentNotices, dismissNotice, onNotices } from './notices.ts';

/** Long enough to read a sentence and to reach its button by keyboard. */
const STAYS_MS = 12_000;

/** What was just done, with a way to take it back; stands at the foot of the page until it is dismissed. */
export function Notices() {
  const notices = useSyncExternalStore(onNotices, currentNotices);
  const [notice] = notices;
  useEffect(() => {
    if (notice === undefined || notice.undo !== undefined) return undefined;
    const timer = setTimeout(() => dismissNotice(notice.id), STAYS_MS);
    return () => clearTimeout(timer);
  }, [notice]);
  return (
    <div
      role="status"
      className="pointer-events-none fixed inset-x-0 bottom-4 z-30 grid justify-items-center px-4"
    >
      {notice !== undefined && (
        <p className="pointer-events-auto flex flex-wrap items-baseline gap-x-5 border border-ink bg-sheet px-4 py-2">
          {notice.text}
          {notice.undo !== undefined && (
            <button
              type="button"
              className="link"
              onClick={() => {
                notice.undo?.run();
                dismissNotice(notice.id);
              }}
            >
              {notice.undo.label}
            </button>
          )}
          <button type="button" className="link text-sm" onClick={() => dismissNotice(notice.id)}>
            Close
          </button>
        </p>
      )}
    </div>
  );
}
