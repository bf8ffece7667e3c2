import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router';

import { Failure, Loading } from '#src/components/ui/states.tsx';
import { paperQuery } from '#src/features/papers/api.ts';
import { PaperDesk } from '#src/features/papers/PaperDesk.tsx';
import { PaperSchemeView, PaperView } from '#src/features/sheet/PaperView.tsx';
import { sentenceOf } from '#src/lib/api.ts';
import { Page } from '../layout/Page.tsx';

export function PaperPage() {
  const paper = useQuery(paperQuery(Number(useParams()['paperId'])));
  if (paper.isPending) return <Loading what="the paper" />;
  if (paper.isError)
    return <Failure message={sentenceOf(paper.error)} onRetry={() => void paper.refetch()} />;
  return (
    <Page title={`${paper.data.code} ${paper.data.title}`}>
      <PaperDesk
        paper={paper.data}
        renderSheet={(sheet) => <PaperView paper={sheet} />}
        renderScheme={(scheme) => <PaperSchemeView paper={scheme} />}
      />
    </Page>
  );
}
