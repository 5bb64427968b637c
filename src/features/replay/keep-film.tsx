import type { PublicReplay } from '#shared/contracts/replays.ts';
import { longDay } from '#src/ui/days.ts';
import { fileSize } from '#src/ui/figures.ts';
import { filmAddress } from './replay-api.ts';

/** The film with the drawing and the words in its picture, to be saved on one's own device. */
export function KeepFilm({
  token,
  film: { bytes, madeAt },
  practice,
}: {
  token: string;
  film: NonNullable<PublicReplay['film']>;
  practice: string;
}) {
  return (
    <section aria-label="Keep the film" className="border-t border-rule py-6 print:hidden">
      <h2 className="text-lead font-bold">Keep the film</h2>
      <p className="mt-1">
        Your lift with the marks and these words in its picture, as they stood on{' '}
        {longDay(madeAt.slice(0, 10))}. Once you have saved it, {practice} cannot end or delete it
        for you.
      </p>
      <a
        href={filmAddress(token)}
        download
        className="mt-3 inline-flex min-h-[48px] items-center rounded border border-ink px-4 font-semibold"
      >
        Save the film ({fileSize(bytes)})
      </a>
    </section>
  );
}
