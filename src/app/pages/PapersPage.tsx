import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router';

import { Dialog } from '#src/components/ui/Dialog.tsx';
import { beginPaper, papersQuery } from '#src/features/papers/api.ts';
import { DetailsForm, NEW_PAPER } from '#src/features/papers/DetailsForm.tsx';
import { PaperList } from '#src/features/papers/PaperList.tsx';
import { Page } from '../layout/Page.tsx';
import { usePerson } from '../layout/use-person.ts';
import { NotAllowed } from './NotAllowed.tsx';

export function PapersPage() {
  const { abilities } = usePerson();
  const navigate = useNavigate();
  const queries = useQueryClient();
  const [beginning, setBeginning] = useState(false);
  if (!abilities.includes('paper.list')) return <NotAllowed what="Papers" />;
  return (
    <Page
      title="Papers"
      aside={
        abilities.includes('paper.create') && (
          <button type="button" className="button button-primary" onClick={() => setBeginning(true)}>
            New paper
          </button>
        )
      }
    >
      <PaperList />
      <Dialog title="New paper" open={beginning} onClose={() => setBeginning(false)}>
        <DetailsForm
          details={NEW_PAPER}
          action="Begin the paper"
          onSave={async (details) => {
            const paper = await beginPaper(details);
            void queries.invalidateQueries({ queryKey: papersQuery.queryKey });
            void navigate(`/papers/${paper.id}`);
          }}
        />
      </Dialog>
    </Page>
  );
}
