import * as contracts from '#shared/contracts/people.ts';

import type { AppContext } from '../../context.ts';
import { type Route, route } from '../../http/route.ts';
import { choosePeople, listPeople, setRoles } from './service.ts';

/** People and their roles. */
export function peopleRoutes(context: AppContext): Route[] {
  return [
    route(contracts.choosePeople, { can: 'person.choose' }, async ({ query }) => ({
      people: await choosePeople(context, query.role),
    })),

    route(contracts.listPeople, { can: 'person.list' }, async () => ({ people: await listPeople(context) })),

    route(contracts.setRoles, { can: 'person.setRoles' }, ({ actor, params, body }) =>
      setRoles(context, actor, params.personId, body),
    ),
  ];
}
