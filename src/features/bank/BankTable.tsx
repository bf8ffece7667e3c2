import { createColumnHelper, flexRender, getCoreRowModel, useReactTable } from '@tanstack/react-table';
import { Link } from 'react-router';

import type { ITEM_SORTS, ItemQuery, ItemRow } from '#shared/contracts/items.ts';
import { ITEM_STATE_NAMES } from '#shared/domain/item-life.ts';
import { moveRow } from '#src/components/ui/move-row.ts';
import { SeverityWord } from '#src/components/ui/SeverityWord.tsx';
import { formatDay } from '#src/lib/format.ts';
import type { OptionalColumn } from './bank-columns.ts';

type Sort = (typeof ITEM_SORTS)[number];

interface BankTableProps {
  rows: ItemRow[];
  query: ItemQuery;
  hidden: readonly OptionalColumn[];
  onSort: (sort: Sort, direction: ItemQuery['direction']) => void;
}

const column = createColumnHelper<ItemRow>();

function Finding({ row }: { row: ItemRow }) {
  if (row.assayed === 'never') return <span className="text-muted">not assayed</span>;
  return (
    <>
      <SeverityWord severity={row.worstFinding} />
      {row.assayed === 'stale' && <span className="text-muted">, stale</span>}
    </>
  );
}

const columns = [
  column.accessor('code', {
    header: 'Code',
    cell: (cell) => (
      <Link className="link whitespace-nowrap font-mono text-sm" to={`/items/${cell.row.original.id}`}>
        {cell.getValue()}
      </Link>
    ),
  }),
  column.accessor('title', {
    header: 'Title',
    cell: (cell) => <span className="block min-w-48">{cell.getValue()}</span>,
  }),
  column.accessor((row) => row.topic.name, { id: 'topic', header: 'Topic' }),
  column.accessor((row) => ITEM_STATE_NAMES[row.state], { id: 'state', header: 'State' }),
  column.accessor((row) => row.owner.name, { id: 'owner', header: 'Owner' }),
  column.accessor('marks', { header: 'Marks' }),
  column.accessor('worstFinding', {
    header: 'Worst finding',
    cell: (cell) => <Finding row={cell.row.original} />,
  }),
  column.accessor('revision', {
    header: 'Revision',
    cell: ({ row: { original } }) =>
      original.approvedRevision === null || original.approvedRevision === original.revision
        ? original.revision
        : `${original.revision}, approved ${original.approvedRevision}`,
  }),
  column.accessor('usedOn', {
    header: 'On papers',
    cell: (cell) => (cell.getValue() === null ? '' : cell.getValue()),
  }),
  column.accessor('updatedAt', {
    id: 'updated',
    header: 'Changed',
    cell: (cell) => formatDay(cell.getValue()),
  }),
];

const SORTABLE = new Set<string>([
  'code',
  'title',
  'topic',
  'state',
  'owner',
  'marks',
  'updated',
] satisfies Sort[]);
const NUMBERS = new Set(['marks', 'revision', 'usedOn']);
/** Columns whose words belong on one line. */
const UNBROKEN = new Set(['code', 'state', 'worstFinding', 'updated']);
const classOf = (id: string) => (NUMBERS.has(id) ? 'number' : UNBROKEN.has(id) ? 'whitespace-nowrap' : '');

/** One page of the bank. */
export function BankTable({ rows, query, hidden, onSort }: BankTableProps) {
  const table = useReactTable({
    data: rows,
    columns,
    getCoreRowModel: getCoreRowModel(),
    manualSorting: true,
    state: { columnVisibility: Object.fromEntries(hidden.map((id) => [id, false])) },
  });
  const ariaSort = (id: string) => (query.sort === id ? query.direction : 'none');
  return (
    <div className="table-place">
      <table className="list-table">
        <thead>
          <tr>
            {table.getFlatHeaders().map((header) => (
              <th key={header.id} scope="col" aria-sort={ariaSort(header.id)} className={classOf(header.id)}>
                {SORTABLE.has(header.id) ? (
                  <button
                    type="button"
                    className="cursor-pointer font-semibold hover:underline"
                    onClick={() =>
                      onSort(
                        header.id as Sort,
                        query.sort === header.id && query.direction === 'ascending'
                          ? 'descending'
                          : 'ascending',
                      )
                    }
                  >
                    {flexRender(header.column.columnDef.header, header.getContext())}
                    <span aria-hidden="true" className="text-muted">
                      {query.sort === header.id ? (query.direction === 'ascending' ? ' ↑' : ' ↓') : ''}
                    </span>
                  </button>
                ) : (
                  flexRender(header.column.columnDef.header, header.getContext())
                )}
              </th>
            ))}
          </tr>
        </thead>
        <tbody onKeyDown={moveRow}>
          {table.getRowModel().rows.map((row) => (
            <tr key={row.id} className="row-link">
              {row.getVisibleCells().map((cell) => (
                <td key={cell.id} className={classOf(cell.column.id)}>
                  {flexRender(cell.column.columnDef.cell, cell.getContext())}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
