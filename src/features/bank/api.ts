import { keepPreviousData, queryOptions } from '@tanstack/react-query';

import { createItem, type ItemQuery, itemQuerySchema, listItems } from '#shared/contracts/items.ts';
import { choosePeople } from '#shared/contracts/people.ts';
import { listTopics } from '#shared/contracts/topics.ts';
import { call } from '#src/lib/api.ts';

/** What the address asks of the bank; whatever it cannot mean is passed over. */
export function readBankQuery(search: URLSearchParams): ItemQuery {
  const given = Object.fromEntries([...search].filter(([, value]) => value !== ''));
  const whole = itemQuerySchema.safeParse(given);
  if (whole.success) return whole.data;
  const wrong = new Set(whole.error.issues.map((issue) => issue.path[0]));
  return itemQuerySchema.parse(
    Object.fromEntries(Object.entries(given).filter(([name]) => !wrong.has(name))),
  );
}

export const bankQuery = (query: ItemQuery) =>
  queryOptions({
    queryKey: ['items', query],
    queryFn: ({ signal }) => call(listItems, { query, signal }),
    placeholderData: keepPreviousData,
  });

export const topicsQuery = queryOptions({
  queryKey: ['topics'],
  queryFn: ({ signal }) => call(listTopics, { signal }),
  staleTime: 300_000,
});

export const writersQuery = queryOptions({
  queryKey: ['people', 'writer'],
  queryFn: ({ signal }) => call(choosePeople, { query: { role: 'writer' }, signal }),
  staleTime: 300_000,
});

export const beginItem = (item: { title: string; topicId: number }) => call(createItem, { body: item });
