import * as contracts from '#shared/contracts/reviews.ts';

import type { AppContext } from '../../context.ts';
import { type Route, route } from '../../http/route.ts';
import { decideReview } from './decide-service.ts';
import { getReview, listReviews } from './reading-service.ts';
import * as service from './service.ts';

/** Reviews: the queue, the independent working, the reveal and the decision. */
export function reviewRoutes(context: AppContext): Route[] {
  return [
    route(contracts.listReviews, { can: 'review.list' }, ({ actor, query }) =>
      listReviews(context, actor, query.scope),
    ),
    route(contracts.getReview, { can: 'review.read' }, ({ actor, params }) =>
      getReview(context, actor, params.reviewId),
    ),
    route(contracts.claimReview, { can: 'review.claim' }, ({ actor, params }) =>
      service.claimReview(context, actor, params.reviewId),
    ),
    route(contracts.releaseReview, { can: 'review.work' }, async ({ actor, params }) => {
      await service.releaseReview(context, actor, params.reviewId);
      return {};
    }),
    route(contracts.addWorking, { can: 'review.work' }, ({ actor, params, body }) =>
      service.addWorking(context, actor, params.reviewId, body),
    ),
    route(contracts.disputePart, { can: 'review.work' }, ({ actor, params, body }) =>
      service.disputePart(context, actor, params.reviewId, body.partId),
    ),
    route(contracts.settlePart, { can: 'review.work' }, ({ actor, params, body }) =>
      service.settlePart(context, actor, params.reviewId, body),
    ),
    route(contracts.revealReview, { can: 'review.work' }, ({ actor, params }) =>
      service.revealReview(context, actor, params.reviewId),
    ),
    route(contracts.addComment, { can: 'review.comment' }, ({ actor, params, body }) =>
      service.addComment(context, actor, params.reviewId, body),
    ),
    route(contracts.decideReview, { can: 'review.decide' }, ({ actor, params, body }) =>
      decideReview(context, actor, params.reviewId, body),
    ),
  ];
}
