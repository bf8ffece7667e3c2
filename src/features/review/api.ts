import { queryOptions } from '@tanstack/react-query';

import {
  addComment,
  addWorking,
  claimReview,
  decideReview,
  disputePart,
  getReview,
  releaseReview,
  revealReview,
  settlePart,
} from '#shared/contracts/reviews.ts';
import { call } from '#src/lib/api.ts';
import type { Decision } from './DecisionForm.tsx';

/** One review with what its stage lets the reader see. */
export const reviewQuery = (reviewId: number) =>
  queryOptions({
    queryKey: ['review', reviewId],
    queryFn: ({ signal }) => call(getReview, { params: { reviewId }, signal }),
  });

/** Requests of one review; each gives the review as it then stands. */
export function reviewCalls(reviewId: number) {
  const params = { reviewId };
  return {
    claim: () => call(claimReview, { params }),
    release: () => call(releaseReview, { params }),
    work: (partId: string, text: string) => call(addWorking, { params, body: { partId, text } }),
    dispute: (partId: string) => call(disputePart, { params, body: { partId } }),
    settle: (partId: string, reason: string) => call(settlePart, { params, body: { partId, reason } }),
    reveal: () => call(revealReview, { params }),
    comment: (anchor: string, text: string) => call(addComment, { params, body: { anchor, text } }),
    decide: (decision: Decision) => call(decideReview, { params, body: decision }),
  };
}
