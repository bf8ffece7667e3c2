import { useQuery } from '@tanstack/react-query';
import { useCallback, useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router';

import type { ItemQuery } from '#shared/contracts/items.ts';
import { Awaited } from '#src/components/ui/Awaited.tsx';
import { Dialog } from '#src/components/ui/Dialog.tsx';
import { Pager } from '#src/components/ui/Pager.tsx';
import { Empty } from '#src/components/ui/states.tsx';
import { countOf } from '#src/lib/format.ts';
import { bankQuery, readBankQuery } from './api.ts';
import { keepHidden, readHidden } from './bank-columns.ts';
import { BankFilters } from './BankFilters.tsx';
import { BankTable } from './BankTable.tsx';
import { ColumnChoice } from './ColumnChoice.tsx';
import { NewItemForm } from './NewItemForm.tsx';

/** All items: searched, filtered, sorted and paged by the server; the address says how. */
export function Bank({ mayWrite }: { mayWrite: boolean }) {
  const [search, setSearch] = useSearchParams();
  const navigate = useNavigate();
  const [beginning, setBeginning] = useState(false);
  const [hidden, setHidden] = useState(() => readHidden(localStorage));
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
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-5">
      <BankFilters query={query} onChange={change}>
        {mayWrite && (
          <button type="button" className="button button-primary" onClick={() => setBeginning(true)}>
            New item
          </button>
        )}
      </BankFilters>
      <div className="flex flex-wrap items-baseline justify-between gap-4 text-sm">
        <p className="text-muted" role="status">
          {page.data === undefined ? '' : countOf(total, 'item')}
        </p>
        <ColumnChoice
          hidden={hidden}
          onHidden={(next) => {
            setHidden(next);
            keepHidden(localStorage, next);
          }}
        />
      </div>
      <Awaited query={page} what="the bank">
        {({ rows }) =>
          rows.length === 0 ? (
            <Empty>
              {[...search.keys()].length === 0
                ? 'The bank is empty. A writer begins the first item.'
                : 'No item fits. Take a filter away, or search for fewer words.'}
            </Empty>
          ) : (
            <>
              <BankTable
                rows={rows}
                query={query}
                hidden={hidden}
                onSort={(sort, direction) => change({ sort, direction })}
              />
              <Pager
                page={query.page}
                pageSize={query.pageSize}
                total={total}
                onPage={(next) => change({ page: String(next) })}
              />
            </>
          )
        }
      </Awaited>
      <Dialog title="New item" open={beginning} onClose={() => setBeginning(false)}>
        <NewItemForm onBegun={(itemId) => void navigate(`/items/${itemId}`)} />
      </Dialog>
    </div>
  );
}
