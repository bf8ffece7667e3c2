import { useQuery } from '@tanstack/react-query';

import { type Role, ROLE_DESCRIPTIONS, ROLES } from '#shared/domain/roles.ts';
import { Awaited } from '#src/components/ui/Awaited.tsx';
import { peopleQuery } from './api.ts';
import { PersonRow } from './PersonRow.tsx';

const nameOf = (role: Role) => `${role[0]?.toUpperCase() ?? ''}${role.slice(1)}`;

/** Everyone on the team with their roles; every change is recorded. `me` is the person at the screen. */
export function People({ me }: { me: number }) {
  const query = useQuery(peopleQuery);
  return (
    <Awaited query={query} what="the people">
      {({ people }) => (
        <>
          <div className="table-place">
            <table className="list-table max-w-5xl">
              <thead>
                <tr>
                  <th scope="col">Person</th>
                  {ROLES.map((role) => (
                    <th key={role} scope="col" aria-describedby={`role-${role}`}>
                      {nameOf(role)}
                    </th>
                  ))}
                  <th scope="col">Last here</th>
                </tr>
              </thead>
              <tbody>
                {people.map((person) => (
                  <PersonRow key={person.id} person={person} isMe={person.id === me} />
                ))}
              </tbody>
            </table>
          </div>
          <dl className="mt-8 grid max-w-3xl grid-cols-[auto_minmax(0,1fr)] gap-x-6 gap-y-1 text-sm">
            {ROLES.map((role) => (
              <div key={role} className="contents">
                <dt>{nameOf(role)}</dt>
                <dd id={`role-${role}`} className="text-muted">
                  {ROLE_DESCRIPTIONS[role]}
                </dd>
              </div>
            ))}
          </dl>
        </>
      )}
    </Awaited>
  );
}
