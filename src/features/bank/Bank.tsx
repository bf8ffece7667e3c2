import { useQuery } from '@tanstack/react-query';
import { useCallback, useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router';

import type { ItemQuery } from '#shared/contracts/items.ts';
import { Dialog } from '#src/components/ui/Dialog.tsx';
import { Empty, Failure, Loading } from '#src/components/ui/states.tsx';
import { sentenceOf } from '#src/lib/api.ts';
import { countOf } from '#src/lib/format.ts';
import { bankQuery, readBankQuery } from './api.ts';
import { BankFilters } from './BankFilters.tsx';
import { BankTable } from './BankTable.tsx';
import { NewItemForm } from './NewItemForm.tsx';

/** All items: searched, filtered, sorted and paged by the server; the address says how. */
export function Bank({ mayWrite }: { mayWrite: boolean }) {
  const [search, setSearch] = useSearchParams();
  const navigate = useNavigate();
  const [beginning, setBeginning] = useState(false);
  const query = readBankQuery(search);
  const page = useQuery(bankQuery(query));
  const change = useCallback(
    (part: Partial<Record<keyof ItemQuery, string>>) =>
      setSearch((before) => {
        const next = new URLSearchParams(before);
        for (const [name, value] of Object.entries({ page: '', ...part })) {
          if (value === '') next.delete(name);
          else next.set(name, value);
        }
        return next;
      }),
    [setSearch],
  );
  const total = page.data?.total ?? 0;
  const pages = Math.max(1, Math.ceil(total / query.pageSize));
  return (
    <div className="grid gap-5">
      <div className="flex flex-wrap items-baseline justify-between gap-4">
        <p className="text-muted" role="status">
          {page.isSuccess ? countOf(total, 'item') : ''}
        </p>
        {mayWrite && (
          <button type="button" className="button button-primary" onClick={() => setBeginning(true)}>
            New item
          </button>
        )}
      </div>
      <BankFilters query={query} onChange={change} />
      {page.isPending && <Loading what="the bank" />}
      {page.isError && <Failure message={sentenceOf(page.error)} onRetry={() => void page.refetch()} />}
      {page.isSuccess && page.data.rows.length === 0 && (
        <Empty>
          {[...search.keys()].length === 0
            ? 'The bank is empty. A writer begins the first item.'
            : 'No item fits. Take a filter away, or search for fewer words.'}
        </Empty>
      )}
      {page.isSuccess && page.data.rows.length > 0 && (
        <BankTable
          rows={page.data.rows}
          query={query}
          onSort={(sort, direction) => change({ sort, direction })}
        />
      )}
      {pages > 1 && (
        <nav aria-label="Pages" className="flex items-center gap-4">
          <button
            type="button"
            className="button"
            disabled={query.page <= 1}
            onClick={() => change({ page: String(query.page - 1) })}
          >
            Previous
          </button>
          <span>
            Page {query.page} of {pages}
          </span>
          <button
            type="button"
            className="button"
            disabled={query.page >= pages}
            onClick={() => change({ page: String(query.page + 1) })}
          >
            Next
          </button>
        </nav>
      )}
      <Dialog title="New item" open={beginning} onClose={() => setBeginning(false)}>
        <NewItemForm onBegun={(itemId) => void navigate(`/items/${itemId}`)} />
      </Dialog>
    </div>
  );
}
