import { queryOptions } from '@tanstack/react-query';

import { listPeople } from '#shared/contracts/people.ts';
import { call } from '#src/lib/api.ts';

export const peopleQuery = queryOptions({
  queryKey: ['people'],
  queryFn: ({ signal }) => call(listPeople, { signal }),
});
