import { Link } from 'react-router-dom';
import type { Call } from '#shared/contracts/calls.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import { moment } from '#src/ui/days.ts';
import { paths } from '#src/ui/paths.ts';
import { SEEN_WORDS } from '#src/ui/words.ts';
import { CONFIDENCE_WORDS, SUBSTITUTION_WORDS } from '../words/seen-words.ts';
import { SeenTag } from './seen-tag.tsx';

/** What was seen by eye, beside the measured reading and smaller; later calls stand under the first. */
export function CallPanel({
  calls,
  visitId,
  side,
}: {
  calls: readonly Call[];
  visitId: string;
  side: Side;
}) {
  return (
    <div className="text-ink desk:border-l desk:border-rule desk:pl-8">
      <p className="flex flex-wrap items-center gap-x-3 gap-y-1 text-body text-soft">
        Call by eye <SeenTag />
      </p>
      {calls.map((call, n) => (
        <OneCall key={call.id} call={call} first={n === 0} />
      ))}
      <p className="mt-1">
        <Link to={paths.call(visitId, side)} className="inline-block py-2.5">
          Add a second call
        </Link>
      </p>
    </div>
  );
}

function OneCall({ call, first }: { call: Call; first: boolean }) {
  const Heading = first ? 'h2' : 'h3';
  return (
    <div className={first ? undefined : 'mt-3 border-t border-rule pt-3'}>
      <Heading className={first ? 'mt-2 text-filled font-bold' : 'text-sub font-bold'}>
        {SEEN_WORDS[call.seen]}
      </Heading>
      <p>{CONFIDENCE_WORDS[call.confidence]}.</p>
      {call.substitutions.length > 0 && (
        <p>{call.substitutions.map((each) => SUBSTITUTION_WORDS[each]).join('. ')}.</p>
      )}
      {call.handsFelt !== '' && <p>Hands: “{call.handsFelt}”</p>}
      <p className="mt-1 text-note text-soft">
        {call.by.name}, {moment(call.at)},{' '}
        {call.beforeFigures ? 'before any figure was shown' : 'after figures had been shown'}.
      </p>
    </div>
  );
}
