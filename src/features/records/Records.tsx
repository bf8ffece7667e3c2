import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router';

import { choosePeople } from '#shared/contracts/people.ts';
import { listRecords, type RecordRow } from '#shared/contracts/records.ts';
import { Awaited } from '#src/components/ui/Awaited.tsx';
import { Pager } from '#src/components/ui/Pager.tsx';
import { Empty } from '#src/components/ui/states.tsx';
import { call } from '#src/lib/api.ts';
import { countOf, formatDayAndTime } from '#src/lib/format.ts';

const KINDS: readonly { event: string; name: string }[] = [
  { event: 'item', name: 'Items' },
  { event: 'review', name: 'Reviews' },
  { event: 'paper', name: 'Papers' },
  { event: 'person', name: 'People' },
  { event: 'session', name: 'Sessions' },
];

function RecordTable({ rows }: { rows: readonly RecordRow[] }) {
  return (
    <div className="table-place">
      <table className="list-table">
        <thead>
          <tr>
            <th scope="col">When</th>
            <th scope="col">Who</th>
            <th scope="col">What</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.id}>
              <td className="whitespace-nowrap">{formatDayAndTime(row.at)}</td>
              <td className="whitespace-nowrap">{row.person?.name ?? 'the system'}</td>
              <td className="w-full">{row.summary}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

/** What was done, by whom and when; nobody can change it. */
export function Records() {
  const [search, setSearch] = useSearchParams();
  const page = Math.max(1, Number(search.get('page') ?? 1) || 1);
  const person = Number(search.get('person') ?? '') || undefined;
  const event = search.get('event') ?? undefined;
  const people = useQuery({
    queryKey: ['people', 'names'],
    queryFn: ({ signal }) => call(choosePeople, { signal }),
  });
  const records = useQuery({
    queryKey: ['records', { page, person, event }],
    queryFn: ({ signal }) => call(listRecords, { query: { page, person, event }, signal }),
    placeholderData: keepPreviousData,
  });
  const choose = (name: string, value: string) =>
    setSearch((before) => {
      const next = new URLSearchParams(before);
      if (name !== 'page') next.delete('page');
      if (value === '') next.delete(name);
      else next.set(name, value);
      return next;
    });
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-5">
      <div className="flex flex-wrap items-end gap-4">
        <label>
          <span className="field-label">Person</span>
          <select
            className="field"
            value={person ?? ''}
            onChange={(change) => choose('person', change.target.value)}
          >
            <option value="">Anyone</option>
            {people.data?.people.map((each) => (
              <option key={each.id} value={each.id}>
                {each.name}
              </option>
            ))}
          </select>
        </label>
        <label>
          <span className="field-label">About</span>
          <select
            className="field"
            value={event ?? ''}
            onChange={(change) => choose('event', change.target.value)}
          >
            <option value="">Anything</option>
            {KINDS.map((kind) => (
              <option key={kind.event} value={kind.event}>
                {kind.name}
              </option>
            ))}
          </select>
        </label>
        {records.isSuccess && <span className="text-muted">{countOf(records.data.total, 'record')}</span>}
      </div>
      <Awaited query={records} what="the records">
        {({ rows, pageSize, total }) =>
          rows.length === 0 ? (
            <Empty>No record fits.</Empty>
          ) : (
            <>
              <RecordTable rows={rows} />
              <Pager
                page={page}
                pageSize={pageSize}
                total={total}
                onPage={(next) => choose('page', String(next))}
              />
            </>
          )
        }
      </Awaited>
    </div>
  );
}
