import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';

import { type Paper, type PaperDetails, paperSchema } from '#shared/contracts/papers.ts';
import { PAPER_STATE_NAMES } from '#shared/domain/paper-life.ts';
import { AppError } from '#shared/errors/app-error.ts';
import type { PaperScheme, PaperSheet } from '#shared/sheet/model.ts';
import { Dialog } from '#src/components/ui/Dialog.tsx';
import { Failure, Loading } from '#src/components/ui/states.tsx';
import { Tabs } from '#src/components/ui/Tabs.tsx';
import { sentenceOf } from '#src/lib/api.ts';
import { paperCalls, paperQuery, paperSheetQuery, papersQuery, type Place, placesOf } from './api.ts';
import { DetailsForm } from './DetailsForm.tsx';
import { Exports } from './Exports.tsx';
import { PaperActions } from './PaperActions.tsx';
import { PaperAside } from './PaperAside.tsx';
import { PickItems } from './PickItems.tsx';
import { RunningOrder } from './RunningOrder.tsx';

interface PaperDeskProps {
  paper: Paper;
  /** How the printed pages are drawn; another feature's work. */
  renderSheet: (sheet: PaperSheet) => ReactNode;
  renderScheme: (scheme: PaperScheme) => ReactNode;
}

type View = 'order' | 'sheet' | 'scheme';
const VIEWS: readonly { view: View; name: string }[] = [
  { view: 'order', name: 'Running order' },
  { view: 'sheet', name: 'Question paper' },
  { view: 'scheme', name: 'Mark scheme' },
];

function Preview({ paper, view, renderSheet, renderScheme }: PaperDeskProps & { view: View }) {
  const printed = useQuery(paperSheetQuery(paper.id, paper.version));
  if (printed.isPending) return <Loading what="the pages" />;
  if (printed.isError)
    return <Failure message={sentenceOf(printed.error)} onRetry={() => void printed.refetch()} />;
  return view === 'sheet' ? renderSheet(printed.data.sheet) : renderScheme(printed.data.scheme);
}

/** One paper: its running order, what its checks say, how it prints, and its next steps. */
export function PaperDesk(props: PaperDeskProps) {
  const { paper } = props;
  const queries = useQueryClient();
  const [calls] = useState(() => paperCalls(paper.id));
  const [view, setView] = useState<View>('order');
  const [dialog, setDialog] = useState<'details' | 'pick' | null>(null);
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);
  const mayEdit = paper.state === 'assembling' && paper.abilities.includes('paper.edit');

  const show = (next: Paper) => {
    queries.setQueryData(paperQuery(paper.id).queryKey, next);
    void queries.invalidateQueries({ queryKey: papersQuery.queryKey });
    void queries.invalidateQueries({ queryKey: ['desk'] });
  };
  /** After a conflict the paper as it now stands is shown, with what was not saved told in words. */
  const failed = (error: unknown) => {
    const stored = error instanceof AppError ? paperSchema.safeParse(error.current) : null;
    if (stored?.success === true) {
      show(stored.data);
      setProblem(
        'Somebody else changed this paper meanwhile. It is shown as it stands now; your last change was not made. Make it again if it is still wanted.',
      );
    } else setProblem(sentenceOf(error));
  };
  const save = async (places: Place[]) => {
    setBusy(true);
    setProblem(null);
    try {
      show(await calls.savePlaces(paper.version, places));
    } catch (error) {
      failed(error);
    } finally {
      setBusy(false);
    }
  };
  const saveDetails = async (details: PaperDetails) => {
    try {
      show(await calls.saveDetails(paper.version, details));
      setDialog(null);
    } catch (error) {
      const stored = error instanceof AppError ? paperSchema.safeParse(error.current) : null;
      if (stored?.success !== true) throw error;
      // The form keeps what was typed; saving once more goes over the paper as it now stands.
      show(stored.data);
      throw new AppError(
        'conflict',
        'Somebody else changed this paper meanwhile. What you typed is still here; save again to put it in place of theirs.',
      );
    }
  };

  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-6">
      <div className="flex flex-wrap items-baseline gap-x-6 gap-y-2">
        <span>
          {PAPER_STATE_NAMES[paper.state]}
          <span className="text-muted">
            , {paper.durationMinutes} minutes, begun by {paper.createdBy.name}
          </span>
        </span>
        {mayEdit && (
          <button type="button" className="link" onClick={() => setDialog('details')}>
            Change the details
          </button>
        )}
        <div className="ml-auto flex flex-wrap items-baseline gap-3">
          <PaperActions paper={paper} calls={calls} onChanged={show} />
        </div>
      </div>
      <Exports paper={paper} calls={calls} />
      {problem !== null && (
        <p role="alert" className="notice notice-blocker">
          {problem}
        </p>
      )}
      <Tabs label="Views of the paper" views={VIEWS} view={view} onView={setView}>
        {view === 'order' ? (
          <div className="grid grid-cols-[minmax(0,1fr)] gap-10 xl:grid-cols-[minmax(0,1fr)_24rem]">
            <div>
              <RunningOrder
                paper={paper}
                readOnly={!mayEdit}
                busy={busy}
                onSave={(places) => void save(places)}
              />
              {mayEdit && (
                <button
                  type="button"
                  className="button mt-4"
                  disabled={busy}
                  onClick={() => setDialog('pick')}
                >
                  Pick items
                </button>
              )}
            </div>
            <PaperAside paper={paper} />
          </div>
        ) : (
          <Preview {...props} view={view} />
        )}
      </Tabs>
      <Dialog title="Details of the paper" open={dialog === 'details'} onClose={() => setDialog(null)}>
        <DetailsForm details={paper} action="Save the details" onSave={saveDetails} />
      </Dialog>
      <Dialog title="Pick items" open={dialog === 'pick'} onClose={() => setDialog(null)} wide>
        <PickItems
          paper={paper}
          onPick={(ids) => {
            setDialog(null);
            void save([...placesOf(paper), ...ids.map((itemId) => ({ itemId, draw: null }))]);
          }}
        />
      </Dialog>
    </div>
  );
}
