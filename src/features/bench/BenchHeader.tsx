import type { ReactNode } from 'react';
import { Link } from 'react-router';

import { ITEM_STATE_NAMES } from '#shared/domain/item-life.ts';
import type { Item } from '#shared/contracts/items.ts';
import type { ItemContent } from '#shared/engine/index.ts';
import { countOf } from '#src/lib/format.ts';
import type { Autosave } from './autosave/use-autosave.ts';
import { SaveState } from './autosave/SaveState.tsx';
import { totalMarks } from './draft/edit-content.ts';
import type { DraftEditor } from './draft/use-draft.ts';

interface BenchHeaderProps {
  item: Item;
  content: ItemContent;
  draft: DraftEditor;
  autosave: Autosave;
  readOnly: boolean;
  /** Counts of findings, in words; null before the first check. */
  findings: string | null;
  checking: boolean;
  onShowFindings: () => void;
  actions: ReactNode;
}

/** Code, title, state and saving of the item, undo and redo, and what can be done with it. */
export function BenchHeader(props: BenchHeaderProps) {
  const { item, content, draft, autosave, readOnly, findings, checking } = props;
  const undo = draft.state.past.at(-1);
  const redo = draft.state.future.at(-1);
  const marks = totalMarks(content);
  return (
    <header className="bench-header">
      <div className="min-w-0 flex-1 basis-96">
        <h1 className="text-xl font-semibold">
          <span className="font-mono text-base font-normal text-muted">{item.code}</span>{' '}
          {content.title === '' ? 'Untitled item' : content.title}
        </h1>
        <p className="flex flex-wrap items-baseline gap-x-4 text-sm">
          <span>{ITEM_STATE_NAMES[item.state]}</span>
          <span className="text-muted">Revision {item.revision.number}</span>
          <span className="text-muted">{countOf(marks, 'mark')}</span>
          {findings !== null && (
            <button type="button" className="link" onClick={props.onShowFindings}>
              {findings}
            </button>
          )}
          {checking && <span className="text-muted">Checking</span>}
          {item.reviewId !== null && (
            <Link className="link" to={`/reviews/${item.reviewId}`}>
              Review and comments
            </Link>
          )}
          {readOnly ? null : <SaveState state={autosave.state} onRetry={autosave.retry} />}
        </p>
      </div>
      <div className="flex flex-wrap items-center gap-3">
        {!readOnly && (
          <>
            <button
              type="button"
              className="link"
              disabled={undo === undefined}
              title={undo === undefined ? undefined : `Undo: ${undo.label}`}
              onClick={draft.undo}
            >
              Undo
            </button>
            <button
              type="button"
              className="link"
              disabled={redo === undefined}
              title={redo === undefined ? undefined : `Redo: ${redo.label}`}
              onClick={draft.redo}
            >
              Redo
            </button>
          </>
        )}
        {props.actions}
      </div>
    </header>
  );
}
