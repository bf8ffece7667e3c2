import { useQuery } from '@tanstack/react-query';
import { useDeferredValue, useState } from 'react';

import type { ItemRow } from '#shared/contracts/items.ts';
import type { Paper } from '#shared/contracts/papers.ts';
import { Empty, Failure, Loading } from '#src/components/ui/states.tsx';
import { sentenceOf } from '#src/lib/api.ts';
import { countOf } from '#src/lib/format.ts';
import { approvedItemsQuery } from './api.ts';

interface PickItemsProps {
  paper: Paper;
  onPick: (items: ItemRow[]) => void;
}

/** Approved items that are not on the paper yet; several can be picked at once. */
export function PickItems({ paper, onPick }: PickItemsProps) {
  const [search, setSearch] = useState('');
  const [picked, setPicked] = useState<ReadonlyMap<number, ItemRow>>(new Map());
  const items = useQuery(approvedItemsQuery(useDeferredValue(search)));
  const onPaper = new Set(paper.places.map((place) => place.itemId));
  const rows = items.data?.rows.filter((row) => !onPaper.has(row.id)) ?? [];
  const toggle = (row: ItemRow) =>
    setPicked((before) => {
      const next = new Map(before);
      if (!next.delete(row.id)) next.set(row.id, row);
      return next;
    });
  const marks = [...picked.values()].reduce((sum, row) => sum + row.marks, paper.marks);
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        onPick([...picked.values()]);
      }}
    >
      <label>
        <span className="field-label">Search approved items</span>
        <input
          type="search"
          className="field w-full"
          value={search}
          onChange={(event) => setSearch(event.target.value)}
        />
      </label>
      {items.isPending && <Loading what="approved items" />}
      {items.isError && <Failure message={sentenceOf(items.error)} onRetry={() => void items.refetch()} />}
      {items.isSuccess && rows.length === 0 && (
        <Empty>No other approved item fits. Items are approved in review.</Empty>
      )}
      <ul className="max-h-[45vh] overflow-auto">
        {rows.map((row) => (
          <li key={row.id} className="border-b border-rule/50 py-1">
            <label className="grid cursor-pointer grid-cols-[1.5rem_5rem_minmax(0,1fr)_auto] items-baseline gap-2">
              <input type="checkbox" checked={picked.has(row.id)} onChange={() => toggle(row)} />
              <span className="font-mono text-sm text-muted">{row.code}</span>
              <span>
                {row.title}
                <span className="block text-sm text-muted">
                  {row.topic.name}
                  {row.usedOn !== null && row.usedOn > 0 && `, on ${countOf(row.usedOn, 'paper')}`}
                </span>
              </span>
              <span className="text-sm">{countOf(row.marks, 'mark')}</span>
            </label>
          </li>
        ))}
      </ul>
      <p className="flex flex-wrap items-baseline gap-x-5 gap-y-2">
        <button type="submit" className="button button-primary" disabled={picked.size === 0}>
          {picked.size === 0 ? 'Put on the paper' : `Put ${countOf(picked.size, 'item')} on the paper`}
        </button>
        <span className="text-muted" role="status">
          {picked.size > 0 && `This makes ${marks} of ${paper.targetMarks} marks.`}
        </span>
      </p>
    </form>
  );
}
