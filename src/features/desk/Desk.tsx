import { queryOptions, useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';

import { type DeskReply, getDesk } from '#shared/contracts/desk.ts';
import { Awaited } from '#src/components/ui/Awaited.tsx';
import { moveRow } from '#src/components/ui/move-row.ts';
import { Empty } from '#src/components/ui/states.tsx';
import { call } from '#src/lib/api.ts';
import { formatAge, formatDay } from '#src/lib/format.ts';

export const deskQuery = queryOptions({
  queryKey: ['desk'],
  queryFn: ({ signal }) => call(getDesk, { signal }),
});

type Group = DeskReply['groups'][number];

const GROUP_NAMES: Readonly<Record<Group['group'], string>> = {
  returnedToMe: 'Returned to me',
  myDrafts: 'My drafts',
  reviewsForMe: 'Reviews for me',
  reviewQueue: 'Waiting for any reviewer',
  papersAssembling: 'Papers being assembled',
  papersToConfirm: 'Papers to confirm',
};

function DeskGroup({ group }: { group: Group }) {
  return (
    <section className="mb-10">
      <h2 className="mb-2 flex items-baseline justify-between border-b border-ink pb-1 text-lg font-semibold">
        {GROUP_NAMES[group.group]}
        <span className="font-mono text-sm font-normal text-muted">{group.total}</span>
      </h2>
      <ul>
        {group.entries.map((entry) => (
          <li key={entry.path} className="border-b border-rule/50">
            <Link
              to={entry.path}
              className="grid grid-cols-[5.5rem_minmax(0,1fr)] gap-x-4 py-2 hover:bg-accent/10 sm:grid-cols-[5.5rem_minmax(0,1fr)_auto]"
            >
              <span className="font-mono text-sm text-muted">{entry.code}</span>
              <span>
                {entry.title}
                <span className="block text-sm text-muted">{entry.reason}</span>
              </span>
              <span className="col-start-2 text-sm text-muted sm:col-start-3 sm:text-right">
                {formatAge(entry.since)}
                {entry.dueOn !== null && <span className="block">due {formatDay(entry.dueOn)}</span>}
              </span>
            </Link>
          </li>
        ))}
      </ul>
      {group.total > group.entries.length && (
        <p className="pt-2 text-sm text-muted">{group.total - group.entries.length} more.</p>
      )}
    </section>
  );
}

/** What waits for me, by role; nothing else. */
export function Desk() {
  const desk = useQuery(deskQuery);
  return (
    <Awaited query={desk} what="your desk">
      {({ groups }) => {
        const waiting = groups.filter((group) => group.total > 0);
        return waiting.length === 0 ? (
          <Empty>Nothing waits for you. The bank and the papers are above.</Empty>
        ) : (
          <div className="max-w-4xl" onKeyDown={moveRow}>
            {waiting.map((group) => (
              <DeskGroup key={group.group} group={group} />
            ))}
          </div>
        );
      }}
    </Awaited>
  );
}
