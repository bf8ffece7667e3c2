import { useQuery } from '@tanstack/react-query';
import { useNavigate, useParams } from 'react-router';

import { Awaited } from '#src/components/ui/Awaited.tsx';
import { ChangesView } from '#src/features/changes/ChangesView.tsx';
import { reviewQuery } from '#src/features/review/api.ts';
import { ReviewDesk } from '#src/features/review/ReviewDesk.tsx';
import type { ReviewSlots } from '#src/features/review/slots.ts';
import { ScaleStrip } from '#src/features/scale-strip/ScaleStrip.tsx';
import { SchemeView } from '#src/features/sheet/SchemeView.tsx';
import { SheetView } from '#src/features/sheet/SheetView.tsx';
import { usePageTitle } from '../layout/use-page-title.ts';
import { usePerson } from '../layout/use-person.ts';

const SLOTS: ReviewSlots = {
  sheet: (sheet) => <SheetView sheet={sheet} />,
  scheme: (scheme) => <SchemeView scheme={scheme} />,
  scale: (request) => <ScaleStrip {...request} />,
  changes: (before, after) => <ChangesView before={before} after={after} />,
};

/** One review, from claiming it to the decision. */
export function ReviewPage() {
  const navigate = useNavigate();
  const mayOpen = usePerson().abilities.includes('item.read');
  const reviewId = Number(useParams()['reviewId']);
  const review = useQuery(reviewQuery(reviewId));
  const title = review.data === undefined ? 'Review' : `Review of ${review.data.itemCode}`;
  usePageTitle(title);

  return (
    <Awaited query={review} what="the review" whole>
      {(data) => (
        <ReviewDesk
          key={reviewId}
          review={data}
          itemPath={mayOpen && data.stage !== 'working' ? `/items/${data.itemId}` : null}
          onReleased={() => void navigate('/desk')}
          slots={SLOTS}
        />
      )}
    </Awaited>
  );
}
