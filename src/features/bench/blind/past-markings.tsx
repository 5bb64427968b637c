import { Link } from 'react-router-dom';
import type { SecondMarkingSummary } from '#shared/contracts/second-markings.ts';
import { moment } from '#src/ui/days.ts';
import { paths } from '#src/ui/paths.ts';

const stateWords = ({ finishedAt, frames, framesDone }: SecondMarkingSummary): string =>
  finishedAt ? `finished ${moment(finishedAt)}` : `${framesDone} of ${frames} frames done`;

/** The second markings of a rep so far. */
export function PastMarkings({ items }: { items: readonly SecondMarkingSummary[] }) {
  if (items.length === 0) return null;
  return (
    <section aria-label="Second markings so far" className="mt-6 border-t border-rule pt-3">
      <h3 className="font-bold">So far</h3>
      <ul className="text-note">
        {items.map((each) => (
          <li
            key={each.id}
            className="flex min-h-[44px] flex-wrap items-center justify-between gap-x-4 border-b border-rule last:border-0"
          >
            <span>
              {each.marker.name}, {stateWords(each)}
            </span>
            {each.finishedAt && (
              <Link to={paths.secondMarking(each.id)} className="py-2.5">
                See how well they agree
              </Link>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}
