import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { eyeAgreement } from './eye-agreement.ts';
import { reviewQueue } from './review-queue.ts';
import { decideReview, handIn, sideReview } from './reviews.service.ts';

export const reviewsFeature: Feature = ({ serve }) => {
  serve(routes.reviewQueue, ({ work }) => work(reviewQueue));

  serve(routes.eyeAgreement, async ({ work }) => ({ items: await work(eyeAgreement) }));

  serve(routes.sideReview, ({ params, work }) =>
    work((unit) => sideReview(unit, params.id, params.side)),
  );

  serve(routes.handIn, ({ params, body, work }) =>
    work((unit) => handIn(unit, params.id, params.side, body)),
  );

  serve(routes.decideReview, ({ params, body, work }) =>
    work((unit) => decideReview(unit, params.id, params.side, body)),
  );
};
