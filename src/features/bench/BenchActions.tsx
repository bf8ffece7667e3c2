import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';

import type { Item, StoredAssay } from '#shared/contracts/items.ts';
import type { ItemContent } from '#shared/engine/index.ts';
import { AppError } from '#shared/errors/app-error.ts';
import { tell } from '#src/components/ui/notices.ts';
import { Dialog } from '#src/components/ui/Dialog.tsx';
import { sentenceOf } from '#src/lib/api.ts';
import { reviewersQuery, revisionsQuery, type BenchCalls } from './api.ts';
import type { FindingTarget } from './findings/group-findings.ts';
import { RevisionList } from './revisions/RevisionList.tsx';
import { ReasonForm } from './sending/ReasonForm.tsx';
import { SendPanel } from './sending/SendPanel.tsx';

interface BenchActionsProps {
  item: Item;
  content: ItemContent;
  calls: BenchCalls;
  saveNow: () => Promise<number | null>;
  onChanged: (item: Item) => Promise<void>;
  onVisit: (target: FindingTarget) => void;
  renderChanges: (before: ItemContent) => ReactNode;
}

type Open = 'send' | 'recall' | 'withdraw' | 'revisions';

const NOT_SAVED = 'The draft could not be saved, so it cannot be sent. See beside the title why.';

/** What can be done with the item as a whole: send, take back, begin a revision, withdraw; and its revisions. */
export function BenchActions(props: BenchActionsProps) {
  const { item, content, calls, saveNow, onChanged } = props;
  const [open, setOpen] = useState<Open | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const reviewers = useQuery({ ...reviewersQuery, enabled: open === 'send' });
  const revisions = useQuery({ ...revisionsQuery(item.id), enabled: open === 'revisions' });
  const can = (ability: Item['abilities'][number]): boolean => item.abilities.includes(ability);
  const close = (): void => setOpen(null);
  const done = async (next: Item): Promise<void> => {
    close();
    await onChanged(next);
  };
  const assay = async (): Promise<StoredAssay> => {
    if ((await saveNow()) === null) throw new AppError('notPossible', NOT_SAVED);
    return calls.assay();
  };
  const begin = async (): Promise<void> => {
    setProblem(null);
    try {
      await onChanged(await calls.startRevision());
    } catch (error) {
      setProblem(sentenceOf(error));
    }
  };
  const button = (which: Open, name: string, primary = false) => (
    <button
      type="button"
      className={primary ? 'button button-primary' : 'button'}
      onClick={() => setOpen(which)}
    >
      {name}
    </button>
  );
  return (
    <>
      {button('revisions', 'Revisions')}
      {can('item.withdraw') &&
        item.state !== 'withdrawn' &&
        item.state !== 'inReview' &&
        button('withdraw', 'Withdraw')}
      {can('item.recall') && item.state === 'inReview' && button('recall', 'Take back')}
      {can('item.edit') && (item.state === 'approved' || item.state === 'returned') && (
        <button type="button" className="button button-primary" onClick={() => void begin()}>
          Start a new revision
        </button>
      )}
      {can('item.send') && item.state === 'drafting' && button('send', 'Send to review', true)}
      {problem !== null && (
        <p role="alert" className="basis-full text-lead">
          {problem}
        </p>
      )}
      <Dialog title="Send to review" open={open === 'send'} onClose={close}>
        <SendPanel
          content={content}
          reviewers={(reviewers.data?.people ?? []).filter((person) => person.id !== item.owner.id)}
          onAssay={assay}
          onSend={async (sending) => {
            const version = await saveNow();
            if (version === null) throw new AppError('notPossible', NOT_SAVED);
            await done(await calls.send(sending, version));
            tell(`${item.code} is sent to review.`);
          }}
          onCancel={close}
          onVisit={(target) => {
            close();
            props.onVisit(target);
          }}
        />
      </Dialog>
      <Dialog title="Take back from review" open={open === 'recall'} onClose={close}>
        <ReasonForm
          explanation="The review ends without a decision. You can then start a new revision from what you sent."
          action="Take back"
          onSubmit={async (reason) => done(await calls.recall(reason))}
          onCancel={close}
        />
      </Dialog>
      <Dialog title="Withdraw this item" open={open === 'withdraw'} onClose={close}>
        <ReasonForm
          explanation="A withdrawn item stays in the records with everything that was said about it, and can be taken on no new paper. This cannot be undone."
          action="Withdraw"
          onSubmit={async (reason) => done(await calls.withdraw(reason))}
          onCancel={close}
        />
      </Dialog>
      <Dialog title="Revisions" open={open === 'revisions'} onClose={close} wide>
        {revisions.data === undefined ? (
          <p role="status">{revisions.isError ? sentenceOf(revisions.error) : 'Opening'}</p>
        ) : (
          <RevisionList
            revisions={revisions.data.revisions}
            current={item.revision.number}
            onOpen={async (number) => (await calls.revision(number)).content}
            renderChanges={props.renderChanges}
          />
        )}
      </Dialog>
    </>
  );
}
