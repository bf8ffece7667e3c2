import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';

import type { PaperRow } from '#shared/contracts/papers.ts';
import { PAPER_STATE_NAMES } from '#shared/domain/paper-life.ts';
import { Awaited } from '#src/components/ui/Awaited.tsx';
import { moveRow } from '#src/components/ui/move-row.ts';
import { Empty } from '#src/components/ui/states.tsx';
import { formatDay } from '#src/lib/format.ts';
import { papersQuery } from './api.ts';

function PaperTable({ rows }: { rows: readonly PaperRow[] }) {
  return (
    <div className="table-place">
      <table className="list-table">
        <thead>
          <tr>
            <th scope="col">Code</th>
            <th scope="col">Title</th>
            <th scope="col">State</th>
            <th scope="col" className="number">
              Items
            </th>
            <th scope="col" className="number">
              Marks
            </th>
            <th scope="col">Begun by</th>
            <th scope="col">Changed</th>
          </tr>
        </thead>
        <tbody onKeyDown={moveRow}>
          {rows.map((paper) => (
            <tr key={paper.id} className="row-link">
              <td className="code">
                <Link className="link font-mono text-sm" to={`/papers/${paper.id}`}>
                  {paper.code}
                </Link>
              </td>
              <td className="w-full">{paper.title}</td>
              <td>{PAPER_STATE_NAMES[paper.state]}</td>
              <td className="number">{paper.items}</td>
              <td className="number whitespace-nowrap">
                {paper.marks} of {paper.targetMarks}
              </td>
              <td className="whitespace-nowrap">{paper.createdBy.name}</td>
              <td className="whitespace-nowrap">{formatDay(paper.updatedAt)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

/** Every paper with its state and its total. */
export function PaperList() {
  const papers = useQuery(papersQuery);
  return (
    <Awaited query={papers} what="the papers">
      {({ papers: rows }) =>
        rows.length === 0 ? (
          <Empty>There is no paper yet. A setter begins the first.</Empty>
        ) : (
          <PaperTable rows={rows} />
        )
      }
    </Awaited>
  );
}
