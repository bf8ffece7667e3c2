import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';

import { listPeople, type Person, setRoles } from '#shared/contracts/people.ts';
import { type Role, ROLE_DESCRIPTIONS, ROLES } from '#shared/domain/roles.ts';
import { Failure, Loading } from '#src/components/ui/states.tsx';
import { call, sentenceOf } from '#src/lib/api.ts';
import { formatDay } from '#src/lib/format.ts';

const peopleQuery = queryOptions({
  queryKey: ['people'],
  queryFn: ({ signal }) => call(listPeople, { signal }),
});

const nameOf = (role: Role) => `${role[0]?.toUpperCase() ?? ''}${role.slice(1)}`;

function PersonRow({ person }: { person: Person }) {
  const queries = useQueryClient();
  const [problem, setProblem] = useState<string | null>(null);
  const give = useMutation({
    mutationFn: (roles: Role[]) =>
      call(setRoles, { params: { personId: person.id }, body: { version: person.version, roles } }),
    onError: (error) => setProblem(sentenceOf(error)),
    onSuccess: () => setProblem(null),
    onSettled: () => queries.invalidateQueries({ queryKey: peopleQuery.queryKey }),
  });
  return (
    <tr>
      <td>
        {person.name}
        <span className="block text-sm text-muted">{person.email}</span>
        {problem !== null && (
          <span role="alert" className="block text-sm text-lead">
            {problem}
          </span>
        )}
      </td>
      {ROLES.map((role) => (
        <td key={role}>
          <input
            type="checkbox"
            className="size-4 accent-[var(--color-accent)]"
            aria-label={`${person.name}: ${role}`}
            checked={person.roles.includes(role)}
            disabled={give.isPending}
            onChange={(event) =>
              give.mutate(
                ROLES.filter((each) => (each === role ? event.target.checked : person.roles.includes(each))),
              )
            }
          />
        </td>
      ))}
      <td className="text-muted">
        {person.active ? (person.lastSeenAt === null ? 'never' : formatDay(person.lastSeenAt)) : 'closed'}
      </td>
    </tr>
  );
}

/** Everyone on the team with their roles; every change is recorded. */
export function People() {
  const people = useQuery(peopleQuery);
  if (people.isPending) return <Loading what="the people" />;
  if (people.isError)
    return <Failure message={sentenceOf(people.error)} onRetry={() => void people.refetch()} />;
  return (
    <div className="overflow-x-auto">
      <dl className="mb-6 grid max-w-3xl grid-cols-[auto_minmax(0,1fr)] gap-x-6 gap-y-1 text-sm">
        {ROLES.map((role) => (
          <div key={role} className="contents">
            <dt>{nameOf(role)}</dt>
            <dd id={`role-${role}`} className="text-muted">
              {ROLE_DESCRIPTIONS[role]}
            </dd>
          </div>
        ))}
      </dl>
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
          {people.data.people.map((person) => (
            <PersonRow key={person.id} person={person} />
          ))}
        </tbody>
      </table>
    </div>
  );
}
