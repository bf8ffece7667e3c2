import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';

import { type Person, setRoles } from '#shared/contracts/people.ts';
import { type Role, ROLES } from '#shared/domain/roles.ts';
import { Dialog } from '#src/components/ui/Dialog.tsx';
import { tell } from '#src/components/ui/notices.ts';
import { call, sentenceOf } from '#src/lib/api.ts';
import { formatDay } from '#src/lib/format.ts';
import { peopleQuery } from './api.ts';

interface PersonRowProps {
  person: Person;
  /** Whether this is the person at the screen. */
  isMe: boolean;
}

const listOf = (roles: readonly Role[]) => (roles.length === 0 ? 'no role' : roles.join(', '));

/** One person with a box for each role; a change is told and can be taken back. */
export function PersonRow({ person, isMe }: PersonRowProps) {
  const queries = useQueryClient();
  const [problem, setProblem] = useState<string | null>(null);
  const [givingUp, setGivingUp] = useState<Role[] | null>(null);
  const give = useMutation({
    mutationFn: ({ version, roles }: { version: number; roles: Role[] }) =>
      call(setRoles, { params: { personId: person.id }, body: { version, roles } }),
    onError: (error) => setProblem(sentenceOf(error)),
    onSuccess: () => setProblem(null),
    onSettled: () => queries.invalidateQueries({ queryKey: peopleQuery.queryKey }),
  });
  const change = (roles: Role[]) =>
    give.mutate(
      { version: person.version, roles },
      {
        onSuccess: ({ version, roles: now }) =>
          tell(`${person.name} has now: ${listOf(now)}.`, {
            label: 'Take it back',
            run: () => give.mutate({ version, roles: person.roles }),
          }),
      },
    );
  const ask = (role: Role, held: boolean) => {
    const roles = ROLES.filter((each) => (each === role ? held : person.roles.includes(each)));
    if (isMe && role === 'administrator' && !held) setGivingUp(roles);
    else change(roles);
  };
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
            onChange={(event) => ask(role, event.target.checked)}
          />
        </td>
      ))}
      <td className="whitespace-nowrap text-muted">
        {person.active ? (person.lastSeenAt === null ? 'never' : formatDay(person.lastSeenAt)) : 'closed'}
        <Dialog
          title="Give up the role of administrator?"
          description="Only another administrator can give it back to you."
          open={givingUp !== null}
          onClose={() => setGivingUp(null)}
        >
          <div className="flex flex-wrap gap-3">
            <button type="button" className="button button-primary" onClick={() => setGivingUp(null)}>
              Keep it
            </button>
            <button
              type="button"
              className="button"
              onClick={() => {
                if (givingUp !== null) change(givingUp);
                setGivingUp(null);
              }}
            >
              Give it up
            </button>
          </div>
        </Dialog>
      </td>
    </tr>
  );
}
