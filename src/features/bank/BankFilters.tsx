import { useQuery } from '@tanstack/react-query';
import { useEffect, useId, useState, type ReactNode } from 'react';

import type { ItemQuery } from '#shared/contracts/items.ts';
import { ITEM_STATE_NAMES, ITEM_STATES } from '#shared/domain/item-life.ts';
import { topicsQuery, writersQuery } from './api.ts';

type Change = Partial<Record<keyof ItemQuery, string>>;

interface BankFiltersProps {
  query: ItemQuery;
  onChange: (change: Change) => void;
  /** Whatever stands at the end of the line. */
  children?: ReactNode;
}

/** Typing settles this long before the bank is asked. */
const SETTLE_MS = 300;

interface ChoiceProps {
  label: string;
  value: string;
  choices: readonly { value: string; label: string }[];
  onChoose: (value: string) => void;
}

function Choice({ label, value, choices, onChoose }: ChoiceProps) {
  const id = useId();
  return (
    <div>
      <label className="field-label" htmlFor={id}>
        {label}
      </label>
      <select id={id} className="field" value={value} onChange={(event) => onChoose(event.target.value)}>
        <option value="">Any</option>
        {choices.map((choice) => (
          <option key={choice.value} value={choice.value}>
            {choice.label}
          </option>
        ))}
      </select>
    </div>
  );
}

/** Search and filters of the bank; all of them live in the address. */
export function BankFilters({ query, onChange, children }: BankFiltersProps) {
  const topics = useQuery(topicsQuery);
  const writers = useQuery(writersQuery);
  const [typed, setTyped] = useState(query.search ?? '');
  const id = useId();
  useEffect(() => setTyped(query.search ?? ''), [query.search]);
  useEffect(() => {
    if (typed === (query.search ?? '')) return undefined;
    const timer = setTimeout(() => onChange({ search: typed }), SETTLE_MS);
    return () => clearTimeout(timer);
  }, [typed, query.search, onChange]);
  return (
    <form
      role="search"
      className="flex flex-wrap items-end gap-x-4 gap-y-3"
      onSubmit={(event) => event.preventDefault()}
    >
      <div className="min-w-48 flex-1 basis-72">
        <label className="field-label" htmlFor={id}>
          Search code, title, text and script
        </label>
        <input
          id={id}
          type="search"
          className="field w-full"
          value={typed}
          onChange={(event) => setTyped(event.target.value)}
        />
      </div>
      <Choice
        label="Topic"
        value={String(query.topic ?? '')}
        choices={(topics.data?.topics ?? []).map((topic) => ({ value: String(topic.id), label: topic.name }))}
        onChoose={(topic) => onChange({ topic })}
      />
      <Choice
        label="State"
        value={query.state ?? ''}
        choices={ITEM_STATES.map((state) => ({ value: state, label: ITEM_STATE_NAMES[state] }))}
        onChoose={(state) => onChange({ state })}
      />
      <Choice
        label="Owner"
        value={String(query.owner ?? '')}
        choices={(writers.data?.people ?? []).map((person) => ({
          value: String(person.id),
          label: person.name,
        }))}
        onChoose={(owner) => onChange({ owner })}
      />
      <Choice
        label="Worst finding"
        value={query.finding ?? ''}
        choices={[
          { value: 'blocker', label: 'Blocker' },
          { value: 'caution', label: 'Caution' },
          { value: 'note', label: 'Note' },
          { value: 'none', label: 'None' },
        ]}
        onChoose={(finding) => onChange({ finding })}
      />
      {children}
    </form>
  );
}
