import { Router } from 'express';
import { route } from '#server/http/route.ts';
import * as contract from '#shared/contracts/reviews.ts';
import type { ReviewsService } from './reviews.service.ts';

export function reviewsRoutes(reviews: ReviewsService): Router {
  const router = Router();
  route(router, contract.listReviews, ({ actor, query }) => reviews.list(actor, query));
  route(router, contract.getReview, ({ actor, params }) => reviews.get(actor, params.submission));
  route(router, contract.claimReview, ({ actor, params }) => reviews.claim(actor, params.submission));
  route(router, contract.releaseReview, ({ actor, params }) => reviews.release(actor, params.submission));
  route(router, contract.saveChecklist, ({ actor, params, body }) => reviews.saveChecklist(actor, params.submission, body.checklist));
  route(router, contract.commentReview, async ({ actor, params, body, res }) => {
    const comment = await reviews.comment(actor, params.submission, body.body);
    res.status(201);
    return comment;
  });
  route(router, contract.decideReview, async ({ actor, params, body }) => {
    await reviews.decide(actor, params.submission, body);
    return reviews.get(actor, params.submission);
  });
  return router;
}
