import type { DraftEditor } from './use-draft.ts';

const REMOVING = 'removing ';

/** While a removal is the last thing that was done: says so, with a way to take it back. */
export function RemovedNotice({ draft }: { draft: DraftEditor }) {
  const label = draft.state.past.at(-1)?.label ?? '';
  if (!label.startsWith(REMOVING)) return null;
  return (
    <p role="status" className="bench-removed">
      Removed: {label.slice(REMOVING.length)}.{' '}
      <button type="button" className="link" onClick={draft.undo}>
        Bring it back
      </button>
    </p>
  );
}
