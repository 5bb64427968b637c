import { Link } from 'react-router-dom';
import type { ReviewItem } from '#shared/contracts/reviews.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { moment } from '#src/ui/days.ts';
import { paths } from '#src/ui/paths.ts';
import { reviewClipPath, reviewDetail, reviewTitle } from '#src/ui/review-words.ts';

/** One side that waits: its clip at the moment that matters, and the page where the word is said. */
export function ReviewRow({ item, pressing }: { item: ReviewItem; pressing: boolean }) {
  const { visitId, side } = item;
  const title = reviewTitle(item);
  const signOff = `${paths.reading(visitId, side)}#sign-off`;
  const clip = reviewClipPath(item);
  return (
    <li className="grid gap-x-6 border-b border-rule py-3 first:pt-0 last:border-0 tablet:grid-cols-[minmax(0,1fr)_auto]">
      <div>
        <p className="break-words font-bold">{title}</p>
        <p className="text-soft">{reviewDetail(item)}</p>
        <p className="text-note text-soft">
          {item.coach.name}, since {moment(item.at)}
        </p>
      </div>
      <p className="mt-2 flex flex-wrap items-center gap-x-5 gap-y-1 tablet:mt-0 tablet:items-start">
        <Link to={signOff} aria-label={`Reading and sign-off: ${title}`} className="py-2.5">
          Reading and sign-off
        </Link>
        {clip && (
          <ButtonLink
            look={pressing ? 'primary' : 'secondary'}
            to={clip}
            aria-label={`Open the clip: ${title}`}
          >
            Open the clip
          </ButtonLink>
        )}
      </p>
    </li>
  );
}
