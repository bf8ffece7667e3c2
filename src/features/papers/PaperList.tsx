import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';

import { PAPER_STATE_NAMES } from '#shared/domain/paper-life.ts';
import { Empty, Failure, Loading } from '#src/components/ui/states.tsx';
import { sentenceOf } from '#src/lib/api.ts';
import { formatDay } from '#src/lib/format.ts';
import { papersQuery } from './api.ts';

/** Every paper with its state and its total. */
export function PaperList() {
  const papers = useQuery(papersQuery);
  if (papers.isPending) return <Loading what="the papers" />;
  if (papers.isError)
    return <Failure message={sentenceOf(papers.error)} onRetry={() => void papers.refetch()} />;
  if (papers.data.papers.length === 0)
    return <Empty>There is no paper yet. A setter begins the first.</Empty>;
  return (
    <div className="overflow-x-auto">
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
        <tbody>
          {papers.data.papers.map((paper) => (
            <tr key={paper.id} className="row-link">
              <td>
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
