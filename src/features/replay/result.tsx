import type { PublicReplay } from '#shared/contracts/replays.ts';
import { callWords, NOT_AN_INJURY, readingWords } from '#shared/replay/athlete-words.ts';

/** What was measured, and what was seen by eye; never the one as if it were the other. */
export function Result({ replay }: { replay: PublicReplay }) {
  const { reading, call, side, coachName, gates } = replay;
  const seen = call && callWords(call.seen, side, coachName, gates);
  const main = reading ? readingWords(reading, side, gates) : seen;
  if (!main)
    return (
      <section aria-label="Your lift" className="py-6">
        <h1 tabIndex={-1} className="text-title-narrow font-bold">
          Your lift, standing on the {side} leg
        </h1>
        <p className="mt-3">{NOT_AN_INJURY}</p>
      </section>
    );
  return (
    <section aria-label="What it says" className="py-6">
      {!reading && <Seen />}
      <h1
        tabIndex={-1}
        className="text-title-narrow font-bold tracking-[-0.01em] [hyphens:auto] [overflow-wrap:anywhere]"
      >
        {main.title}
      </h1>
      <p className="mt-3">{main.text.join(' ')}</p>
      {reading && seen && (
        <div className="mt-4 border-l border-rule pl-4">
          <Seen />
          <p>{seen.text.at(-1)}</p>
        </div>
      )}
      <p className="mt-4">
        {main.sure} {NOT_AN_INJURY}
      </p>
    </section>
  );
}

function Seen() {
  return (
    <p className="mb-1">
      <span className="rounded border border-ink px-2 py-0.5 text-note">
        seen by your coach, not measured
      </span>
    </p>
  );
}
