import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';

import type { Paper, PaperDetails } from '#shared/contracts/papers.ts';
import { PAPER_STATE_NAMES } from '#shared/domain/paper-life.ts';
import type { PaperScheme, PaperSheet } from '#shared/sheet/model.ts';
import { Awaited } from '#src/components/ui/Awaited.tsx';
import { Dialog } from '#src/components/ui/Dialog.tsx';
import { Tabs } from '#src/components/ui/Tabs.tsx';
import { paperCalls, paperQuery, paperSheetQuery, papersQuery, placesOf, storedPaperOf } from './api.ts';
import { DetailsForm } from './DetailsForm.tsx';
import { Exports } from './Exports.tsx';
import { PaperActions } from './PaperActions.tsx';
import { PaperAside } from './PaperAside.tsx';
import { PickItems } from './PickItems.tsx';
import { PlacesConflict } from './PlacesConflict.tsx';
import { RunningOrder } from './RunningOrder.tsx';
import { usePlaces } from './use-places.ts';

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
  return (
    <Awaited query={printed} what="the pages">
      {({ sheet, scheme }) => (view === 'sheet' ? renderSheet(sheet) : renderScheme(scheme))}
    </Awaited>
  );
}

/** One paper: its running order, what its checks say, how it prints, and its next steps. */
export function PaperDesk(props: PaperDeskProps) {
  const { paper } = props;
  const queries = useQueryClient();
  const [calls] = useState(() => paperCalls(paper.id));
  const [view, setView] = useState<View>('order');
  const [dialog, setDialog] = useState<'details' | 'pick' | null>(null);
  const mayEdit = paper.state === 'assembling' && paper.abilities.includes('paper.edit');
  const show = (next: Paper) => {
    queries.setQueryData(paperQuery(paper.id).queryKey, next);
    void queries.invalidateQueries({ queryKey: papersQuery.queryKey });
    void queries.invalidateQueries({ queryKey: ['desk'] });
  };
  const order = usePlaces({ paper, calls, onSaved: show });
  const saveDetails = async (details: PaperDetails) => {
    try {
      show(await calls.saveDetails(paper.version, details));
      setDialog(null);
    } catch (error) {
      // The form shows both versions; saving it again builds on the paper as it stands by then.
      const stored = storedPaperOf(error);
      if (stored !== null) show(stored);
      throw error;
    }
  };

  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-6">
      <div className="-mt-3 flex flex-wrap items-center gap-x-6 gap-y-2">
        <p>
          {PAPER_STATE_NAMES[paper.state]}
          <span className="text-muted">
            , {paper.durationMinutes} minutes, begun by {paper.createdBy.name}
          </span>
        </p>
        {mayEdit && (
          <button type="button" className="link" onClick={() => setDialog('details')}>
            Change the details
          </button>
        )}
        <div className="flex flex-wrap items-center gap-3 sm:ml-auto">
          <PaperActions paper={paper} calls={calls} onChanged={show} />
        </div>
      </div>
      {order.problem !== null && (
        <p role="alert" className="notice notice-blocker">
          {order.problem}
        </p>
      )}
      <div className="grid grid-cols-[minmax(0,1fr)] gap-x-12 gap-y-10 xl:grid-cols-[minmax(0,1fr)_21rem]">
        <Tabs label="Views of the paper" views={VIEWS} view={view} onView={setView}>
          {view !== 'order' && <Preview {...props} view={view} />}
          {view === 'order' && order.conflicting !== null && (
            <PlacesConflict
              paper={paper}
              mine={order.conflicting}
              nameOf={order.nameOf}
              busy={order.busy}
              onKeepStored={order.keepStored}
              onPutMine={order.putMine}
            />
          )}
          {view === 'order' && order.conflicting === null && (
            <div>
              <RunningOrder
                paper={paper}
                readOnly={!mayEdit}
                busy={order.busy}
                onSave={order.save}
                onTakeOff={order.takeOff}
              />
              {mayEdit && (
                <button
                  type="button"
                  className="button mt-4"
                  disabled={order.busy}
                  onClick={() => setDialog('pick')}
                >
                  Pick items
                </button>
              )}
            </div>
          )}
        </Tabs>
        <div className="grid content-start gap-8">
          <PaperAside paper={paper} onShowOrder={() => setView('order')} />
          <Exports paper={paper} calls={calls} />
        </div>
      </div>
      <Dialog title="Details of the paper" open={dialog === 'details'} onClose={() => setDialog(null)}>
        <DetailsForm details={paper} action="Save the details" onSave={saveDetails} />
      </Dialog>
      <Dialog title="Pick items" open={dialog === 'pick'} onClose={() => setDialog(null)} wide>
        <PickItems
          paper={paper}
          onPick={(items) => {
            setDialog(null);
            order.learnNames(items);
            order.save([...placesOf(paper), ...items.map(({ id }) => ({ itemId: id, draw: null }))]);
          }}
        />
      </Dialog>
    </div>
  );
}
