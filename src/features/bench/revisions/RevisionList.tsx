import { useState, type ReactNode } from 'react';

import { ITEM_STATE_NAMES } from '#shared/domain/item-life.ts';
import type { Item } from '#shared/contracts/items.ts';
import type { ItemContent } from '#shared/engine/index.ts';
import { formatDay } from '#src/lib/format.ts';
import { sentenceOf } from '#src/lib/api.ts';

type Summary = Pick<Item['revision'], 'id' | 'number' | 'state' | 'author' | 'createdAt' | 'note'>;

interface RevisionListProps {
  revisions: readonly Summary[];
  /** Number of the revision that is open on the bench. */
  current: number;
  /** Fetches the content of one revision. */
  onOpen: (number: number) => Promise<ItemContent>;
  /** Shows what changed from an older content to the one on the bench. */
  renderChanges: (before: ItemContent) => ReactNode;
}

/** The item's revisions, newest first; each older one can be compared with the one on the bench. */
export function RevisionList({ revisions, current, onOpen, renderChanges }: RevisionListProps) {
  const [open, setOpen] = useState<{ number: number; content: ItemContent | null; problem: string } | null>(
    null,
  );
  const show = async (number: number): Promise<void> => {
    setOpen({ number, content: null, problem: '' });
    try {
      setOpen({ number, content: await onOpen(number), problem: '' });
    } catch (error) {
      const problem = sentenceOf(error);
      setOpen({ number, content: null, problem });
    }
  };
  return (
    <ol className="grid gap-2">
      {[...revisions]
        .sort((a, b) => b.number - a.number)
        .map((revision) => (
          <li key={revision.id} className="border-t border-rule pt-2">
            <p className="flex flex-wrap gap-x-4">
              <span>Revision {revision.number}</span>
              <span>{ITEM_STATE_NAMES[revision.state]}</span>
              <span className="text-muted">
                {revision.author.name},{' '}
                <time dateTime={revision.createdAt}>{formatDay(revision.createdAt)}</time>
              </span>
              {revision.number !== current && (
                <button
                  type="button"
                  className="link"
                  aria-expanded={open?.number === revision.number}
                  onClick={() =>
                    open?.number === revision.number ? setOpen(null) : void show(revision.number)
                  }
                >
                  {open?.number === revision.number ? 'Close' : 'What changed since'}
                </button>
              )}
            </p>
            {revision.note !== '' && <p className="text-sm text-muted">{revision.note}</p>}
            {open?.number === revision.number && (
              <div className="mt-2">
                {open.problem !== '' && (
                  <p role="alert" className="text-lead">
                    {open.problem}
                  </p>
                )}
                {open.content === null ? open.problem === '' && <p>Opening</p> : renderChanges(open.content)}
              </div>
            )}
          </li>
        ))}
    </ol>
  );
}
